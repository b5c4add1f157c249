import { boxPath, circlePath, defineDrawing } from './drawing.ts';

/** The conductor runs through. Filled caps say class T; a ring says that it sits on a stud. */
export const fuse = defineDrawing({
  kind: 'fuse',
  art: (device) => {
    if (device.symbol === 'stud') {
      return { strokes: `${boxPath(12, 3, 28, 10)}M5 8H48${circlePath(0, 8, 5)}` };
    }
    const strokes = `${boxPath(8, 3, 32, 10)}M0 8H48`;
    if (device.symbol === 'class-t') return { strokes, fills: boxPath(8, 3, 5, 10) + boxPath(35, 3, 5, 10) };
    return { strokes };
  },
});
