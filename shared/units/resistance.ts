import { formatFigures, formatNumber, readQuantity } from './number.ts';

export const OHMS_ACCEPTED = 'Type a resistance such as 1.2 mΩ or 0.5 ohm.';

/** `1.02 mΩ` below one ohm, `12.5 Ω` from there on. */
export function formatOhm(ohms: number): string {
  if (Math.abs(ohms) >= 1) return `${formatFigures(ohms)} Ω`;
  const milliohms = ohms * 1000;
  return Math.abs(milliohms) < 0.095 ? `${formatNumber(milliohms, 4)} mΩ` : `${formatFigures(milliohms)} mΩ`;
}

/** `5`, `5 mΩ`, `5 mohm`: milliohms where no unit is typed, for that is what the fields hold. */
export function readMilliohms(text: string): number | undefined {
  return readQuantity(text, { mΩ: 1, mohm: 1, milliohm: 1, Ω: 1000, ohm: 1000, ohms: 1000, µΩ: 0.001, uohm: 0.001 });
}
