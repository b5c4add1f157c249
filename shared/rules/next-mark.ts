import type { Design } from '#shared/model/design.ts';

/** The highest number used with a letter, plus one: numbers stand on wires and do not come back by themselves. */
export function nextMark(design: Design, letter: string): string {
  const numbers = Object.values(design.devices).map((device) => {
    const number = new RegExp(`^${letter}(\\d+)$`).exec(device.mark ?? '')?.[1];
    return Number(number ?? 0);
  });
  return `${letter}${Math.max(0, ...numbers) + 1}`;
}
