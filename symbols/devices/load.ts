import { boxPath, circlePath, defineDrawing, directCurrentPath, type Art } from './drawing.ts';

/** Positive above, negative below, whatever the load is. */
export const load = defineDrawing({ kind: 'load', art: (device) => VARIANTS[device.symbol ?? 'plain'] ?? PLAIN });

const CIRCLE = `${circlePath(16, 24, 14)}M16 0V10M16 38V48`;
const BOX = `${boxPath(2, 13, 28, 22)}M16 0V13M16 35V48`;

const PLAIN: Art = { strokes: `${BOX}${directCurrentPath(16, 22)}` };

const VARIANTS: Readonly<Record<string, Art>> = {
  plain: PLAIN,
  motor: {
    strokes: `${CIRCLE}${directCurrentPath(16, 29)}`,
    letters: [{ x: 16, y: 21, text: 'M', size: 12 }],
  },
  // The filled triangle points the way the water goes, as on piping diagrams.
  pump: {
    strokes: CIRCLE,
    fills: 'M16 10.5L22 18H10Z',
    letters: [{ x: 16, y: 27, text: 'M', size: 12 }],
  },
  lamp: { strokes: `${CIRCLE}M6.1 14.1L25.9 33.9M25.9 14.1L6.1 33.9` },
  heater: { strokes: `${boxPath(11, 8, 10, 32)}M16 0V8M16 40V48M11 16h10M11 24h10M11 32h10` },
  horn: { strokes: `${boxPath(11, 13, 10, 22)}M16 0V13M16 35V48M21 18L30 11V37L21 30` },
  socket: { strokes: `${BOX}M6 24H14M21 17A7 7 0 0 0 21 31` },
  radio: { strokes: `${BOX}M16 32V18M10 18H22L16 25Z` },
  instrument: { strokes: `${CIRCLE}M9 31L22 18`, fills: 'M24 16L22.6 21.2L18.8 17.4Z' },
  fridge: { strokes: `${BOX}M16 17V31M9.9 20.5L22.1 27.5M22.1 20.5L9.9 27.5` },
};
