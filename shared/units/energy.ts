import { formatFigures } from './number.ts';

/** `1,350 Wh`. */
export function formatWh(wattHours: number): string {
  return `${formatFigures(wattHours)} Wh`;
}
