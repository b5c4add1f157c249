import type { Point } from '#shared/kinds/place.ts';
import { snap } from '#src/canvas/grid.ts';
import { distanceToLeg } from '#src/canvas/hit.ts';
import { selectRun, toggleSelected } from '#src/canvas/selection.ts';

import { DRAG_PIXELS, IDLE, isEscape, type Happening, type Outcome, type Tool, type World } from './tool.ts';

type Pointing = Extract<Tool, { is: 'pointing-run' }>;

/** Pressed on a run: a click selects it, a drag pulls a bend out of it. */
export function onPointingRun(tool: Pointing, happening: Happening, world: World): Outcome {
  if (happening.type === 'move') {
    const far = Math.hypot(happening.at.x - tool.start.x, happening.at.y - tool.start.y);
    if (far < DRAG_PIXELS * world.unitsPerPixel) return { tool };
    const pulled = pullBend(tool, snap(happening.at), world);
    if (pulled === null) return { tool };
    return { tool: { is: 'dragging-bend', run: tool.run, ...pulled }, selection: selectRun(tool.run) };
  }
  if (happening.type === 'up') {
    return {
      tool: IDLE,
      selection: tool.shift ? toggleSelected(world.selection, 'runs', tool.run) : selectRun(tool.run),
    };
  }
  return { tool: happening.type === 'cancel' || isEscape(happening) ? IDLE : tool };
}

/** A new bend between those that the pressed place lies between. A run to another sheet has none. */
function pullBend(tool: Pointing, at: Point, world: World): { index: number; bends: readonly Point[] } | null {
  const run = world.design.runs[tool.run];
  const drawn = world.layout.runs[tool.run];
  if (run === undefined || drawn === undefined || drawn.stubs.length > 0) return null;
  const bends = run.bends ?? [];
  const leg = nearestLeg(drawn.points, tool.start);
  const before = drawn.points.slice(0, leg + 1);
  // Bends stand on the drawn corners in order: those on the way up to the pressed leg come before the new one.
  let index = 0;
  for (const point of before) {
    const bend = bends[index];
    if (bend !== undefined && bend.x === point.x && bend.y === point.y) index += 1;
  }
  return { index, bends: [...bends.slice(0, index), at, ...bends.slice(index)] };
}

function nearestLeg(points: readonly Point[], at: Point): number {
  let best = 0;
  let least = Infinity;
  for (let i = 0; i + 1 < points.length; i++) {
    const units = distanceToLeg(points[i]!, points[i + 1]!, at);
    if (units < least) [best, least] = [i, units];
  }
  return best;
}
