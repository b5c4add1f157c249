import { circlePath, defineDrawing } from './drawing.ts';

/** Two inputs, one arm; the small contact below is the pair that opens an alternator's field between positions. */
export const selector = defineDrawing({
  kind: 'selector',
  art: () => ({
    strokes: `M0 8H13M0 24H13${circlePath(15.5, 8, 2.5)}${circlePath(15.5, 24, 2.5)}M34 16H48M34 16L17.5 9.5M16 32V28H20M32 32V28H27L20 24.5`,
    dashes: 'M13.5 11.5A14 14 0 0 0 13.5 20.5M25 13V26.5',
  }),
});
