import type { Box, Point } from '#shared/kinds/place.ts';

import { placeOf } from './device-place.ts';
import { findPath, type Direction, type PathEnd } from './find-path.ts';
import { addRun, COST, nodeAt, pointOf, type RouteGrid } from './route-grid.ts';
import type { RunEnd, SheetRun } from './run-ends.ts';

/** The square corners of a run on a grid that knows all that is in its way; the run is then in the way of the next. */
export function routeRun(grid: RouteGrid, { run, from, to }: SheetRun): Point[] {
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

function touches({ x, y, width, height }: Box, point: Point): boolean {
  return point.x >= x && point.x <= x + width && point.y >= y && point.y <= y + height;
}

function placeOnly({ x, y }: Point): Point {
  return { x, y };
}

export function pathEnd(grid: RouteGrid, { terminal }: RunEnd): PathEnd {
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
