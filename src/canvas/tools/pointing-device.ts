import { selectDevice, toggleSelected } from '#src/canvas/selection.ts';

import { draggedBy } from './dragging-devices.ts';
import { DRAG_PIXELS, IDLE, isEscape, type Happening, type Outcome, type Tool, type World } from './tool.ts';

type Pointing = Extract<Tool, { is: 'pointing-device' }>;

/** Pressed on a device and not yet moved: it is either a click or the beginning of a drag. */
export function onPointingDevice(tool: Pointing, happening: Happening, world: World): Outcome {
  const isSelected = world.selection.devices.has(tool.device);
  if (happening.type === 'move') {
    const far = Math.hypot(happening.at.x - tool.start.x, happening.at.y - tool.start.y);
    if (far < DRAG_PIXELS * world.unitsPerPixel) return { tool };
    return {
      tool: { is: 'dragging-devices', start: tool.start, by: draggedBy(tool.start, happening.at) },
      selection: isSelected
        ? undefined
        : tool.shift
          ? toggleSelected(world.selection, 'devices', tool.device)
          : selectDevice(tool.device),
    };
  }
  if (happening.type === 'up') {
    return {
      tool: IDLE,
      selection: tool.shift ? toggleSelected(world.selection, 'devices', tool.device) : selectDevice(tool.device),
    };
  }
  return { tool: happening.type === 'cancel' || isEscape(happening) ? IDLE : tool };
}
