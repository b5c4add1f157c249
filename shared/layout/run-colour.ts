import { wireColours } from '#shared/kinds/wire-colour.ts';
import type { Design, Run } from '#shared/model/design.ts';

const known = new WeakMap<Design, Readonly<Record<string, string>>>();

/** The colour a run is drawn in, worked out once a state of the design. A laid-out run has it as `colour`. */
export function runColour(design: Design, run: Run): string {
  if (run.colour !== undefined) return run.colour;
  let colours = known.get(design);
  if (colours === undefined) {
    colours = wireColours(design);
    known.set(design, colours);
  }
  return colours[run.id] ?? 'red';
}
