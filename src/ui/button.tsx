import type { ButtonHTMLAttributes, Ref } from 'react';

export interface ButtonProps extends ButtonHTMLAttributes<HTMLButtonElement> {
  /** `go` is the one primary action of a screen, `plain` is underlined text. */
  readonly look?: 'go' | 'plain' | 'normal';
  /** What the key is, shown behind the words. */
  readonly kbd?: string;
  readonly wide?: boolean;
  /** Stays focusable and says that it can't be pressed; the reason stands beside it on the page. */
  readonly off?: boolean;
  readonly ref?: Ref<HTMLButtonElement>;
}

export function Button({ look = 'normal', kbd, wide, off, className, children, onClick, type, ...rest }: ButtonProps) {
  return (
    <button
      {...rest}
      type={type ?? 'button'}
      aria-disabled={off || undefined}
      className={buttonClass(look, wide, className)}
      onClick={(event) => {
        if (off) event.preventDefault();
        else onClick?.(event);
      }}
    >
      {children}
      {kbd !== undefined && <kbd aria-hidden="true">{kbd}</kbd>}
    </button>
  );
}

/** For a link that looks like a button. */
export function buttonClass(look: ButtonProps['look'] = 'normal', wide = false, more = ''): string {
  return ['btn', look === 'normal' ? '' : look, wide ? 'wide' : '', more].filter(Boolean).join(' ');
}
