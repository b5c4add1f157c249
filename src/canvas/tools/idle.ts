import { removeBend } from '#shared/edits/bends.ts';
import { joinSelections, NOTHING_SELECTED, selectDevice, selectRun, toggleSelected } from '#src/canvas/selection.ts';

import { IDLE, type Happening, type Outcome, type World } from './tool.ts';

/** Nothing in hand: a press begins whatever lies under it. */
export function onIdle(happening: Happening, world: World): Outcome {
  if (happening.type === 'double') return freeBend(happening, world);
  if (happening.type !== 'down') return { tool: IDLE };
  const { at, over, shift, touch } = happening;

  if (over.on === 'stub') {
    return { tool: IDLE, goTo: { sheetId: over.sheetId, selection: selectRun(over.run) } };
  }
  // A finger pans; what it taps is selected and nothing is moved by accident.
  if (touch || !world.mayEdit) return { tool: IDLE, selection: tapped(happening, world) };

  switch (over.on) {
    case 'terminal':
      return { tool: { is: 'pointing-terminal', from: over, start: at, shift } };
    case 'bend':
      return {
        tool: {
          is: 'dragging-bend',
          run: over.run,
          index: over.index,
          bends: world.design.runs[over.run]?.bends ?? [],
        },
      };
    case 'device':
      return { tool: { is: 'pointing-device', device: over.device, start: at, shift } };
    case 'run':
      return { tool: { is: 'pointing-run', run: over.run, start: at, shift } };
    case 'nothing':
      return { tool: { is: 'pointing-sheet', start: at, shift } };
  }
}

function tapped({ over, shift }: Extract<Happening, { type: 'down' }>, world: World) {
  if (over.on === 'nothing') return shift ? joinSelections(world.selection, NOTHING_SELECTED) : NOTHING_SELECTED;
  if (over.on === 'run' || over.on === 'bend' || over.on === 'stub') {
    return shift ? toggleSelected(world.selection, 'runs', over.run) : selectRun(over.run);
  }
  return shift ? toggleSelected(world.selection, 'devices', over.device) : selectDevice(over.device);
}

/** A double click on a bend frees it: the router has the corner back. */
function freeBend({ over }: Extract<Happening, { type: 'double' }>, world: World): Outcome {
  if (over.on !== 'bend' || !world.mayEdit) return { tool: IDLE };
  return { tool: IDLE, edit: removeBend(world.design, over.run, over.index) };
}
