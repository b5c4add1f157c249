import type { PartsLine } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';
import { formatLength, type UnitSystem } from '#shared/units/length.ts';
import { formatNumber } from '#shared/units/number.ts';

export interface PartsGroup {
  readonly title: string;
  readonly lines: readonly PartsLine[];
}

/** In the order in which the list has them. */
export function groupParts(lines: readonly PartsLine[]): readonly PartsGroup[] {
  const groups = new Map<string, PartsLine[]>();
  for (const line of lines) groups.set(line.group, [...(groups.get(line.group) ?? []), line]);
  return [...groups].map(([title, own]) => ({ title, lines: own }));
}

/** What is bought by the metre is shown as its reader measures. */
export function sayQuantity(line: PartsLine, units: UnitSystem): { readonly quantity: string; readonly unit: string } {
  if (line.unit === 'each') return { quantity: formatNumber(line.quantity, 0), unit: 'each' };
  if (units === 'us') return { quantity: formatNumber(Math.ceil(line.quantity / 0.3048 - 1e-9), 0), unit: 'ft' };
  return { quantity: formatNumber(line.quantity, 2), unit: 'm' };
}

/** The marks a line comes from, shortest names first. */
export function marksOf(design: Design, line: PartsLine): string[] {
  const devices = line.devices.map((id) => design.devices[id]?.mark ?? 'device');
  const runs = line.runs.map((id) => design.runs[id]?.mark ?? 'run');
  return [...devices, ...runs].sort((a, b) => a.localeCompare(b, 'en', { numeric: true }));
}

export function isCable(line: PartsLine): boolean {
  return line.unit === 'm' && line.runs.length > 0;
}

/** How a length of cable comes about, in words. */
export function sayCableSum(design: Design, line: PartsLine, units: UnitSystem): string {
  const runs = line.runs.flatMap((id) => design.runs[id] ?? []);
  const drawnM = runs.reduce((sum, run) => sum + (run.lengthM ?? 0) * (run.conductor.parallel ?? 1), 0);
  const missing = runs.filter((run) => run.lengthM === undefined).length;
  const words = `${formatLength(drawnM, units)} as drawn in ${runs.length} ${runs.length === 1 ? 'run' : 'runs'}, with slack and ends`;
  return missing === 0 ? words : `${words}; ${missing} without a length`;
}
