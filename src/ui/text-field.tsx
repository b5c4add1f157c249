import { useId, type InputHTMLAttributes, type ReactNode, type Ref } from 'react';

/** A field of a form that is sent as a whole: sign-in, a new vessel. A wrong value keeps its text and says why below. */
export function TextField({
  caption,
  wrong,
  hint,
  unit,
  alone,
  big = true,
  ref,
  ...rest
}: InputHTMLAttributes<HTMLInputElement> & {
  readonly caption: string;
  readonly wrong?: string;
  readonly hint?: ReactNode;
  readonly unit?: string;
  readonly alone?: boolean;
  readonly big?: boolean;
  readonly ref?: Ref<HTMLInputElement>;
}) {
  const id = useId();
  const says = wrong ?? hint;
  return (
    <label className={['cell edit', big && 'big', alone && 'alone', wrong && 'wrong'].filter(Boolean).join(' ')}>
      <small id={`${id}caption`}>{caption}</small>
      <span className="row">
        <input
          {...rest}
          ref={ref}
          className="in"
          aria-labelledby={`${id}caption`}
          aria-invalid={wrong !== undefined || undefined}
          aria-describedby={says === undefined ? undefined : `${id}says`}
        />
        {unit !== undefined && <span className="unit">{unit}</span>}
      </span>
      {says !== undefined && (
        <span className={wrong === undefined ? 'hint' : 'said'} id={`${id}says`}>
          {says}
        </span>
      )}
    </label>
  );
}
