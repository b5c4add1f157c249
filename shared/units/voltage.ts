import { formatNumber, readQuantity } from './number.ts';

export const VOLTS_ACCEPTED = 'Type a voltage such as 12.8, 12.8 V or 340 mV.';

/** `0.34 V`, `12.8 V`, `120 V`. */
export function formatV(volts: number): string {
  return `${formatNumber(volts, Math.abs(volts) >= 99.995 ? 1 : 2)} V`;
}

/** `12.8`, `12.8 V`, `340 mV`. */
export function readVolts(text: string): number | undefined {
  return readQuantity(text, { V: 1, volt: 1, volts: 1, mV: 0.001, kV: 1000 });
}
