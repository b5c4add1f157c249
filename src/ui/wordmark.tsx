/** The mark: a pair of dividers that is an A; its bar is a wire on its terminal. */
export function Mark({ label = 'Ampwright' }: { readonly label?: string }) {
  return (
    <svg className="wmark" viewBox="0 0 34 36" role="img" aria-label={label}>
      <g fill="none" stroke="var(--ink-1)" strokeWidth="3">
        <path d="M17.6 8.5L8.5 31M20.4 8.5L29.5 31" />
        <circle cx="19" cy="6.5" r="3" strokeWidth="2.6" />
      </g>
      <path d="M6.5 22H29" stroke="var(--signal)" strokeWidth="3" fill="none" />
      <circle cx="4" cy="22" r="2.6" fill="none" stroke="var(--signal)" strokeWidth="2" />
    </svg>
  );
}
