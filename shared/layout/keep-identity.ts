import type { SheetLayout } from './sheet-layout.ts';

/** The new layout with every entry of the old one that says the same; the old one itself when all of it does. */
export function keepIdentity(next: SheetLayout, previous: SheetLayout | undefined): SheetLayout {
  if (previous === undefined) return next;
  const runs = keepEntries(next.runs, previous.runs);
  const tags = keepEntries(next.tags, previous.tags);
  return runs === previous.runs && tags === previous.tags ? previous : { runs, tags };
}

function keepEntries<Entry extends object>(
  next: Readonly<Record<string, Entry>>,
  previous: Readonly<Record<string, Entry>>,
): Readonly<Record<string, Entry>> {
  const kept: Record<string, Entry> = {};
  let changed = Object.keys(next).length !== Object.keys(previous).length;
  for (const [id, entry] of Object.entries(next)) {
    const old = previous[id];
    if (old !== undefined && isSame(old, entry)) kept[id] = old;
    else {
      kept[id] = entry;
      changed = true;
    }
  }
  return changed ? kept : previous;
}

/** Plain data, compared by value. */
function isSame(a: unknown, b: unknown): boolean {
  if (a === b) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  const keys = Object.keys(a);
  if (keys.length !== Object.keys(b).length) return false;
  return keys.every((key) => isSame((a as Record<string, unknown>)[key], (b as Record<string, unknown>)[key]));
}
