import type { Side } from '#shared/kinds/kind.ts';
import type { Point } from '#shared/kinds/place.ts';

/** Square legs from a terminal over the bends set so far to the pointer, as the run would be drawn. */
export function draftPoints(from: Point, side: Side, bends: readonly Point[], to: Point): Point[] {
  const points: Point[] = [from];
  let isLevel = side === 'left' || side === 'right';
  for (const next of [...bends, to]) {
    const last = points.at(-1)!;
    if (last.x !== next.x && last.y !== next.y) {
      points.push(isLevel ? { x: next.x, y: last.y } : { x: last.x, y: next.y });
      isLevel = !isLevel;
    } else if (last.x !== next.x || last.y !== next.y) {
      isLevel = last.y === next.y;
    }
    points.push(next);
  }
  return points;
}
