import type { PlainColour } from '#shared/model/design.ts';

/**
 * Hue without hue: positive solid, negative and neutral hollow, grounding dashed, the rest told apart by their
 * dashes and by the code letters at both ends. Undefined is solid.
 */
export function monoPattern(colour: PlainColour): string | undefined {
  return PATTERNS[colour];
}

const PATTERNS: Partial<Record<PlainColour, string>> = {
  yellow: 'hollow',
  black: 'hollow',
  white: 'hollow',
  'light-blue': 'hollow',
  green: '6 5',
  brown: '12 4',
  grey: '3 3',
  blue: '12 3 3 3',
  orange: '18 3',
  violet: '9 3 3 3 3 3',
  tan: '4 6',
  pink: '2 4',
};
