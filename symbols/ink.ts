import { COLOURS, type PlainColour } from '#shared/model/design.ts';

/** The inks a drawing is made with: CSS variables on screen, literal values on paper. */
export interface Ink {
  readonly ink1: string;
  readonly ink2: string;
  readonly ink3: string;
  readonly sheet: string;
  readonly hair: string;
  readonly grid: string;
  readonly signal: string;
  readonly signalInk: string;
  readonly wireOutline: string;
  readonly wire: Readonly<Record<PlainColour, string>>;
  /** Opacity of what exists already and stays; night needs more of it to be seen. */
  readonly existing: string;
  /** Black only: solid, hollow, dashed instead of hue, with code letters at both ends. */
  readonly mono: boolean;
  /** Code letters of the colour at both ends of a run: on paper always. */
  readonly colourCodes: boolean;
  readonly text: string;
  readonly monospace: string;
}

/** The themes' own variables: one drawing follows paper, dusk and night without being drawn anew. */
export const screenInk: Ink = {
  ink1: 'var(--ink-1)',
  ink2: 'var(--ink-2)',
  ink3: 'var(--ink-3)',
  sheet: 'var(--sheet)',
  hair: 'var(--hair)',
  grid: 'var(--grid)',
  signal: 'var(--signal)',
  signalInk: 'var(--signal-ink)',
  wireOutline: 'var(--wire-outline)',
  wire: colours((colour) => `var(--c-${colour})`),
  existing: 'var(--existing, 0.5)',
  mono: false,
  colourCodes: false,
  text: 'var(--text)',
  monospace: 'var(--mono)',
};

/** Literal values, and black ink: a printer has no variables. The font names are those the PDF embeds. */
export const paperInk: Ink = {
  ink1: '#000000',
  ink2: '#000000',
  ink3: '#333333',
  sheet: '#ffffff',
  hair: '#999999',
  grid: '#dddddd',
  signal: '#bf4306',
  signalInk: '#ffffff',
  wireOutline: '#000000',
  wire: {
    red: '#c42b2b',
    black: '#22262b',
    yellow: '#efc22e',
    green: '#2e8b57',
    white: '#ffffff',
    blue: '#2458a6',
    'light-blue': '#8dbbe3',
    brown: '#7b4a24',
    orange: '#e88420',
    violet: '#7a4fa0',
    grey: '#6e757b',
    tan: '#cfae7f',
    pink: '#e79bb2',
  },
  existing: '0.5',
  mono: false,
  colourCodes: true,
  text: 'Inter',
  monospace: 'Atkinson Hyperlegible Mono',
};

/** For a printer without colour, and for a copy of a copy: hue is replaced by solid, hollow and dashed. */
export const monoInk: Ink = { ...paperInk, ink3: '#000000', wire: colours(() => '#000000'), mono: true };

function colours(valueOf: (colour: PlainColour) => string): Readonly<Record<PlainColour, string>> {
  return Object.fromEntries(COLOURS.map((colour) => [colour, valueOf(colour)])) as Record<PlainColour, string>;
}
