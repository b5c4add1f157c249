import { contactPath, eachPole, linkPath, polesOf } from './contact.ts';
import { circlePath, defineDrawing, type Art } from './drawing.ts';

export const switchDrawing = defineDrawing({
  kind: 'switch',
  art: (device) => {
    const poles = polesOf(device.ratings);
    if (device.symbol === 'battery') return batterySwitch(poles);
    if (device.symbol === 'push') return pushButton(poles);
    if (device.symbol === 'float') return floatSwitch(poles);
    return { strokes: eachPole(poles, contactPath), dashes: linkPath(poles, 26) };
  },
});

/** Bar and ring: it isolates, and may be opened under load. */
function batterySwitch(poles: number): Art {
  return {
    strokes: eachPole(poles, (pole) => {
      const y = 16 * pole + 8;
      return `M0 ${y}H8M8 ${y - 5}v10${circlePath(11, y, 3)}M36 ${y}H48M36 ${y}L16 ${y - 11}`;
    }),
    dashes: linkPath(poles, 26),
  };
}

function pushButton(poles: number): Art {
  return {
    strokes: `${eachPole(poles, (pole) => {
      const y = 16 * pole + 8;
      return `M0 ${y}H14M34 ${y}H48M14 ${y - 5}H34`;
    })}M24 3V-4M19 -4H29`,
    dashes: linkPath(poles, 24),
  };
}

function floatSwitch(poles: number): Art {
  const floatY = 16 * (poles - 1) + 17;
  return {
    strokes: `${eachPole(poles, contactPath)}${circlePath(25, floatY, 4)}M13 ${floatY + 6}c2-2 4-2 6 0s4 2 6 0s4-2 6 0s4 2 6 0`,
    dashes: linkPath(poles, 25, floatY - 4),
  };
}
