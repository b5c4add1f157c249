import { FAMILIES, type Design } from '#shared/model/design.ts';
import { MOST_PATCHES, type Patch } from '#shared/model/patch.ts';

import { refuse, remove, set, type Edit } from './edit.ts';
import { isSame } from './set-field.ts';

/** One design turned into another as one change that can be undone; what is the same in both is left alone. */
export function replaceDesign(current: Design, next: Design, label = 'Replace the drawing'): Edit {
  const patches: Patch[] = [];
  for (const part of ['vessel', 'basis'] as const) {
    if (isSame(current[part], next[part])) continue;
    patches.push(next[part] === undefined ? remove([part]) : set([part], next[part]));
  }
  for (const family of FAMILIES) {
    const before: Readonly<Record<string, unknown>> = current[family] ?? {};
    const after: Readonly<Record<string, unknown>> = next[family] ?? {};
    for (const id of Object.keys(before)) if (!Object.hasOwn(after, id)) patches.push(remove([family, id]));
    for (const [id, entity] of Object.entries(after)) {
      if (!isSame(before[id], entity)) patches.push(set([family, id], entity));
    }
  }
  if (patches.length > MOST_PATCHES) {
    return refuse(
      label,
      `The two differ in ${patches.length} places; one change may hold ${MOST_PATCHES}. Open the file as a new vessel.`,
    );
  }
  return { label, patches };
}
