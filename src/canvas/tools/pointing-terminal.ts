import { hitTerminal, CATCH_UNITS } from '#src/canvas/hit.ts';
import { selectDevice, toggleSelected } from '#src/canvas/selection.ts';

import { DRAG_PIXELS, IDLE, isEscape, type Happening, type Outcome, type Tool, type World } from './tool.ts';

type Pointing = Extract<Tool, { is: 'pointing-terminal' }>;

/** Pressed on a terminal: a drag draws a run from it, a click selects its device. */
export function onPointingTerminal(tool: Pointing, happening: Happening, world: World): Outcome {
  if (happening.type === 'move') {
    const far = Math.hypot(happening.at.x - tool.start.x, happening.at.y - tool.start.y);
    if (far < DRAG_PIXELS * world.unitsPerPixel) return { tool };
    return {
      tool: {
        is: 'drawing-run',
        from: tool.from,
        bends: [],
        pointer: happening.at,
        over: hitTerminal(world, happening.at, CATCH_UNITS, tool.from) ?? null,
        typed: '',
        isPressed: true,
      },
    };
  }
  if (happening.type === 'up') {
    const { device } = tool.from;
    return {
      tool: IDLE,
      selection: tool.shift ? toggleSelected(world.selection, 'devices', device) : selectDevice(device),
    };
  }
  return { tool: happening.type === 'cancel' || isEscape(happening) ? IDLE : tool };
}
