import type { Design, Device } from '#shared/model/design.ts';
import { kindOf } from '#shared/kinds/index.ts';

/**
 * Gives out new marks: the highest number used plus one, so that a number once printed on a wire does not come
 * back by itself. One counter serves a whole edit.
 */
export function newMarks(design: Design): { device(device: Pick<Device, 'kind' | 'symbol'>): string; run(): string } {
  const highest = new Map<string, number>();
  const note = (mark: string | undefined) => {
    const parts = /^([A-Z]+)(\d{1,9})(?:\.\d+)?$/.exec(mark ?? '');
    if (parts === null) return;
    highest.set(parts[1]!, Math.max(highest.get(parts[1]!) ?? 0, Number(parts[2])));
  };
  for (const device of Object.values(design.devices)) note(device.mark);
  const runHighest = { W: 0 };
  for (const run of [...Object.values(design.runs), ...Object.values(design.cables ?? {})]) {
    const parts = /^W(\d{1,9})(?:\.\d+)?$/.exec(run.mark ?? '');
    if (parts !== null) runHighest.W = Math.max(runHighest.W, Number(parts[1]));
  }
  return {
    device(device) {
      const letter = kindOf(device)?.letter(device.symbol) ?? 'X';
      const number = (highest.get(letter) ?? 0) + 1;
      highest.set(letter, number);
      return `${letter}${number}`;
    },
    run() {
      runHighest.W += 1;
      return `W${runHighest.W}`;
    },
  };
}

/** F2 before F10. */
export function compareMarks(a: { readonly mark?: string; readonly id: string }, b: typeof a): number {
  const one = a.mark ?? '';
  const other = b.mark ?? '';
  const letters = (mark: string) => mark.replace(/[\d.].*$/, '');
  const number = (mark: string) => Number.parseFloat(mark.replace(/^\D*/, '')) || 0;
  if (letters(one) !== letters(other)) return letters(one) < letters(other) ? -1 : 1;
  if (number(one) !== number(other)) return number(one) - number(other);
  if (one !== other) return one < other ? -1 : 1;
  return a.id < b.id ? -1 : a.id > b.id ? 1 : 0;
}
