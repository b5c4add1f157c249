import { formatFigures, readQuantity } from './number.ts';

export const AMP_HOURS_ACCEPTED = 'Type a capacity such as 100 or 100 Ah.';

/** `280 Ah`. */
export function formatAh(ampHours: number): string {
  return `${formatFigures(ampHours)} Ah`;
}

/** `100`, `100 Ah`, `7000 mAh`. */
export function readAmpHours(text: string): number | undefined {
  return readQuantity(text, { Ah: 1, mAh: 0.001 });
}
