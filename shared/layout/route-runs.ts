import type { Design, EntityId } from '#shared/model/design.ts';

import { findHops } from './hops.ts';
import { keepIdentity } from './keep-identity.ts';
import { coded, labelled, routeAll } from './layout-sheet.ts';
import { addCost, addRun, COST } from './route-grid.ts';
import { runColour } from './run-colour.ts';
import { sheetDevicesOf, sheetRunsOf } from './run-ends.ts';
import type { RunLayout, SheetLayout } from './sheet-layout.ts';
import { gridOf, spaceOf, takeRunLayout } from './sheet-scene.ts';
import { grow, take, WEIGHT } from './space.ts';
import { flagBox } from './stubs.ts';
import { placeTags } from './tags.ts';

/**
 * Only the given runs anew, with the tags of the devices at their ends, while something is dragged: the others keep
 * their routes (and their objects, unless a hop comes or goes). On release `layoutSheet` lays the whole sheet.
 */
export function routeRuns(
  design: Design,
  sheetId: EntityId,
  runIds: readonly EntityId[],
  layout: SheetLayout,
): SheetLayout {
  const sheet = design.sheets[sheetId];
  if (sheet === undefined) return layout;
  const wanted = new Set(runIds);
  const devices = sheetDevicesOf(design, sheetId);
  const runs = sheetRunsOf(design, sheetId);
  const moving = runs.filter(({ run }) => wanted.has(run.id) || layout.runs[run.id] === undefined);
  const staying = runs.filter((sheetRun) => !moving.includes(sheetRun));
  const touched = new Set(moving.flatMap(({ from, to }) => [from?.device.id, to?.device.id]));

  const grid = gridOf(design, sheet, devices);
  for (const [id, tag] of Object.entries(layout.tags)) if (!touched.has(id)) addCost(grid, tag.box, COST.text);
  for (const { run } of staying) {
    const kept = layout.runs[run.id]!;
    addRun(grid, kept.points);
    for (const stub of kept.stubs) addCost(grid, flagBox(stub), COST.inside);
  }
  const routes = routeAll(design, grid, moving);
  const pointsOf = (runId: EntityId) => routes.get(runId)?.points ?? layout.runs[runId]!.points;
  const hops = findHops(runs.map(({ run }) => pointsOf(run.id)));

  const space = spaceOf(design, sheet, devices);
  runs.forEach(({ run }, i) => {
    const kept = layout.runs[run.id];
    const stubs = routes.get(run.id)?.stubs ?? kept!.stubs;
    takeRunLayout(space, run, { points: pointsOf(run.id), hops: hops[i]!, stubs });
  });
  for (const { run } of staying) {
    const label = layout.runs[run.id]!.label;
    if (label !== null) take(space, grow(label.box, 1), WEIGHT.text);
  }
  for (const [id, tag] of Object.entries(layout.tags)) {
    if (!touched.has(id)) take(space, grow(tag.box, 1), WEIGHT.text, id);
  }
  const moved = devices.filter((device) => touched.has(device.id));
  const tags = { ...layout.tags, ...Object.fromEntries(placeTags(space, moved)) };
  const laid: Record<EntityId, RunLayout> = {};
  runs.forEach((sheetRun, i) => {
    const { run } = sheetRun;
    const route = routes.get(run.id);
    if (route === undefined) {
      laid[run.id] = { ...layout.runs[run.id]!, hops: hops[i]! };
      return;
    }
    const fresh = labelled(design, space, sheetRun, {
      ...route,
      hops: hops[i]!,
      colour: layout.runs[run.id]?.colour ?? runColour(design, run),
    });
    laid[run.id] = { ...fresh, code: coded(space, design, run.id, fresh) };
  });
  return keepIdentity({ runs: laid, tags }, layout);
}
