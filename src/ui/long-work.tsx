/** Work that takes a while: what it is at, how far, and a way to stop it. */
export function LongWork({
  at,
  fraction,
  onCancel,
}: {
  readonly at: string;
  readonly fraction: number;
  readonly onCancel?: () => void;
}) {
  const percent = Math.round(Math.min(1, Math.max(0, fraction)) * 100);
  return (
    <div>
      <div className="mb-1 flex items-center justify-between" aria-live="polite">
        <span>{at}</span>
        {onCancel !== undefined && (
          <button type="button" className="btn plain" onClick={onCancel}>
            Cancel
          </button>
        )}
      </div>
      <div
        className="long-work"
        role="progressbar"
        aria-label={at}
        aria-valuenow={percent}
        aria-valuemin={0}
        aria-valuemax={100}
      >
        <i style={{ width: `${percent}%` }} />
      </div>
    </div>
  );
}
