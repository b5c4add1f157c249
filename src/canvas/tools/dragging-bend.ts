import { setBends } from '#shared/edits/bends.ts';
import { isSamePoint, snap } from '#src/canvas/grid.ts';

import { IDLE, isEscape, type Happening, type Outcome, type Tool, type World } from './tool.ts';

type Dragging = Extract<Tool, { is: 'dragging-bend' }>;

/** A corner that a person puts: it stays where it is dropped. */
export function onDraggingBend(tool: Dragging, happening: Happening, world: World): Outcome {
  if (happening.type === 'move' || happening.type === 'up') {
    const at = snap(happening.at);
    const before = tool.bends[tool.index];
    if (happening.type === 'move' && before !== undefined && isSamePoint(at, before)) return { tool };
    const bends = tool.bends.map((bend, index) => (index === tool.index ? at : bend));
    if (happening.type === 'move') return { tool: { ...tool, bends } };
    return { tool: IDLE, edit: setBends(world.design, tool.run, bends) };
  }
  if (happening.type === 'cancel' || isEscape(happening)) return { tool: IDLE, handled: true };
  return { tool };
}
