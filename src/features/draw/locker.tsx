import { useMemo, useState } from 'react';

import { KINDS } from '#shared/kinds/index.ts';
import { DRAWERS, type Drawer, type Kind } from '#shared/kinds/kind.ts';
import { boxOf } from '#shared/kinds/place.ts';
import { useCanvas, useCanvasStore } from '#src/canvas/canvas-store.ts';
import { ghostOf } from '#src/canvas/tools/placing.ts';
import type { Armed } from '#src/canvas/tools/tool.ts';
import { FindField } from '#src/ui/find-field.tsx';
import { screenInk } from '#symbols/ink.ts';
import { DeviceSymbol } from '#symbols/sheet/device-symbol.tsx';

interface Item {
  readonly title: string;
  readonly drawer: Drawer;
  readonly letter: string;
  readonly armed: Armed;
}

const PANEL_WAYS = [6, 12] as const;

const ITEMS: readonly Item[] = [
  ...(KINDS as unknown as readonly Kind[]).flatMap((kind) =>
    kind.offers.map((offer): Item => ({
      title: offer.title,
      drawer: kind.drawer,
      letter: kind.letter(offer.symbol),
      armed: { what: 'device', partId: offer.partId },
    })),
  ),
  ...PANEL_WAYS.map((ways): Item => ({
    title: `Fuse panel, ${ways} ways`,
    drawer: 'Protect',
    letter: 'F',
    armed: { what: 'fuse-panel', ways },
  })),
];

/** Drawers that hold something, with their letter codes. */
const STOCKED = DRAWERS.map((drawer) => {
  const items = ITEMS.filter((item) => item.drawer === drawer);
  return { drawer, items, letters: [...new Set(items.map((item) => item.letter))].join(' ') };
}).filter(({ items }) => items.length > 0);

/** What can be put on a sheet, by its place in the system. A press arms it, the next click on the sheet places it. */
export function Locker({ onArm }: { readonly onArm?: () => void }) {
  const [openDrawer, setOpenDrawer] = useState<Drawer | null>('Store');
  const [sought, setSought] = useState('');
  const found = useMemo(() => findItems(sought), [sought]);

  return (
    <aside className="locker" aria-label="Locker">
      <h2 className="visually-hidden">Locker</h2>
      <FindField label="Find a device" value={sought} onChange={setSought} />
      <div className="drawers">
        {sought.trim() !== '' ? (
          <section className="drawer open">
            <ItemList items={found} onArm={onArm} />
            {found.length === 0 && <p className="foot">Nothing of that name. Try what it does: fuse, pump, light.</p>}
          </section>
        ) : (
          STOCKED.map(({ drawer, items, letters }) => {
            const isOpen = drawer === openDrawer;
            return (
              <section key={drawer} className={isOpen ? 'drawer open' : 'drawer'}>
                <h3>
                  <button type="button" aria-expanded={isOpen} onClick={() => setOpenDrawer(isOpen ? null : drawer)}>
                    <span>{drawer}</span>
                    <em>{letters}</em>
                  </button>
                </h3>
                {isOpen && <ItemList items={items} onArm={onArm} />}
              </section>
            );
          })
        )}
      </div>
      <p className="foot">Drag a symbol to the sheet, or press Enter on it and click where it stands.</p>
    </aside>
  );
}

function ItemList({ items, onArm }: { readonly items: readonly Item[]; readonly onArm?: () => void }) {
  const canvas = useCanvasStore();
  const armed = useCanvas(({ tool }) => (tool.is === 'placing' ? nameArmed(tool.armed) : null));
  return (
    <ul className="kinds">
      {items.map((item) => (
        <li key={nameArmed(item.armed)}>
          <button
            type="button"
            aria-pressed={armed === nameArmed(item.armed)}
            onPointerDown={(event) => {
              // Held down it is dragged to the sheet; let go here it stays in hand for a click.
              if (event.pointerType === 'mouse' && event.button === 0) canvas.getState().arm(item.armed);
            }}
            onClick={() => {
              canvas.getState().arm(item.armed);
              onArm?.();
            }}
          >
            <ItemSymbol armed={item.armed} />
            <span>{item.title}</span>
          </button>
        </li>
      ))}
    </ul>
  );
}

/** At true size where it fits its row; what is larger, a long busbar or a battery, is drawn smaller. */
function ItemSymbol({ armed }: { readonly armed: Armed }) {
  const box = armed.what === 'fuse-panel' ? { width: PANEL.width, height: PANEL.height } : boxOf(ghostOf(armed.partId));
  const scale = Math.max(1, box.width / (ROOM.width - 4), box.height / (ROOM.height - 4));
  const [width, height] = [ROOM.width * scale, ROOM.height * scale];
  return (
    <svg
      viewBox={`${(box.width - width) / 2} ${(box.height - height) / 2} ${width} ${height}`}
      width={ROOM.width}
      height={ROOM.height}
      aria-hidden="true"
    >
      {armed.what === 'fuse-panel' ? <PanelSymbol /> : <DeviceSymbol device={ghostOf(armed.partId)} ink={screenInk} />}
    </svg>
  );
}

/** What a symbol has in its row. */
const ROOM = { width: 60, height: 34 };
const PANEL = { width: 56, height: 26 };

function PanelSymbol() {
  return (
    <g fill="none" stroke="var(--ink-1)">
      <path d="M0 3H56" strokeWidth={6} />
      <path
        d="M8 3V26M18 3V26M28 3V26M38 3V26M48 3V26M5 10h6v10h-6ZM15 10h6v10h-6ZM25 10h6v10h-6ZM35 10h6v10h-6ZM45 10h6v10h-6Z"
        strokeWidth={1.2}
      />
    </g>
  );
}

function nameArmed(armed: Armed): string {
  return armed.what === 'device' ? armed.partId : `fuse-panel-${armed.ways}`;
}

function findItems(sought: string): Item[] {
  const words = sought.toLowerCase().split(/\s+/).filter(Boolean);
  return ITEMS.filter((item) => {
    const text = `${item.title} ${item.drawer} ${nameArmed(item.armed).replaceAll('-', ' ')}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
}
