import type { Terminal } from './kind.ts';

/** The terminals of a switching device by its poles: a, b; a2, b2; … one pole under the other. */
export function poleTerminals(poles: number): Terminal[] {
  return poleNames(poles).flatMap(({ a, b }, i): Terminal[] => [
    { name: a, role: 'any', x: 0, y: 2 * i + 1 },
    { name: b, role: 'any', x: 6, y: 2 * i + 1 },
  ]);
}

export function poleNames(poles: number): { readonly a: string; readonly b: string }[] {
  return Array.from({ length: poles }, (_, i) => {
    const suffix = i === 0 ? '' : String(i + 1);
    return { a: `a${suffix}`, b: `b${suffix}` };
  });
}
