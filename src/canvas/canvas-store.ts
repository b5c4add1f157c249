import { v7 as uuidv7 } from 'uuid';
import { createContext, useContext } from 'react';
import { useStore, type StoreApi } from 'zustand';
import { createStore } from 'zustand/vanilla';

import type { SheetLayout } from '#shared/layout/sheet-layout.ts';
import type { EntityId } from '#shared/model/design.ts';
import type { OpenDesign } from '#src/design/open-design.ts';
import type { IssueFacts } from '#symbols/sheet/title-fields.ts';

import type { Target } from './hit.ts';
import { isSameSelection, keepExisting, NOTHING_SELECTED, type Selection } from './selection.ts';
import { step } from './tools/step.ts';
import { IDLE, type Armed, type Happening, type Tool, type World } from './tools/tool.ts';

export interface View {
  readonly x: number;
  readonly y: number;
  readonly zoom: number;
}

/** What the drawing screen's parts share beside the design: the sheet, the selection, what is in hand. */
export interface CanvasState {
  readonly sheetId: EntityId;
  readonly selection: Selection;
  readonly tool: Tool;
  readonly hover: Target;
  /** Of the sheet as it stands, without what is being dragged. */
  readonly layout: SheetLayout;
  /** Sheet units a pixel of the screen is long. */
  readonly unitsPerPixel: number;
  readonly units: 'us' | 'metric';
  /** For the title block, beside what the design says. */
  readonly facts: IssueFacts;
  /** Where to look, each time anew: the canvas flies there. */
  readonly flight: { readonly to: 'fit' | 'selection'; readonly turn: number };

  happen(happening: Happening): boolean;
  arm(armed: Armed): void;
  select(selection: Selection): void;
  /** Selects, and shows it: on its own sheet, in view. */
  show(selection: Selection): void;
  openSheet(sheetId: EntityId): void;
  fit(): void;
}

const NO_LAYOUT: SheetLayout = { runs: {}, tags: {} };

export function createCanvasStore(
  open: StoreApi<OpenDesign>,
  start: { readonly sheetId: EntityId; readonly selection: Selection; readonly units: 'us' | 'metric' },
): StoreApi<CanvasState> {
  return createStore<CanvasState>()((set, get) => ({
    ...start,
    tool: IDLE,
    hover: { on: 'nothing' },
    layout: NO_LAYOUT,
    unitsPerPixel: 1,
    facts: {},
    flight: { to: 'fit', turn: 0 },

    happen(happening) {
      const before = get();
      const outcome = step(before.tool, happening, worldOf(before, open.getState()));
      if (outcome.edit !== undefined) open.getState().change(outcome.edit.label, outcome.edit.patches);
      if (outcome.tool !== before.tool) set({ tool: outcome.tool });
      if (outcome.selection !== undefined) before.select(outcome.selection);
      if (outcome.goTo !== undefined) {
        set({ sheetId: outcome.goTo.sheetId });
        before.show(outcome.goTo.selection);
      }
      return outcome.handled === true;
    },
    arm(armed) {
      if (open.getState().mayEdit) set({ tool: { is: 'placing', armed, at: null } });
    },
    select(selection) {
      const kept = keepExisting(selection, open.getState().design);
      if (!isSameSelection(kept, get().selection)) set({ selection: kept });
    },
    show(selection) {
      const { design } = open.getState();
      const now = get();
      const kept = keepExisting(selection, design);
      const sheets = sheetsOf(kept, design);
      const sheetId = sheets.size === 0 || sheets.has(now.sheetId) ? now.sheetId : [...sheets][0]!;
      set({
        selection: isSameSelection(kept, now.selection) ? now.selection : kept,
        sheetId,
        tool: sheetId === now.sheetId ? now.tool : IDLE,
        flight: { to: 'selection', turn: now.flight.turn + 1 },
      });
    },
    openSheet(sheetId) {
      if (sheetId !== get().sheetId)
        set({ sheetId, selection: NOTHING_SELECTED, tool: IDLE, hover: { on: 'nothing' } });
    },
    fit: () => set({ flight: { to: 'fit', turn: get().flight.turn + 1 } }),
  }));
}

export function worldOf(canvas: CanvasState, open: OpenDesign): World {
  const { sheetId, layout, selection, unitsPerPixel, units } = canvas;
  return {
    design: open.design,
    sheetId,
    layout,
    selection,
    unitsPerPixel,
    units,
    newId: uuidv7,
    mayEdit: open.mayEdit,
  };
}

function sheetsOf(selection: Selection, design: OpenDesign['design']): Set<EntityId> {
  const sheets = new Set<EntityId>();
  for (const id of selection.devices) sheets.add(design.devices[id]!.sheetId);
  for (const id of selection.runs) {
    const run = design.runs[id]!;
    for (const end of [run.from, run.to]) {
      const device = design.devices[end.device];
      if (device !== undefined) sheets.add(device.sheetId);
    }
  }
  return sheets;
}

export const CanvasContext = createContext<StoreApi<CanvasState> | null>(null);

export function useCanvasStore(): StoreApi<CanvasState> {
  const store = useContext(CanvasContext);
  if (store === null) throw new Error('useCanvas is used outside of a drawing screen');
  return store;
}

export function useCanvas<Selected>(select: (state: CanvasState) => Selected): Selected {
  return useStore(useCanvasStore(), select);
}
