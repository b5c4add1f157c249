import { onDraggingBend } from './dragging-bend.ts';
import { onDraggingDevices } from './dragging-devices.ts';
import { onDrawingRun } from './drawing-run.ts';
import { onIdle } from './idle.ts';
import { onMarquee } from './marquee.ts';
import { onPlacing } from './placing.ts';
import { onPointingDevice } from './pointing-device.ts';
import { onPointingRun } from './pointing-run.ts';
import { onPointingSheet } from './pointing-sheet.ts';
import { onPointingTerminal } from './pointing-terminal.ts';
import type { Happening, Outcome, Tool, World } from './tool.ts';

/** One happening in the state the hand is in. */
export function step(tool: Tool, happening: Happening, world: World): Outcome {
  switch (tool.is) {
    case 'idle':
      return onIdle(happening, world);
    case 'placing':
      return onPlacing(tool, happening, world);
    case 'pointing-device':
      return onPointingDevice(tool, happening, world);
    case 'dragging-devices':
      return onDraggingDevices(tool, happening, world);
    case 'pointing-terminal':
      return onPointingTerminal(tool, happening, world);
    case 'drawing-run':
      return onDrawingRun(tool, happening, world);
    case 'pointing-run':
      return onPointingRun(tool, happening, world);
    case 'dragging-bend':
      return onDraggingBend(tool, happening, world);
    case 'pointing-sheet':
      return onPointingSheet(tool, happening, world);
    case 'marquee':
      return onMarquee(tool, happening, world);
  }
}
