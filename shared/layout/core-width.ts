import { conductorOf } from '#shared/model/defaults.ts';
import type { Run } from '#shared/model/design.ts';
import type { Size } from '#shared/model/size.ts';

/** Drawn width of a conductor's coloured core by size class; its outline is added outside. */
export function coreWidth(run: Run): number {
  if (run.link === true) return 3.5;
  return WIDTHS[conductorOf(run).size] ?? 1.5;
}

/** Each side of a conductor. */
export const OUTLINE = 0.75;

const WIDTHS: Partial<Record<Size, number>> = {
  '12 AWG': 2,
  '10 AWG': 2,
  '4 mm²': 2,
  '6 mm²': 2,
  '8 AWG': 2.75,
  '6 AWG': 2.75,
  '10 mm²': 2.75,
  '16 mm²': 2.75,
  '4 AWG': 3.5,
  '3 AWG': 3.5,
  '2 AWG': 3.5,
  '25 mm²': 3.5,
  '35 mm²': 3.5,
  '1 AWG': 4.25,
  '1/0 AWG': 4.25,
  '50 mm²': 4.25,
  '2/0 AWG': 5,
  '3/0 AWG': 5,
  '70 mm²': 5,
  '95 mm²': 5,
  '4/0 AWG': 6,
  '120 mm²': 6,
  '150 mm²': 6,
};
