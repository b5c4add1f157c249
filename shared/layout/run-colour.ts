import { basisOf } from '#shared/model/defaults.ts';
import type { Design, Run } from '#shared/model/design.ts';

import { placeOf } from './device-place.ts';

/** The colour a run is drawn in: its own, else the profile's for the duty its terminals tell. */
export function runColour(design: Design, run: Run): string {
  if (run.colour !== undefined) return run.colour;
  const iso = basisOf(design).profile === 'iso-13297';
  const roles = [run.from, run.to].map(
    (end) => design.devices[end.device] && placeOf(design.devices[end.device]!).byName.get(end.terminal)?.role,
  );
  if (roles.includes('bond') || roles.includes('pe')) return iso ? 'green/yellow' : 'green';
  if (roles.includes('dc-')) return iso ? 'black' : 'yellow';
  return 'red';
}
