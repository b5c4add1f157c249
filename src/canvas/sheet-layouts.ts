import { layoutSheet } from '#shared/layout/layout-sheet.ts';
import type { SheetLayout } from '#shared/layout/sheet-layout.ts';
import type { Design, EntityId } from '#shared/model/design.ts';

import { layBeside, type LayoutBeside } from './layout-beside.ts';

/** The layouts of the sheets that were looked at: what lies stays where it lies, also when one comes back to a sheet. */
export interface SheetLayouts {
  layoutOf(design: Design, sheetId: EntityId): SheetLayout;
  stop(): void;
  /** Goes on after a stop: React in development takes a screen away and brings it back at once. */
  resume(): void;
}

interface Laid {
  design: Design;
  layout: SheetLayout;
  beside: LayoutBeside | null;
}

/** A sheet of more runs than this takes longer to lay than a frame lasts. */
const MOST_RUNS_HERE = 80;

/** `onLayout` is told when a layout of the last state has come in that was not there when it was asked for. */
export function createSheetLayouts(onLayout: () => void): SheetLayouts {
  const laid = new Map<EntityId, Laid>();
  let isStopped = false;

  function layBesideOf(sheetId: EntityId, first: Design, shown: SheetLayout | undefined): LayoutBeside {
    for (const other of laid.values()) {
      other.beside?.stop();
      other.beside = null;
    }
    return layBeside(first, sheetId, shown, (layout) => {
      const known = laid.get(sheetId);
      if (known === undefined) return;
      known.layout = layout;
      onLayout();
    });
  }

  return {
    layoutOf(design, sheetId) {
      const known = laid.get(sheetId);
      if (known !== undefined && isDrawnAlike(known.design, design)) return known.layout;
      const isLarge = (known?.beside ?? null) !== null || countRuns(design, sheetId) > MOST_RUNS_HERE;
      const beside = isLarge ? (known?.beside ?? layBesideOf(sheetId, known?.design ?? design, known?.layout)) : null;
      const layout = beside?.follow(design) ?? layoutSheet(design, sheetId, known?.layout);
      laid.set(sheetId, { design, layout, beside });
      return layout;
    },
    stop() {
      for (const { beside } of laid.values()) beside?.stop();
      laid.clear();
      isStopped = true;
    },
    resume() {
      if (isStopped) onLayout();
      isStopped = false;
    },
  };
}

/** What the layout does not read does not lay it anew. */
function isDrawnAlike(a: Design, b: Design): boolean {
  return (['sheets', 'devices', 'runs', 'zones', 'notes', 'basis'] as const).every((part) => a[part] === b[part]);
}

function countRuns(design: Design, sheetId: EntityId): number {
  let count = 0;
  for (const { from, to } of Object.values(design.runs)) {
    if (design.devices[from.device]?.sheetId === sheetId || design.devices[to.device]?.sheetId === sheetId) count += 1;
  }
  return count;
}
