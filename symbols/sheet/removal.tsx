import type { Ink } from '#symbols/ink.ts';

/** The stroke through a device that this job takes out. */
export function MarkedForRemoval({ width, height, ink }: { width: number; height: number; ink: Ink }) {
  return <path d={`M-2 ${height + 2}L${width + 2} -2`} fill="none" stroke={ink.ink1} strokeWidth={1.5} />;
}
