import { formatFigures, readQuantity } from './number.ts';

export const WATTS_ACCEPTED = 'Type a power such as 60, 60 W or 1.5 kW.';

/** `60 W`, `1,500 W`. */
export function formatW(watts: number): string {
  return `${formatFigures(watts)} W`;
}

/** `3,000 VA`. */
export function formatVA(voltAmps: number): string {
  return `${formatFigures(voltAmps)} VA`;
}

/** `60`, `60 W`, `1.5 kW`, `500 mW`. */
export function readWatts(text: string): number | undefined {
  return readQuantity(text, { W: 1, watt: 1, watts: 1, kW: 1000, mW: 0.001, MW: 1_000_000 });
}
