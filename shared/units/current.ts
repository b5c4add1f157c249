import { formatFigures, readQuantity } from './number.ts';

export const AMPS_ACCEPTED = 'Type a current such as 15, 15 A or 300 mA.';

/** `287 A`, `13.6 A`, `0.42 A`; with as many more decimals as are asked for: `60.01 A`. */
export function formatA(amps: number, finer = 0): string {
  return `${formatFigures(amps, finer)} A`;
}

/** `15`, `15 A`, `300 mA`, `1.5 kA`. */
export function readAmps(text: string): number | undefined {
  return readQuantity(text, { A: 1, amp: 1, amps: 1, mA: 0.001, kA: 1000 });
}
