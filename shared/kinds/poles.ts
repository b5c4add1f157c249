import type { Terminal } from './kind.ts';

/** The terminals of a switching device by its poles: a, b; a2, b2; … one pole under the other. */
export function poleTerminals(poles: number): Terminal[] {
  return Array.from({ length: poles }, (_, i) => i).flatMap((i): Terminal[] => {
    const suffix = i === 0 ? '' : String(i + 1);
    return [
      { name: `a${suffix}`, role: 'any', x: 0, y: 2 * i + 1 },
      { name: `b${suffix}`, role: 'any', x: 6, y: 2 * i + 1 },
    ];
  });
}
