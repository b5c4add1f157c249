import { useEffect, useRef } from 'react';

/** Filters a list as one types. `/` goes to it from anywhere on the page, Escape clears it and then leaves. */
export function FindField({
  label,
  value,
  onChange,
  slash = true,
  className,
}: {
  readonly label: string;
  readonly value: string;
  readonly onChange: (text: string) => void;
  /** Whether `/` leads here; one field on a page. */
  readonly slash?: boolean;
  readonly className?: string;
}) {
  const input = useRef<HTMLInputElement>(null);

  useEffect(() => {
    if (!slash) return undefined;
    function handleKey(event: KeyboardEvent) {
      if (event.key !== '/' || event.ctrlKey || event.metaKey || isTyping(event.target)) return;
      event.preventDefault();
      input.current?.focus();
    }
    document.addEventListener('keydown', handleKey);
    return () => document.removeEventListener('keydown', handleKey);
  }, [slash]);

  return (
    <label className={['find', className].filter(Boolean).join(' ')}>
      <input
        ref={input}
        type="search"
        aria-label={label}
        placeholder={label}
        value={value}
        onChange={(event) => onChange(event.currentTarget.value)}
        onKeyDown={(event) => {
          if (event.key !== 'Escape') return;
          event.stopPropagation();
          if (value === '') event.currentTarget.blur();
          else onChange('');
        }}
      />
      {slash && <kbd aria-hidden="true">/</kbd>}
    </label>
  );
}

function isTyping(target: EventTarget | null): boolean {
  return (
    target instanceof HTMLElement && (target.isContentEditable || /^(INPUT|TEXTAREA|SELECT)$/.test(target.tagName))
  );
}
