/** Marks as a person reads them: F2 before F10; what has none by its id, last. */
export function compareMarks(
  a: { readonly id: string; readonly mark?: string },
  b: { readonly id: string; readonly mark?: string },
): number {
  return compareNaturally(a.mark ?? '', b.mark ?? '') || compareText(a.id, b.id);
}

/** Runs of digits by their number, all else letter by letter; the empty mark last. No locale: the same everywhere. */
export function compareNaturally(a: string, b: string): number {
  if (a === '' || b === '') return Number(a === '') - Number(b === '');
  const [partsA, partsB] = [a, b].map((text) => text.match(/\d+|\D+/g) ?? []);
  for (let i = 0; i < Math.min(partsA!.length, partsB!.length); i++) {
    const [one, other] = [partsA![i]!, partsB![i]!];
    const areNumbers = /^\d/.test(one) && /^\d/.test(other);
    const order = areNumbers ? Number(one) - Number(other) || one.length - other.length : compareText(one, other);
    if (order !== 0) return order;
  }
  return partsA!.length - partsB!.length;
}

export function compareText(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}
