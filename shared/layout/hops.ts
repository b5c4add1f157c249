import type { Point } from '#shared/kinds/place.ts';

import { HOP_RADIUS } from './run-path.ts';

/**
 * Where runs cross, in drawing order: the later one hops. Where it has no room for the arc the earlier one does.
 * Answers the hops by the index of the run that makes them.
 */
export function findHops(runs: readonly (readonly Point[])[]): Point[][] {
  const hops: Point[][] = runs.map(() => []);
  const level: Segment[] = [];
  const upright: Segment[] = [];
  runs.forEach((points, run) => {
    for (let i = 1; i < points.length; i++) {
      const [from, to] = [points[i - 1]!, points[i]!];
      if (from.y === to.y)
        level.push({ run, from, to, line: from.y, start: Math.min(from.x, to.x), end: Math.max(from.x, to.x) });
      else upright.push({ run, from, to, line: from.x, start: Math.min(from.y, to.y), end: Math.max(from.y, to.y) });
    }
  });
  level.sort((a, b) => a.line - b.line);
  const rows = Float64Array.from(level, ({ line }) => line);
  const starts = Float64Array.from(level, ({ start }) => start);
  const ends = Float64Array.from(level, ({ end }) => end);

  for (const up of upright) {
    for (let i = firstAbove(rows, up.start); i < rows.length && rows[i]! < up.end; i++) {
      if (up.line <= starts[i]! || up.line >= ends[i]!) continue;
      const flat = level[i]!;
      if (flat.run === up.run) continue;
      const at = { x: up.line, y: flat.line };
      const [later, earlier] = flat.run > up.run ? [flat, up] : [up, flat];
      if (hasRoom(later, at)) hops[later.run]!.push(at);
      else if (hasRoom(earlier, at)) hops[earlier.run]!.push(at);
      else hops[later.run]!.push(at);
    }
  }
  return hops;
}

interface Segment {
  readonly run: number;
  readonly from: Point;
  readonly to: Point;
  /** The row of a level one, the column of an upright one, and its reach along it. */
  readonly line: number;
  readonly start: number;
  readonly end: number;
}

function hasRoom({ from, to }: Segment, at: Point): boolean {
  const toFrom = Math.abs(at.x - from.x) + Math.abs(at.y - from.y);
  const toTo = Math.abs(at.x - to.x) + Math.abs(at.y - to.y);
  return Math.min(toFrom, toTo) > HOP_RADIUS;
}

/** Index of the first row below `value` on the page. */
function firstAbove(rows: Float64Array, value: number): number {
  let low = 0;
  let high = rows.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (rows[middle]! <= value) low = middle + 1;
    else high = middle;
  }
  return low;
}
