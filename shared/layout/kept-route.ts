import type { Box, Point } from '#shared/kinds/place.ts';
import type { Design, Run } from '#shared/model/design.ts';

import { placeOf } from './device-place.ts';
import { COST, nodeAt, pointOf, type RouteGrid } from './route-grid.ts';
import type { Route } from './route.ts';
import type { SheetRun } from './run-ends.ts';
import type { RunLayout } from './sheet-layout.ts';
import { stubText } from './stubs.ts';

/** The corners a person had put when a route was found: a route stays only as long as they do. */
const bendsOf = new WeakMap<readonly Point[], string>();

export function rememberBends(points: readonly Point[], run: Run): void {
  bendsOf.set(points, printBends(run));
}

/** A run's route of before, if its ends are where they were and nothing has come in its way since; else null. */
export function keptRoute(grid: RouteGrid, design: Design, sheetRun: SheetRun, before: RunLayout): Route | null {
  const { run, from, to, away } = sheetRun;
  const { points, stubs } = before;
  if (points.length < 2 || bendsOf.get(points) !== printBends(run)) return null;
  const ends = [points[0]!, points.at(-1)!];
  if (away === null) {
    if (stubs.length > 0 || !isAt(from?.terminal, ends[0]!) || !isAt(to?.terminal, ends[1]!)) return null;
  } else {
    if (!isAt((from ?? to)?.terminal, ends[0]!)) return null;
    if (stubs[0]?.text !== stubText(design, away) || stubs[0].to.deviceId !== away.id) return null;
  }
  const own = [from, to].flatMap((end) => (end === null ? [] : [placeOf(end.device).box]));
  return isBarred(grid, points, own) ? null : { points, stubs };
}

/** Through or along a device that is not its own, through a terminal, or off the sheet. */
function isBarred(grid: RouteGrid, points: readonly Point[], own: readonly Box[]): boolean {
  const [start, end] = [nodeAt(grid, points[0]!), nodeAt(grid, points.at(-1)!)];
  for (let i = 1; i < points.length; i++) {
    const [a, b] = [nodeAt(grid, points[i - 1]!), nodeAt(grid, points[i]!)];
    const stride = points[i - 1]!.y === points[i]!.y ? 1 : grid.columns;
    for (let node = Math.min(a, b); node <= Math.max(a, b); node += stride) {
      if (node === start || node === end) continue;
      if (grid.corner[node]! > 0 || grid.cost[node]! >= COST.offSheet) return true;
      if (grid.cost[node]! >= COST.edge && !own.some((box) => touches(box, pointOf(grid, node)))) return true;
    }
  }
  return false;
}

export function touches({ x, y, width, height }: Box, point: Point): boolean {
  return point.x >= x && point.x <= x + width && point.y >= y && point.y <= y + height;
}

function isAt(terminal: Point | undefined, point: Point): boolean {
  return terminal !== undefined && terminal.x === point.x && terminal.y === point.y;
}

function printBends({ bends }: Run): string {
  return (bends ?? []).map(({ x, y }) => `${x},${y}`).join(' ');
}
