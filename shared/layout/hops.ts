import type { Point } from '#shared/kinds/place.ts';

import { HOP_RADIUS } from './run-path.ts';

/**
 * Where runs cross, in drawing order: the later one hops. Where it has no room for the arc the earlier one does.
 * Answers the hops by the index of the run that makes them.
 */
export function findHops(runs: readonly (readonly Point[])[]): Point[][] {
  const hops: Point[][] = runs.map(() => []);
  const segments = runs.flatMap((points, run) =>
    points.slice(1).map((to, i): Segment => ({ run, from: points[i]!, to })),
  );
  const level = segments.filter(({ from, to }) => from.y === to.y).sort((a, b) => a.from.y - b.from.y);
  const upright = segments.filter(({ from, to }) => from.x === to.x);
  const rows = level.map((segment) => segment.from.y);

  for (const up of upright) {
    const top = Math.min(up.from.y, up.to.y);
    const bottom = Math.max(up.from.y, up.to.y);
    for (let i = firstAbove(rows, top); i < level.length && rows[i]! < bottom; i++) {
      const flat = level[i]!;
      if (flat.run === up.run || !crosses(flat, up)) continue;
      const at = { x: up.from.x, y: flat.from.y };
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
}

function crosses(flat: Segment, up: Segment): boolean {
  return up.from.x > Math.min(flat.from.x, flat.to.x) && up.from.x < Math.max(flat.from.x, flat.to.x);
}

function hasRoom({ from, to }: Segment, at: Point): boolean {
  const toFrom = Math.abs(at.x - from.x) + Math.abs(at.y - from.y);
  const toTo = Math.abs(at.x - to.x) + Math.abs(at.y - to.y);
  return Math.min(toFrom, toTo) > HOP_RADIUS;
}

/** Index of the first row below `value` on the page. */
function firstAbove(rows: readonly number[], value: number): number {
  let low = 0;
  let high = rows.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (rows[middle]! <= value) low = middle + 1;
    else high = middle;
  }
  return low;
}
