import { useRef, type KeyboardEvent, type PointerEvent } from 'react';

const TALL_SHARE = 0.6;

/** The upper edge of the ledger, drawn up like a blind: closed, resting, tall; a double click goes between. */
export function Pull({
  height,
  closed,
  resting,
  onPull,
}: {
  readonly height: number;
  readonly closed: number;
  readonly resting: number;
  readonly onPull: (height: number) => void;
}) {
  const start = useRef<{ readonly y: number; readonly height: number } | null>(null);
  const tall = () => Math.round(window.innerHeight * TALL_SHARE);
  const keepIn = (wanted: number) => Math.min(tall(), Math.max(closed, wanted));

  function next() {
    if (height <= closed + 8) onPull(resting);
    else onPull(height < tall() - 8 ? tall() : closed);
  }

  function handleKey(event: KeyboardEvent<HTMLDivElement>) {
    if (event.key === 'ArrowUp') onPull(keepIn(height + 44));
    else if (event.key === 'ArrowDown') onPull(keepIn(height - 44));
    else if (event.key === 'Enter') next();
    else return;
    event.preventDefault();
    event.stopPropagation();
  }

  return (
    <div
      className="pull"
      role="separator"
      aria-orientation="horizontal"
      aria-label="Height of the run ledger"
      aria-valuenow={height}
      aria-valuemin={closed}
      aria-valuemax={tall()}
      tabIndex={0}
      data-own-keys
      onKeyDown={handleKey}
      onDoubleClick={next}
      onPointerDown={(event: PointerEvent<HTMLDivElement>) => {
        event.currentTarget.setPointerCapture(event.pointerId);
        start.current = { y: event.clientY, height };
      }}
      onPointerMove={(event) => {
        if (start.current !== null) onPull(keepIn(start.current.height + start.current.y - event.clientY));
      }}
      onPointerUp={() => {
        start.current = null;
      }}
    />
  );
}
