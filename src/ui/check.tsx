import type { ReactNode } from 'react';

/** A tick in a square, or one of several in a ring. */
export function Check({
  checked,
  onChange,
  children,
  radio,
  name,
  disabled,
  className,
}: {
  readonly checked: boolean;
  readonly onChange: (checked: boolean) => void;
  readonly children: ReactNode;
  readonly radio?: boolean;
  readonly name?: string;
  readonly disabled?: boolean;
  readonly className?: string;
}) {
  return (
    <label className={['check', className].filter(Boolean).join(' ')}>
      <input
        type={radio ? 'radio' : 'checkbox'}
        name={name}
        checked={checked}
        disabled={disabled}
        onChange={(event) => onChange(event.currentTarget.checked)}
      />
      <span>{children}</span>
    </label>
  );
}
