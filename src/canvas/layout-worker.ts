import type { SheetLayout } from '#shared/layout/sheet-layout.ts';
import { layoutSheet } from '#shared/layout/layout-sheet.ts';
import { rememberBends } from '#shared/layout/kept-route.ts';
import type { Design, EntityId } from '#shared/model/design.ts';
import { applyPatches, type Patch } from '#shared/model/patch.ts';

/** What the page tells the layout beside it: a whole design once, then what changed of it. `turn` numbers the states. */
export type LayoutWord =
  | {
      readonly word: 'open';
      readonly turn: number;
      readonly sheetId: EntityId;
      readonly design: Design;
      /** What is on the screen: it stays where it lies. */
      readonly layout: SheetLayout | undefined;
    }
  | { readonly word: 'change'; readonly turn: number; readonly patches: readonly Patch[] };

export interface LayoutAnswer {
  readonly turn: number;
  readonly layout: SheetLayout;
}

let state: { design: Design; readonly sheetId: EntityId; layout: SheetLayout | undefined } | null = null;
let turn = 0;
let isDue = false;

self.addEventListener('message', (event: MessageEvent<LayoutWord>) => {
  const said = event.data;
  turn = said.turn;
  if (said.word === 'open') state = openSheet(said);
  else if (state !== null) state.design = applyPatches(state.design, said.patches);
  if (isDue) return;
  isDue = true;
  // After the words that already wait in line: of ten quick changes only the last state is laid out.
  setTimeout(lay, 0);
});

function openSheet({ design, sheetId, layout }: Extract<LayoutWord, { word: 'open' }>) {
  for (const { runId, points } of Object.values(layout?.runs ?? {})) {
    const run = design.runs[runId];
    if (run !== undefined) rememberBends(points, run);
  }
  return { design, sheetId, layout };
}

function lay(): void {
  isDue = false;
  if (state === null) return;
  state.layout = layoutSheet(state.design, state.sheetId, state.layout);
  self.postMessage({ turn, layout: state.layout } satisfies LayoutAnswer);
}
