/** Marks as a fitter counts them: F2 before F10, W2 before W10; equal marks by id. */
export function compareMarks(
  a: { readonly id: string; readonly mark?: string },
  b: { readonly id: string; readonly mark?: string },
): number {
  const [lettersA, numberA] = splitOnce(a);
  const [lettersB, numberB] = splitOnce(b);
  if (lettersA !== lettersB) return lettersA < lettersB ? -1 : 1;
  if (numberA !== numberB) return numberA - numberB;
  return a.id < b.id ? -1 : a.id > b.id ? 1 : 0;
}

const known = new WeakMap<object, readonly [string, number]>();

/** Sorting asks for the same mark many times. */
function splitOnce(marked: { readonly mark?: string }): readonly [string, number] {
  const kept = known.get(marked);
  if (kept !== undefined) return kept;
  const parts = split(marked.mark ?? '');
  known.set(marked, parts);
  return parts;
}

function split(mark: string): [string, number] {
  const match = /^(\D*)(\d+(?:\.\d+)?)?/.exec(mark);
  return [match?.[1] ?? '', Number(match?.[2] ?? 0)];
}
