import { circlePath, defineDrawing, directCurrentPath } from './drawing.ts';

export const alternator = defineDrawing({
  kind: 'alternator',
  art: () => ({
    strokes: `${circlePath(16, 24, 14)}M16 0V10M16 38V48${directCurrentPath(16, 29)}`,
    dashes: 'M2.25 16H4.5M2.25 32H4.5',
    letters: [{ x: 16, y: 21, text: 'G', size: 12 }],
  }),
});
