import { keepIdentity } from '#shared/layout/keep-identity.ts';
import { routeRuns } from '#shared/layout/route-runs.ts';
import { runColour } from '#shared/layout/run-colour.ts';
import type { RunLayout, SheetLayout } from '#shared/layout/sheet-layout.ts';
import { boxOf, terminalsOf } from '#shared/kinds/place.ts';
import type { Design, Device, EntityId, Run } from '#shared/model/design.ts';
import { differenceBetween } from '#src/design/difference.ts';

import type { LayoutAnswer, LayoutWord } from './layout-worker.ts';

/** The layout of a large sheet, worked out beside the page: the picture never waits for it. */
export interface LayoutBeside {
  /** What to show now of a state of the design; the whole layout of it is told later. */
  follow(design: Design): SheetLayout;
  stop(): void;
}

const EMPTY: SheetLayout = { runs: {}, tags: {} };
/** More runs than this that changed at once are left to the worker. */
const MOST_AT_ONCE = 24;

export function layBeside(
  first: Design,
  sheetId: EntityId,
  shown: SheetLayout | undefined,
  onLayout: (layout: SheetLayout) => void,
): LayoutBeside {
  const worker = new Worker(new URL('./layout-worker.ts', import.meta.url), { type: 'module', name: 'layout' });
  const tell = (word: LayoutWord) => worker.postMessage(word);
  let known = first;
  let layout = shown ?? EMPTY;
  let turn = 1;
  worker.addEventListener('message', ({ data }: MessageEvent<LayoutAnswer>) => {
    // An older state: those who changed it since are already drawn, and its own answer is on the way.
    if (data.turn !== turn) return;
    layout = keepIdentity(data.layout, layout);
    onLayout(layout);
  });
  tell({ word: 'open', turn, sheetId, design: first, layout: shown });

  return {
    follow(design) {
      if (design === known) return layout;
      const patches = differenceBetween(known, design).filter(({ path }) => path[0] !== 'modes');
      if (patches.length > 0) {
        turn += 1;
        tell({ word: 'change', turn, patches });
        layout = layInTheMeantime(known, design, sheetId, layout);
      }
      known = design;
      return layout;
    },
    stop: () => worker.terminate(),
  };
}

/** Of what is on the screen, all that nobody touched; and what was touched, when it is little enough to lay at once. */
function layInTheMeantime(before: Design, after: Design, sheetId: EntityId, layout: SheetLayout): SheetLayout {
  const moved = new Set<EntityId>();
  for (const device of Object.values(after.devices)) {
    const old = before.devices[device.id];
    if (old !== device && device.sheetId === sheetId && (old === undefined || !standsTheSame(old, device))) {
      moved.add(device.id);
    }
  }
  const stale = Object.values(after.runs)
    .filter((run) => isOnSheet(after, run, sheetId) && isStale(before.runs[run.id], run, moved, layout))
    .map(({ id }) => id);
  const isToLay = new Set(stale);
  const runs: Record<EntityId, RunLayout> = {};
  for (const [id, drawn] of Object.entries(layout.runs)) {
    const run = after.runs[id];
    if (run === undefined || !isOnSheet(after, run, sheetId) || isToLay.has(id)) continue;
    const colour = runColour(after, run);
    runs[id] = colour === drawn.colour ? drawn : { ...drawn, colour };
  }
  const tags = Object.fromEntries(
    Object.entries(layout.tags).filter(([id]) => after.devices[id]?.sheetId === sheetId && !moved.has(id)),
  );
  const isSettled = Object.keys(layout.runs).length > 0 || Object.keys(before.runs).length === 0;
  if (!isSettled || stale.length > MOST_AT_ONCE || (stale.length === 0 && moved.size === 0)) return { runs, tags };
  return routeRuns(after, sheetId, stale, { runs: { ...layout.runs, ...runs }, tags });
}

function isStale(before: Run | undefined, run: Run, moved: ReadonlySet<EntityId>, layout: SheetLayout): boolean {
  if (moved.has(run.from.device) || moved.has(run.to.device)) return true;
  if (before === run) return layout.runs[run.id] === undefined;
  if (before === undefined) return true;
  return !isSame([before.from, before.to, before.bends ?? []], [run.from, run.to, run.bends ?? []]);
}

function isOnSheet(design: Design, run: Run, sheetId: EntityId): boolean {
  return [run.from, run.to].some(({ device }) => design.devices[device]?.sheetId === sheetId);
}

function standsTheSame(a: Device, b: Device): boolean {
  return a.sheetId === b.sheetId && isSame([boxOf(a), terminalsOf(a)], [boxOf(b), terminalsOf(b)]);
}

function isSame(a: unknown, b: unknown): boolean {
  return JSON.stringify(a) === JSON.stringify(b);
}
