import { FAMILIES, type Design } from '#shared/model/design.ts';
import type { Patch } from '#shared/model/patch.ts';

/**
 * Patches, an entity each, that lead from one state of a design to another. Entities are compared by identity,
 * which applying patches keeps for all it does not touch: the cost is that of what changed.
 */
export function differenceBetween(before: Design, after: Design): Patch[] {
  const patches: Patch[] = [];
  if (before === after) return patches;
  for (const part of ['vessel', 'basis'] as const) {
    if (before[part] !== after[part]) patches.push(setOrRemove([part], after[part]));
  }
  for (const family of FAMILIES) {
    const old: Readonly<Record<string, unknown>> = before[family] ?? {};
    const now: Readonly<Record<string, unknown>> = after[family] ?? {};
    if (old === now) continue;
    for (const id of Object.keys(old)) {
      if (!Object.hasOwn(now, id)) patches.push({ op: 'remove', path: [family, id] });
    }
    for (const [id, entity] of Object.entries(now)) {
      if (old[id] !== entity) patches.push({ op: 'set', path: [family, id], value: entity });
    }
  }
  return patches;
}

function setOrRemove(path: string[], value: unknown): Patch {
  return value === undefined ? { op: 'remove', path } : { op: 'set', path, value };
}
