import type { Point } from '#shared/kinds/place.ts';
import { moveDevices } from '#shared/edits/move-devices.ts';
import { isSamePoint, minus, snap } from '#src/canvas/grid.ts';

import { IDLE, isEscape, type Happening, type Outcome, type Tool, type World } from './tool.ts';

type Dragging = Extract<Tool, { is: 'dragging-devices' }>;

/** Selected devices follow the hand on the grid; the design hears of it on release. */
export function onDraggingDevices(tool: Dragging, happening: Happening, world: World): Outcome {
  if (happening.type === 'move') {
    const by = draggedBy(tool.start, happening.at);
    return { tool: isSamePoint(by, tool.by) ? tool : { ...tool, by } };
  }
  if (happening.type === 'up') {
    const by = draggedBy(tool.start, happening.at);
    if (by.x === 0 && by.y === 0) return { tool: IDLE };
    return { tool: IDLE, edit: moveDevices(world.design, [...world.selection.devices], by) };
  }
  if (happening.type === 'cancel' || isEscape(happening)) return { tool: IDLE, handled: true };
  return { tool };
}

export function draggedBy(start: Point, at: Point): Point {
  return snap(minus(at, start));
}
