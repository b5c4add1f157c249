import type { ReactNode } from 'react';

export type SeverityName = 'must' | 'should' | 'note' | 'good';

const WORDS: Readonly<Record<SeverityName, string>> = {
  must: 'must fix',
  should: 'should fix',
  note: 'note',
  good: 'good',
};

const SHAPES: Readonly<Record<SeverityName, ReactNode>> = {
  must: <path d="M4.3.5h5.4L13.5 4.3v5.4L9.7 13.5H4.3L.5 9.7V4.3Z" />,
  should: <path d="M7 .8L13.6 13H.4Z" />,
  note: <circle cx="7" cy="7" r="6" />,
  good: <path d="M1.5 7.5L5.5 11.5L12.5 2.5" />,
};

/** A shape, a word and a colour; never the colour alone. */
export function Severity({ of, children }: { readonly of: SeverityName; readonly children?: ReactNode }) {
  return (
    <span className={`sev ${of}`}>
      <svg viewBox="0 0 14 14" aria-hidden="true">
        {SHAPES[of]}
      </svg>
      {children ?? WORDS[of]}
    </span>
  );
}

/** The shape alone, where the word stands beside it anyway. */
export function SeverityShape({ of }: { readonly of: SeverityName }) {
  return (
    <span className={`sev ${of}`} role="img" aria-label={WORDS[of]}>
      <svg viewBox="0 0 14 14" aria-hidden="true">
        {SHAPES[of]}
      </svg>
    </span>
  );
}
