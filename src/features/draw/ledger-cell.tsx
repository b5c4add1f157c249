import { useEffect, useRef, useState, type KeyboardEvent } from 'react';

import type { Reading } from '#src/ui/cell.tsx';

/** A cell of the ledger while it is typed in. Enter keeps and goes down, Tab keeps and goes right, Escape restores. */
export function TypedCell({
  text,
  label,
  first,
  read,
  onKeep,
  onLeave,
}: {
  readonly text: string;
  readonly label: string;
  /** The key that began it replaces what stood there. */
  readonly first: string | null;
  readonly read: (text: string) => Reading<unknown>;
  readonly onKeep: (value: unknown) => void;
  readonly onLeave: (way: 'stay' | 'down' | 'right' | 'left') => void;
}) {
  const [typed, setTyped] = useState(first ?? text);
  const [wrong, setWrong] = useState<string | null>(null);
  const input = useRef<HTMLInputElement>(null);
  /** Left by a key: the blur that follows is not another keeping. */
  const isOver = useRef(false);

  useEffect(() => {
    input.current?.focus();
    if (first === null) input.current?.select();
  }, [first]);

  function keep(way: 'stay' | 'down' | 'right' | 'left'): void {
    if (isOver.current) return;
    if (typed.trim() !== text.trim()) {
      const reading = read(typed);
      if (!reading.ok) {
        setWrong(reading.says);
        return;
      }
      onKeep(reading.value);
    }
    isOver.current = true;
    onLeave(way);
  }

  function handleKey(event: KeyboardEvent<HTMLInputElement>) {
    event.stopPropagation();
    if (event.nativeEvent.isComposing) return;
    if (event.key === 'Enter') keep('down');
    else if (event.key === 'Tab') keep(event.shiftKey ? 'left' : 'right');
    else if (event.key === 'Escape') {
      isOver.current = true;
      onLeave('stay');
    } else return;
    event.preventDefault();
  }

  return (
    <span className={wrong === null ? 'typed' : 'typed wrong'}>
      <input
        ref={input}
        value={typed}
        aria-label={label}
        aria-invalid={wrong !== null || undefined}
        autoComplete="off"
        spellCheck={false}
        onChange={(event) => {
          setTyped(event.currentTarget.value);
          setWrong(null);
        }}
        onKeyDown={handleKey}
        onBlur={() => keep('stay')}
      />
      {wrong !== null && (
        <span className="said" role="alert">
          {wrong}
        </span>
      )}
    </span>
  );
}
