import type { Analysis } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';
import { applyPatches, type Patch } from '#shared/model/patch.ts';
import { partsList } from '#shared/lists/parts-list.ts';
import { analyse } from '#shared/rules/analyse.ts';

/** What the page tells the check: a whole design once, then what changed of it. `turn` numbers the states. */
export type CheckWord =
  | { readonly word: 'open'; readonly turn: number; readonly design: Design }
  | { readonly word: 'change'; readonly turn: number; readonly patches: readonly Patch[] };

export interface CheckAnswer {
  readonly turn: number;
  readonly analysis: Analysis;
  readonly tookMs: number;
}

let design: Design | null = null;
let turn = 0;
let isDue = false;

self.addEventListener('message', (event: MessageEvent<CheckWord>) => {
  const said = event.data;
  turn = said.turn;
  if (said.word === 'open') design = said.design;
  else if (design !== null) design = applyPatches(design, said.patches);
  if (isDue) return;
  isDue = true;
  // After the words that already wait in line: of ten quick changes only the last state is checked.
  setTimeout(check, 0);
});

function check(): void {
  isDue = false;
  if (design === null) return;
  const startedMs = performance.now();
  const answer: CheckAnswer = { turn, analysis: analyse(design, { partsOf: partsList }), tookMs: 0 };
  self.postMessage({ ...answer, tookMs: performance.now() - startedMs });
}
