import { NOTHING_SELECTED } from '#src/canvas/selection.ts';

import { DRAG_PIXELS, IDLE, isEscape, type Happening, type Outcome, type Tool, type World } from './tool.ts';

type Pointing = Extract<Tool, { is: 'pointing-sheet' }>;

/** Pressed on bare paper: a click lets go of the selection, a drag spans a marquee. */
export function onPointingSheet(tool: Pointing, happening: Happening, world: World): Outcome {
  if (happening.type === 'move') {
    const far = Math.hypot(happening.at.x - tool.start.x, happening.at.y - tool.start.y);
    if (far < DRAG_PIXELS * world.unitsPerPixel) return { tool };
    const added = tool.shift ? world.selection : NOTHING_SELECTED;
    return { tool: { is: 'marquee', start: tool.start, at: happening.at, added } };
  }
  if (happening.type === 'up') return { tool: IDLE, selection: tool.shift ? undefined : NOTHING_SELECTED };
  return { tool: happening.type === 'cancel' || isEscape(happening) ? IDLE : tool };
}
