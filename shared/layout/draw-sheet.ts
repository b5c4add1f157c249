import type { Box, Point } from '#shared/kinds/place.ts';
import { basisOf } from '#shared/model/defaults.ts';
import type { Design, Device, EntityId } from '#shared/model/design.ts';

import { colourCode } from './colour-code.ts';
import { placeOf } from './device-place.ts';
import { findHops } from './hops.ts';
import { keepIdentity } from './keep-identity.ts';
import { keptRoute } from './kept-route.ts';
import { addCost, addRun, COST, type RouteGrid } from './route-grid.ts';
import { routeAll, type Route } from './route.ts';
import { runColour } from './run-colour.ts';
import { sheetDevicesOf, sheetRunsOf, type SheetRun } from './run-ends.ts';
import type { RunLayout, SheetLayout } from './sheet-layout.ts';
import { gridOf, spaceOf, takeRunLayout, takeWaysOut } from './sheet-scene.ts';
import { overlaps } from './space.ts';
import { flagBox } from './stubs.ts';
import { placeTags } from './tags.ts';
import { writeLabels } from './write-labels.ts';

/**
 * A sheet laid in order: routes, hops, tags, labels, code letters. With `wanted`, only those runs and what is at their
 * ends are laid anew, and only what is near them is looked at.
 */
export function drawSheet(
  design: Design,
  sheetId: EntityId,
  previous: SheetLayout | undefined,
  wanted: ReadonlySet<EntityId> | null,
): SheetLayout {
  const sheet = design.sheets[sheetId];
  if (sheet === undefined) return { runs: {}, tags: {} };
  const runs = sheetRunsOf(design, sheetId);
  const devices = sheetDevicesOf(design, sheetId);
  const moving = wanted === null ? null : runs.filter(({ run }) => wanted.has(run.id) || !previous?.runs[run.id]);
  const isNear = nearness(moving?.map(endsOf) ?? null, ROUTE_REACH);

  const grid = gridOf(
    design,
    sheet,
    devices.filter((device) => isNear(placeOf(device).box)),
  );
  const routes = new Map<EntityId, Route>();
  for (const sheetRun of runs) {
    const before = previous?.runs[sheetRun.run.id];
    if (before === undefined) continue;
    const kept =
      wanted === null ? keptRoute(grid, design, sheetRun, before) : wanted.has(sheetRun.run.id) ? null : before;
    if (kept !== null) routes.set(sheetRun.run.id, kept);
  }
  const waiting = runs.filter(({ run }) => !routes.has(run.id));
  for (const { points, stubs } of routes.values()) {
    if (!isNear(spanOf(points))) continue;
    addRun(grid, points);
    for (const stub of stubs) addCost(grid, flagBox(stub), COST.inside);
  }
  if (waiting.length > 0) {
    keepOffTags(design, sheetId, grid, { devices, runs, previous, wanted });
    for (const [id, route] of routeAll(design, grid, waiting)) routes.set(id, route);
  }

  const hops = findHops(runs.map(({ run }) => routes.get(run.id)!.points));
  const isClose = nearness(moving?.map(({ run }) => routes.get(run.id)!.points) ?? null, LABEL_REACH);
  const space = spaceOf(
    design,
    sheet,
    devices.filter((device) => isClose(placeOf(device).box)),
  );
  const drawn: RunLayout[] = runs.map(({ run }, i) => {
    const { points, stubs } = routes.get(run.id)!;
    const before = previous?.runs[run.id];
    if (isClose(spanOf(points))) takeRunLayout(space, run, { points, hops: hops[i]!, stubs });
    const colour = (wanted !== null && before?.colour) || runColour(design, run);
    if (before !== undefined && before.points === points && before.colour === colour) {
      return isSamePoints(before.hops, hops[i]!) ? before : { ...before, hops: hops[i]! };
    }
    return { runId: run.id, colour, points, hops: hops[i]!, label: null, codes: [], stubs };
  });
  const touched = moving === null ? null : new Set(moving.flatMap(({ from, to }) => [from?.device.id, to?.device.id]));
  const profile = basisOf(design).profile;
  const written = writeLabels(space, {
    devices,
    runs: runs.map(({ run }, i) => ({
      run,
      drawn: drawn[i]!,
      code: run.link === true ? '' : colourCode(drawn[i]!.colour, profile),
      fromFarEnd: runs[i]!.from === null,
    })),
    previous,
    isClose,
    touched,
    wanted,
  });
  return keepIdentity(written, previous);
}

/** How far round its ends a run may be led, and how far off it anything of its writing stands. */
const ROUTE_REACH = 330;
const LABEL_REACH = 150;

/** Runs lie before tags do, but keep clear of where those will want to stand. */
function keepOffTags(
  design: Design,
  sheetId: EntityId,
  grid: RouteGrid,
  {
    devices,
    runs,
    previous,
    wanted,
  }: {
    readonly devices: readonly Device[];
    readonly runs: readonly SheetRun[];
    readonly previous: SheetLayout | undefined;
    readonly wanted: ReadonlySet<EntityId> | null;
  },
): void {
  if (previous !== undefined) {
    const weight = wanted === null ? COST.tag : COST.text;
    for (const tag of Object.values(previous.tags)) {
      const device = design.devices[tag.deviceId];
      if (device !== undefined && overlaps(reachOfTag(device), tag.box)) addCost(grid, tag.box, weight);
    }
    return;
  }
  const waysOut = spaceOf(design, design.sheets[sheetId]!, devices);
  takeWaysOut(waysOut, runs);
  const unbarred = devices.filter((device) => device.kind !== 'busbar');
  for (const tag of placeTags(waysOut, unbarred).values()) addCost(grid, tag.box, COST.tag);
}

/** Where a device's tag may be, if it has not moved away from it. */
function reachOfTag(device: Device): Box {
  const { x, y, width, height } = placeOf(device).box;
  return { x: x - 16, y: y - 16, width: width + 32, height: height + 32 };
}

function endsOf({ from, to }: SheetRun): readonly Point[] {
  return [from, to].flatMap((end) => (end === null ? [] : [end.terminal]));
}

/** Whether a box is near what the lines span together; everything is when there are none given. */
function nearness(lines: readonly (readonly Point[])[] | null, reach: number): (box: Box) => boolean {
  if (lines === null) return () => true;
  const span = spanOf(lines.flat());
  const [left, right] = [span.x - reach, span.x + span.width + reach];
  const [top, bottom] = [span.y - reach, span.y + span.height + reach];
  return ({ x, y, width, height }) => x <= right && x + width >= left && y <= bottom && y + height >= top;
}

function spanOf(points: readonly Point[]): Box {
  let [left, top, right, bottom] = [Infinity, Infinity, -Infinity, -Infinity];
  for (const { x, y } of points) {
    left = Math.min(left, x);
    right = Math.max(right, x);
    top = Math.min(top, y);
    bottom = Math.max(bottom, y);
  }
  return points.length === 0
    ? { x: 0, y: 0, width: 0, height: 0 }
    : { x: left, y: top, width: right - left, height: bottom - top };
}

function isSamePoints(a: readonly Point[], b: readonly Point[]): boolean {
  return a.length === b.length && a.every((point, i) => point.x === b[i]!.x && point.y === b[i]!.y);
}
