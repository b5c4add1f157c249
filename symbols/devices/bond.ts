import { terminalsOf } from '#shared/kinds/place.ts';
import type { Device } from '#shared/model/design.ts';

import { boxPath, defineDrawing, type Art } from './drawing.ts';

/** A bar with its ways, and below it what the role stands for. */
export const bond = defineDrawing({
  kind: 'bond',
  art: (device) => {
    const ways = terminalsOf({ ...device, x: 0, y: 0, rotation: 0 });
    const first = ways[0]?.x ?? 16;
    const last = ways.at(-1)?.x ?? 16;
    const middle = (first + last) / 2;
    const foot = footOf(device, middle);
    return { ...foot, strokes: `M${first} 0H${last}M${middle} 0V12${foot.strokes}` };
  },
});

const WAVE = 'c2-3 4-3 5 0s3 3 5 0s3-3 5 0s3 3 5 0';

function footOf(device: Device, x: number): Art {
  switch (device.ratings.role) {
    case 'engine':
      return { strokes: `M${x - 12} 13H${x + 12}M${x - 8} 13l-5 9M${x + 1} 13l-5 9M${x + 10} 13l-5 9` };
    case 'plate':
      return { strokes: `M${x - 10} 21${WAVE}`, fills: boxPath(x - 12, 12, 24, 3) };
    case 'hull':
      return { strokes: `M${x - 12} 12V18C${x - 12} 30 ${x + 12} 30 ${x + 12} 18V12ZM${x} 12V26` };
    case 'anode':
      return { strokes: `M${x - 10} 26${WAVE}`, fills: boxPath(x - 9, 12, 18, 8) };
    case 'lightning':
      return {
        strokes: `M${x - 8} 18h16M${x - 5} 22h10M${x - 2} 26h4M${x} 12V18M${x + 13} 1l-3 8h6l-3 8`,
        fills: `M${x + 13} 20l-3-5h6Z`,
      };
    default:
      return { strokes: `M${x} 12V16M${x - 10} 16h20M${x - 6.5} 20.5h13M${x - 3} 25h6` };
  }
}
