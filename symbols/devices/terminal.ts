import { terminalsOf, unturnedSize } from '#shared/kinds/place.ts';

import { boxPath, circlePath, defineDrawing, type Art } from './drawing.ts';

export const terminal = defineDrawing({
  kind: 'terminal',
  art: (device) => (device.symbol === 'splice' ? splice(terminalsOf(device).length) : block(device)),
});

function block(device: Parameters<typeof unturnedSize>[0]): Art {
  const { width, height } = unturnedSize(device);
  const ways = terminalsOf({ ...device, x: 0, y: 0, rotation: 0 });
  const walls = ways.slice(1).map((way, i) => `M${(ways[i]!.x + way.x) / 2} 0v${height}`);
  return { strokes: boxPath(0, 0, width, height) + walls.join('') };
}

/** The dot is the joint: leads for as many sides as it has ways. */
function splice(ways: number): Art {
  const leads = ['M0 8H8', 'M8 8H16', 'M8 8V16', 'M8 8V0'].slice(0, Math.max(ways, 1));
  return { strokes: leads.join(''), fills: circlePath(8, 8, 4), terminals: 'none' };
}
