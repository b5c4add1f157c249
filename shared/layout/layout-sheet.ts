import type { Point } from '#shared/kinds/place.ts';
import { basisOf } from '#shared/model/defaults.ts';
import type { Design, EntityId } from '#shared/model/design.ts';

import { colourCode } from './colour-code.ts';
import { findHops } from './hops.ts';
import { keepIdentity } from './keep-identity.ts';
import { placeCode, placeLabel } from './labels.ts';
import { routeRun } from './route.ts';
import { addCost, COST, type RouteGrid } from './route-grid.ts';
import { runColour } from './run-colour.ts';
import { sheetDevicesOf, sheetRunsOf, type SheetRun } from './run-ends.ts';
import type { CodeLayout, LabelLayout, RunLayout, SheetLayout, StubLayout } from './sheet-layout.ts';
import { gridOf, spaceOf, takeRunLayout, takeWaysOut } from './sheet-scene.ts';
import { grow, take, WEIGHT, type Space } from './space.ts';
import { routeStub } from './stubs.ts';
import { placeTags } from './tags.ts';

/**
 * Everything of a sheet in its place: tags beside their devices, runs round both, hops where runs cross, and labels
 * where nothing else is. The same design gives the same picture; what did not move since `previous` stays the same
 * object.
 */
export function layoutSheet(design: Design, sheetId: EntityId, previous?: SheetLayout): SheetLayout {
  const sheet = design.sheets[sheetId];
  if (sheet === undefined) return { runs: {}, tags: {} };
  const devices = sheetDevicesOf(design, sheetId);
  const runs = sheetRunsOf(design, sheetId);
  const grid = gridOf(design, sheet, devices);

  const waysOut = spaceOf(design, sheet, devices);
  takeWaysOut(waysOut, runs);
  const unbarred = devices.filter((device) => device.kind !== 'busbar');
  for (const tag of placeTags(waysOut, unbarred).values()) addCost(grid, tag.box, COST.tag);
  const routes = routeAll(design, grid, runs);
  const hops = findHops(runs.map(({ run }) => routes.get(run.id)!.points));

  const space = spaceOf(design, sheet, devices);
  runs.forEach(({ run }, i) => takeRunLayout(space, run, { ...routes.get(run.id)!, hops: hops[i]! }));
  const tags = Object.fromEntries(placeTags(space, devices));
  const laid: Record<EntityId, RunLayout> = {};
  runs.forEach((sheetRun, i) => {
    const { points, stubs } = routes.get(sheetRun.run.id)!;
    laid[sheetRun.run.id] = labelled(design, space, sheetRun, {
      points,
      stubs,
      hops: hops[i]!,
      colour: runColour(design, sheetRun.run),
    });
  });
  for (const { run } of runs) {
    const layout = laid[run.id]!;
    laid[run.id] = { ...layout, code: coded(space, design, run.id, layout) };
  }
  return keepIdentity({ runs: laid, tags }, previous);
}

export interface Route {
  readonly points: readonly Point[];
  readonly stubs: readonly StubLayout[];
}

/** Short and straight runs first: they have the least choice. */
export function routeAll(design: Design, grid: RouteGrid, runs: readonly SheetRun[]): Map<EntityId, Route> {
  const routes = new Map<EntityId, Route>();
  const order = [...runs].sort((a, b) => reachOf(a) - reachOf(b));
  for (const sheetRun of order) {
    if (sheetRun.away === null) {
      routes.set(sheetRun.run.id, { points: routeRun(grid, sheetRun), stubs: [] });
      continue;
    }
    const stub = routeStub(design, grid, sheetRun);
    routes.set(
      sheetRun.run.id,
      stub === null ? { points: [], stubs: [] } : { points: stub.points, stubs: [stub.stub] },
    );
  }
  return routes;
}

export function labelled(
  design: Design,
  space: Space,
  { run, from }: SheetRun,
  { points, stubs, hops, colour }: Route & Pick<RunLayout, 'hops' | 'colour'>,
): RunLayout {
  const code = run.link === true ? '' : colourCode(colour, basisOf(design).profile);
  const label: LabelLayout | null = placeLabel(space, run, code, points, from === null);
  if (label !== null) take(space, grow(label.box, 2), WEIGHT.text);
  return { runId: run.id, colour, points, hops, label, code: null, stubs };
}

export function coded(space: Space, design: Design, runId: EntityId, layout: RunLayout): CodeLayout | null {
  const run = design.runs[runId];
  if (run === undefined || layout.stubs.length > 0) return null;
  const letters = run.link === true ? '' : colourCode(layout.colour, basisOf(design).profile);
  const code = placeCode(space, run, letters, layout.points, layout.label);
  if (code !== null) take(space, grow(code.box, 1), WEIGHT.text);
  return code;
}

/** Runs in a straight line first, then by distance; stubs when the sheet's own runs lie. */
function reachOf({ from, to, run }: SheetRun): number {
  if (from === null || to === null) return 1e6;
  const dx = Math.abs(from.terminal.x - to.terminal.x);
  const dy = Math.abs(from.terminal.y - to.terminal.y);
  const bent = (run.bends?.length ?? 0) > 0 ? -1e5 : 0;
  return bent + dx + dy + (dx === 0 || dy === 0 ? 0 : 1000);
}
