import { contactPath, eachPole, linkPath, polesOf } from './contact.ts';
import { defineDrawing } from './drawing.ts';

/** The cross says that it opens by itself. */
export const breaker = defineDrawing({
  kind: 'breaker',
  art: (device) => {
    const poles = polesOf(device.ratings);
    return {
      strokes: eachPole(poles, (pole) => {
        const y = 16 * pole + 8;
        return `${contactPath(pole)}M11 ${y - 3}l6 6M17 ${y - 3}l-6 6`;
      }),
      dashes: linkPath(poles, 26),
    };
  },
});
