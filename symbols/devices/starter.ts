import { circlePath, defineDrawing, directCurrentPath } from './drawing.ts';

/** MS: the motor that starts the engine; the dashed lead at the left is its solenoid's. */
export const starter = defineDrawing({
  kind: 'starter',
  art: () => ({
    strokes: `${circlePath(16, 24, 14)}M16 0V10M16 38V48${directCurrentPath(16, 29)}`,
    dashes: 'M2.25 16H4.5',
    letters: [{ x: 16, y: 21, text: 'MS', size: 10 }],
  }),
});
