/** Marks as a fitter counts them: F2 before F10, W2 before W10; equal marks by id. */
export function compareMarks(
  a: { readonly id: string; readonly mark?: string },
  b: { readonly id: string; readonly mark?: string },
): number {
  const [lettersA, numberA] = split(a.mark ?? '');
  const [lettersB, numberB] = split(b.mark ?? '');
  if (lettersA !== lettersB) return lettersA < lettersB ? -1 : 1;
  if (numberA !== numberB) return numberA - numberB;
  return a.id < b.id ? -1 : a.id > b.id ? 1 : 0;
}

function split(mark: string): [string, number] {
  const match = /^(\D*)(\d+(?:\.\d+)?)?/.exec(mark);
  return [match?.[1] ?? '', Number(match?.[2] ?? 0)];
}
