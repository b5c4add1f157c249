import type { ButtonHTMLAttributes } from 'react';

/** What a folded panel leaves at the edge: its name upright, pressed to open it. */
export function EdgeTab({
  side,
  open,
  className,
  ...rest
}: ButtonHTMLAttributes<HTMLButtonElement> & { readonly side: 'left' | 'right'; readonly open: boolean }) {
  return (
    <button
      {...rest}
      type="button"
      aria-expanded={open}
      className={['edge-tab', side, className].filter(Boolean).join(' ')}
    />
  );
}
