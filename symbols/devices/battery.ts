import { boxPath, defineDrawing } from './drawing.ts';

/** The long plate is positive. The sense lead ends on the negative plate, where a temperature sensor is bolted. */
export const battery = defineDrawing({
  kind: 'battery',
  art: (device) =>
    device.symbol === 'block'
      ? {
          strokes: `M16 0V21M16 27V48M2 21H30M4 8h6M7 5v6`,
          fills: boxPath(8, 25.5, 16, 3),
          dashes: 'M2.25 32H11V28.5',
        }
      : {
          strokes: `M16 0V14M16 34V48M2 14H30M2 27H30M3 6h6M6 3v6`,
          fills: boxPath(8, 18.5, 16, 3) + boxPath(8, 31.5, 16, 3),
          dashes: 'M16 21.5V27M2.25 32H8',
        },
});
