import type { KeyboardEvent } from 'react';

export interface Tab {
  readonly id: string;
  readonly title: string;
}

/** Tabs along the lower edge of the paper. Arrows go along them, as screen readers expect. */
export function Tabs({
  label,
  tabs,
  current,
  onChoose,
  panelId,
}: {
  readonly label: string;
  readonly tabs: readonly Tab[];
  readonly current: string;
  readonly onChoose: (id: string) => void;
  readonly panelId?: string;
}) {
  function handleKey(event: KeyboardEvent<HTMLDivElement>) {
    const step = { ArrowRight: 1, ArrowLeft: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    const at = tabs.findIndex((tab) => tab.id === current);
    const next = tabs[(at + step + tabs.length) % tabs.length];
    if (next === undefined) return;
    onChoose(next.id);
    event.currentTarget.querySelector<HTMLElement>(`[data-tab="${CSS.escape(next.id)}"]`)?.focus();
  }

  return (
    <div className="tabs" role="tablist" aria-label={label} onKeyDown={handleKey}>
      {tabs.map((tab) => (
        <button
          key={tab.id}
          type="button"
          role="tab"
          data-tab={tab.id}
          aria-selected={tab.id === current}
          aria-controls={panelId}
          tabIndex={tab.id === current ? 0 : -1}
          onClick={() => onChoose(tab.id)}
        >
          {tab.title}
        </button>
      ))}
    </div>
  );
}
