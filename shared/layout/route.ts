import type { Point } from '#shared/kinds/place.ts';
import type { Design, EntityId } from '#shared/model/design.ts';

import { placeOf } from './device-place.ts';
import { findPath, type Direction, type PathEnd } from './find-path.ts';
import { rememberBends, touches } from './kept-route.ts';
import { addRun, COST, nodeAt, pointOf, type RouteGrid } from './route-grid.ts';
import type { RunEnd, SheetRun } from './run-ends.ts';
import type { StubLayout } from './sheet-layout.ts';
import { routeStub } from './stubs.ts';

export interface Route {
  readonly points: readonly Point[];
  readonly stubs: readonly StubLayout[];
}

/** Short and straight runs first: they have the least choice. Each is then in the way of the next. */
export function routeAll(design: Design, grid: RouteGrid, runs: readonly SheetRun[]): Map<EntityId, Route> {
  const routes = new Map<EntityId, Route>();
  const order = [...runs].sort((a, b) => reachOf(a) - reachOf(b));
  for (const sheetRun of order) {
    const route =
      sheetRun.away === null ? { points: routeRun(grid, sheetRun), stubs: [] } : stubRoute(design, grid, sheetRun);
    rememberBends(route.points, sheetRun.run);
    routes.set(sheetRun.run.id, route);
  }
  return routes;
}

function stubRoute(design: Design, grid: RouteGrid, sheetRun: SheetRun): Route {
  const found = routeStub(design, grid, sheetRun);
  return found === null ? { points: [], stubs: [] } : { points: found.points, stubs: [found.stub] };
}

/** Runs in a straight line first, then by distance; stubs when the sheet's own runs lie. */
function reachOf({ from, to, run }: SheetRun): number {
  if (from === null || to === null) return 1e6;
  const dx = Math.abs(from.terminal.x - to.terminal.x);
  const dy = Math.abs(from.terminal.y - to.terminal.y);
  const bent = (run.bends?.length ?? 0) > 0 ? -1e5 : 0;
  return bent + dx + dy + (dx === 0 || dy === 0 ? 0 : 1000);
}

/** The square corners of a run on a grid that knows all that is in its way; the run is then in the way of the next. */
function routeRun(grid: RouteGrid, { run, from, to }: SheetRun): Point[] {
  if (from === null || to === null) return [];
  if (run.bends === undefined || run.bends.length === 0) {
    const straight = straightRoute(grid, from, to);
    if (straight !== null) {
      addRun(grid, straight);
      return straight;
    }
  }
  const stops = [...(run.bends ?? []).map((bend) => ({ node: nodeAt(grid, bend) })), pathEnd(grid, to)];
  let leg: PathEnd = pathEnd(grid, from);
  const nodes = [leg.node];
  for (const stop of stops) {
    if (stop.node === leg.node) continue;
    const path = findPath(grid, leg, stop);
    nodes.push(...path.slice(1));
    leg = { node: stop.node, arrived: headingOf(grid, path) };
  }
  const points = meetTerminals(
    corners(nodes.map((node) => pointOf(grid, node))),
    placeOnly(from.terminal),
    placeOnly(to.terminal),
  );
  addRun(grid, points);
  return points;
}

/** Whoever puts two terminals in line means a straight run, though it leave its symbol along the edge. */
function straightRoute(grid: RouteGrid, from: RunEnd, to: RunEnd): Point[] | null {
  const [a, b] = [placeOnly(from.terminal), placeOnly(to.terminal)];
  const isLevel = a.y === b.y;
  if (isLevel === (a.x === b.x)) return null;
  const [start, end] = [nodeAt(grid, a), nodeAt(grid, b)];
  const stride = isLevel ? 1 : grid.columns;
  const along = isLevel ? grid.level : grid.upright;
  const boxes = [placeOf(from.device).box, placeOf(to.device).box];
  for (let node = Math.min(start, end) + stride; node < Math.max(start, end); node += stride) {
    if (along[node]! > 0 || grid.corner[node]! > 0 || grid.cost[node]! >= COST.offSheet) return null;
    if (grid.cost[node]! >= COST.edge && !boxes.some((box) => touches(box, pointOf(grid, node)))) return null;
  }
  return [a, b];
}

function placeOnly({ x, y }: Point): Point {
  return { x, y };
}

function pathEnd(grid: RouteGrid, { terminal }: RunEnd): PathEnd {
  return { node: nodeAt(grid, terminal), sides: terminal.sides };
}

/** Only the corners of a line of points. */
export function corners(points: readonly Point[]): Point[] {
  const kept: Point[] = [];
  for (const point of points) {
    const [a, b] = [kept.at(-2), kept.at(-1)];
    if (b !== undefined && b.x === point.x && b.y === point.y) continue;
    const isStraight =
      a !== undefined &&
      b !== undefined &&
      ((a.x === b.x && b.x === point.x && between(a.y, b.y, point.y)) ||
        (a.y === b.y && b.y === point.y && between(a.x, b.x, point.x)));
    if (isStraight) kept.pop();
    kept.push(point);
  }
  return kept;
}

function between(a: number, b: number, c: number): boolean {
  return (b - a) * (c - b) >= 0;
}

function headingOf(grid: RouteGrid, path: readonly number[]): Direction | undefined {
  const [a, b] = [path.at(-2), path.at(-1)];
  if (a === undefined || b === undefined) return undefined;
  const from = pointOf(grid, a);
  const to = pointOf(grid, b);
  return to.x > from.x ? 0 : to.x < from.x ? 2 : to.y > from.y ? 1 : 3;
}

/** A device off the grid has its terminals off it too: the segment that ends there is shifted to meet it. */
function meetTerminals(points: Point[], from: Point, to: Point): Point[] {
  const shifted = meetEnd(meetEnd(points, from).reverse(), to).reverse();
  return corners(shifted);
}

function meetEnd(points: Point[], end: Point): Point[] {
  const [first, second, ...rest] = points;
  if (first === undefined || second === undefined) return [end];
  if (first.x === end.x && first.y === end.y) return points;
  const isLevel = first.y === second.y;
  if (rest.length > 0) return [end, isLevel ? { x: second.x, y: end.y } : { x: end.x, y: second.y }, ...rest];
  // one straight segment: half-way it steps over to the other end's line
  const middle = isLevel ? (end.x + second.x) / 2 : (end.y + second.y) / 2;
  return isLevel
    ? [end, { x: middle, y: end.y }, { x: middle, y: second.y }, second]
    : [end, { x: end.x, y: middle }, { x: second.x, y: middle }, second];
}
