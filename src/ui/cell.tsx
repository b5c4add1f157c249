import { useEffect, useId, useRef, useState, type KeyboardEvent, type ReactNode } from 'react';

/** What reading a typed text gives: a value, or a line that says what is accepted. */
export type Reading<Value> =
  { readonly ok: true; readonly value: Value } | { readonly ok: false; readonly says: string };

interface CellFrame {
  readonly caption: string;
  /** For marks, sizes and codes. */
  readonly mono?: boolean;
  /** Current on its page. */
  readonly on?: boolean;
  readonly big?: boolean;
  /** Stands alone, with all four edges. */
  readonly alone?: boolean;
  readonly className?: string;
}

/** A fact with its caption. `waiting` draws a dotted rule in the place of the value. */
export function Cell({
  caption,
  mono,
  on,
  alone,
  className,
  waiting,
  children,
}: CellFrame & { readonly waiting?: boolean; readonly children?: ReactNode }) {
  return (
    <div className={join('cell', on && 'on', alone && 'alone', waiting && 'wait', className)}>
      <small>{caption}</small>
      <b className={mono ? 'mono' : undefined}>{waiting ? '\u00a0' : children}</b>
    </div>
  );
}

/**
 * A field in a cell. The unit stands in the cell and is also read when typed. Enter keeps, Escape restores, leaving
 * the field keeps; a text that can't be read stays as typed, with one line below saying what is accepted.
 */
export function EditCell<Value>({
  caption,
  mono,
  on,
  big,
  alone,
  className,
  value,
  unit,
  read,
  onKeep,
  placeholder,
  hint,
  label,
  inputMode,
}: CellFrame & {
  /** As it reads while nobody types. */
  readonly value: string;
  readonly unit?: string;
  readonly read: (text: string) => Reading<Value>;
  readonly onKeep: (value: Value) => void;
  /** What counts while nothing is typed: a default is shown so. */
  readonly placeholder?: string;
  readonly hint?: ReactNode;
  /** Accessible name where the caption alone is not enough. */
  readonly label?: string;
  readonly inputMode?: 'text' | 'decimal' | 'numeric' | 'email';
}) {
  const [text, setText] = useState(value);
  const [wrong, setWrong] = useState<string | null>(null);
  const typing = useRef(false);
  const id = useId();

  useEffect(() => {
    if (!typing.current) setText(value);
  }, [value]);

  function keep(): boolean {
    if (text.trim() === value.trim()) {
      typing.current = false;
      setText(value);
      setWrong(null);
      return true;
    }
    const reading = read(text);
    if (!reading.ok) {
      setWrong(reading.says);
      return false;
    }
    typing.current = false;
    setWrong(null);
    onKeep(reading.value);
    return true;
  }

  function restore() {
    typing.current = false;
    setText(value);
    setWrong(null);
  }

  function handleKey(event: KeyboardEvent<HTMLInputElement>) {
    if (event.key === 'Enter' && !event.nativeEvent.isComposing) {
      event.preventDefault();
      if (keep()) event.currentTarget.select();
    } else if (event.key === 'Escape' && (typing.current || wrong !== null)) {
      event.preventDefault();
      event.stopPropagation();
      restore();
    }
  }

  return (
    <label
      className={join(
        'cell edit',
        mono && 'mono',
        on && 'on',
        big && 'big',
        alone && 'alone',
        wrong && 'wrong',
        className,
      )}
    >
      <small id={`${id}caption`}>{caption}</small>
      <span className="row">
        <input
          className="in"
          value={text}
          data-kept={text === value || undefined}
          placeholder={placeholder}
          {...nameOf(id, label, wrong ?? hint)}
          aria-invalid={wrong !== null || undefined}
          inputMode={inputMode}
          autoComplete="off"
          spellCheck={false}
          onFocus={(event) => event.currentTarget.select()}
          onChange={(event) => {
            typing.current = true;
            setText(event.currentTarget.value);
            setWrong(null);
          }}
          onKeyDown={handleKey}
          onBlur={keep}
        />
        {unit !== undefined && unit !== '' && <span className="unit">{unit}</span>}
      </span>
      {wrong !== null && (
        <span className="said" id={`${id}says`} role="alert">
          {wrong}
        </span>
      )}
      {hint !== undefined && wrong === null && (
        <span className="hint" id={`${id}says`}>
          {hint}
        </span>
      )}
    </label>
  );
}

export interface Choice {
  readonly value: string;
  readonly title: string;
}

/** A choice in a cell; the system's own list, so that thumbs, keys and screen readers find what they know. */
export function PickCell({
  caption,
  mono,
  on,
  big,
  alone,
  className,
  value,
  choices,
  onPick,
  label,
  hint,
  isDefault,
}: CellFrame & {
  readonly value: string;
  readonly choices: readonly Choice[];
  readonly onPick: (value: string) => void;
  readonly label?: string;
  readonly hint?: ReactNode;
  /** The value shown is the default and nobody has chosen it. */
  readonly isDefault?: boolean;
}) {
  const id = useId();
  return (
    <label className={join('cell edit pick', mono && 'mono', on && 'on', big && 'big', alone && 'alone', className)}>
      <small id={`${id}caption`}>{caption}</small>
      <span className="row">
        <select
          className={join('in', isDefault && 'default')}
          value={value}
          {...nameOf(id, label, hint)}
          onChange={(event) => onPick(event.currentTarget.value)}
        >
          {choices.map((choice) => (
            <option key={choice.value} value={choice.value}>
              {choice.title}
            </option>
          ))}
        </select>
      </span>
      {hint !== undefined && (
        <span className="hint" id={`${id}says`}>
          {hint}
        </span>
      )}
    </label>
  );
}

/** A field is called by its caption alone; what stands below it describes it, so that names stay short when read out. */
function nameOf(id: string, label: string | undefined, says: ReactNode) {
  return {
    'aria-label': label,
    'aria-labelledby': label === undefined ? `${id}caption` : undefined,
    'aria-describedby': says === undefined ? undefined : `${id}says`,
  };
}

function join(...names: readonly (string | false | null | undefined)[]): string {
  return names.filter(Boolean).join(' ');
}
