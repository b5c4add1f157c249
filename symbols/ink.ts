import type { PlainColour } from '#shared/model/design.ts';

/** The inks a drawing is made with: CSS variables on screen, literal values on paper. */
export interface Ink {
  readonly ink1: string;
  readonly ink2: string;
  readonly ink3: string;
  readonly sheet: string;
  readonly hair: string;
  readonly grid: string;
  readonly wireOutline: string;
  readonly wire: Readonly<Record<PlainColour, string>>;
  /** Black only: solid, hollow, dashed instead of hue, with code letters at both ends. */
  readonly mono: boolean;
  /** Code letters of the colour at both ends of a run: on paper always. */
  readonly colourCodes: boolean;
  readonly text: string;
  readonly monospace: string;
}
