import type { Point } from '#shared/kinds/place.ts';

import type { RunLayout } from './sheet-layout.ts';

export const HOP_RADIUS = 7;

type Path = Pick<RunLayout, 'points' | 'hops'>;

/** The run as an SVG path, with its hops. */
export function runPath({ points, hops }: Path): string {
  const [first, ...rest] = points;
  if (first === undefined) return '';
  let path = `M${first.x} ${first.y}`;
  let from = first;
  for (const to of rest) {
    for (const [start, end] of bridges(from, to, hops)) path += bridge(from, to, start, end);
    path += `L${to.x} ${to.y}`;
    from = to;
  }
  return path;
}

/** Without hops: what a pointer is held against. */
export function straightPath({ points }: Pick<RunLayout, 'points'>): string {
  return points.map((point, i) => `${i === 0 ? 'M' : 'L'}${point.x} ${point.y}`).join('');
}

/** The hops alone, each a little path of its own, to be drawn over what they cross. */
export function hopPath({ points, hops }: Path): string {
  let path = '';
  points.slice(1).forEach((to, i) => {
    const from = points[i]!;
    for (const [start, end] of bridges(from, to, hops)) {
      const unit = direction(from, to);
      path += `M${from.x + unit.x * start} ${from.y + unit.y * start}${bridge(from, to, start, end).replace(/^L[^A]*/, '')}`;
    }
  });
  return path;
}

/** Where hops begin and end along a segment; neighbours too close for two arcs share one bridge. */
function bridges(from: Point, to: Point, hops: readonly Point[]): [number, number][] {
  const unit = direction(from, to);
  const length = Math.abs(to.x - from.x) + Math.abs(to.y - from.y);
  const along = hops
    .filter((hop) => (unit.x === 0 ? hop.x === from.x : hop.y === from.y))
    .map((hop) => (hop.x - from.x) * unit.x + (hop.y - from.y) * unit.y)
    .filter((distance) => distance > 0 && distance < length)
    .sort((a, b) => a - b);
  const spans: [number, number][] = [];
  for (const distance of along) {
    const last = spans.at(-1);
    if (last !== undefined && distance - HOP_RADIUS <= last[1]) last[1] = distance + HOP_RADIUS;
    else spans.push([distance - HOP_RADIUS, distance + HOP_RADIUS]);
  }
  return spans;
}

/** Over a level run the bridge stands up, over an upright one to the right. */
function bridge(from: Point, to: Point, start: number, end: number): string {
  const unit = direction(from, to);
  const sweep = unit.x > 0 || unit.y > 0 ? 1 : 0;
  const at = (along: number, off: number) =>
    unit.x === 0 ? `${from.x + off} ${from.y + unit.y * along}` : `${from.x + unit.x * along} ${from.y - off}`;
  const r = HOP_RADIUS;
  if (end - start <= 2 * r) return `L${at(start, 0)}A${r} ${r} 0 0 ${sweep} ${at(end, 0)}`;
  return `L${at(start, 0)}A${r} ${r} 0 0 ${sweep} ${at(start + r, r)}L${at(end - r, r)}A${r} ${r} 0 0 ${sweep} ${at(end, 0)}`;
}

function direction(from: Point, to: Point): Point {
  return { x: Math.sign(to.x - from.x), y: Math.sign(to.y - from.y) };
}
