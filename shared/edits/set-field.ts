import { DesignFile } from '#shared/kinds/design-file.ts';
import { findBadReference } from '#shared/kinds/references.ts';
import { FAMILIES, type Design, type Family } from '#shared/model/design.ts';
import { applyPatches, type Patch } from '#shared/model/patch.ts';

import { callDevice, callRun, refuse, remove, set, type Edit } from './edit.ts';

/**
 * One value set at its path, or taken back to its default with undefined. Refused with a sentence where the
 * document may not say that, or where a run would lose the terminal it ends on.
 */
export function setField(design: Design, path: readonly string[], value: unknown, label = nameOf(design, path)): Edit {
  if (path.length < 2 || path.at(-1) === 'id' || (path.length === 3 && path[2] === 'kind')) {
    return refuse(label, 'This is not changed by hand.');
  }
  if (isSame(valueAt(design, path), value)) return { label, patches: [] };

  const patches: Patch[] = [value === undefined ? remove(path) : set(path, value)];
  const refused = whyNot(design, patches, path);
  return refused === undefined ? { label, patches } : refuse(label, refused);
}

/** The same value at several places at once: the common fields of a selection. */
export function setFields(
  design: Design,
  fields: readonly { readonly path: readonly string[]; readonly value: unknown }[],
  label: string,
): Edit {
  const patches: Patch[] = [];
  for (const { path, value } of fields) {
    const edit = setField(design, path, value, label);
    if (edit.refused !== undefined) return edit;
    patches.push(...edit.patches);
  }
  return { label, patches };
}

/** Metres, one way; undefined: not yet known. */
export function setLength(design: Design, runId: string, lengthM: number | undefined): Edit {
  return setField(design, ['runs', runId, 'lengthM'], lengthM, `Set the length of ${callRun(design.runs[runId])}`);
}

export function rename(design: Design, deviceId: string, name: string): Edit {
  return setField(design, ['devices', deviceId, 'name'], name, `Rename ${callDevice(design.devices[deviceId])}`);
}

/**
 * A load is rated by its amperes or by its watts: giving the one takes the other out.
 */
export function setLoadRating(design: Design, deviceId: string, rating: { ratedA: number } | { ratedW: number }): Edit {
  const { ratedA: _amps, ratedW: _watts, ...others } = design.devices[deviceId]?.ratings ?? {};
  return setField(design, ['devices', deviceId, 'ratings'], { ...others, ...rating });
}

function whyNot(design: Design, patches: readonly Patch[], path: readonly string[]): string | undefined {
  const [family, id] = path as [string, string];
  const isRow = FAMILIES.includes(family as Family);
  if (!isRow && family !== 'basis' && family !== 'vessel') return 'This is not a part of a design.';
  if (isRow && !Object.hasOwn(design[family as Family] ?? {}, id)) return 'It is not there any more.';

  const changed = applyPatches(design, patches);
  const entity = (isRow ? valueAt(changed, [family, id]) : valueAt(changed, [family])) as unknown;
  const parsed = schemaOf(family).safeParse(isRow ? { [id]: entity } : entity);
  if (!parsed.success) return sentenceOf(parsed.error.issues[0]?.message);

  const bad = findBadReference(changed);
  if (bad === null) return undefined;
  if (bad.path.at(-1) === 'terminal') return 'A run ends on a terminal that this would take away.';
  return sentenceOf(bad.reason);
}

function schemaOf(family: string) {
  return DesignFile.shape[family as keyof typeof DesignFile.shape];
}

function sentenceOf(reason: string | undefined): string {
  const plain = reason !== undefined && /^[a-z]/.test(reason) ? reason : 'is not a value that this may have';
  return `This ${plain}.`;
}

function nameOf(design: Design, path: readonly string[]): string {
  const [family, id = ''] = path;
  if (family === 'devices') return `Change ${callDevice(design.devices[id])}`;
  if (family === 'runs') return `Change ${callRun(design.runs[id])}`;
  if (family === 'zones') return `Change zone ${design.zones[id]?.name ?? ''}`.trim();
  if (family === 'sheets') return `Change sheet ${design.sheets[id]?.number ?? 1}`;
  if (family === 'basis') return 'Change the basis';
  if (family === 'vessel') return 'Change the vessel';
  return 'Change the design';
}

function valueAt(design: object, path: readonly string[]): unknown {
  let at: unknown = design;
  for (const key of path) {
    if (typeof at !== 'object' || at === null || !Object.hasOwn(at, key)) return undefined;
    at = (at as Record<string, unknown>)[key];
  }
  return at;
}

export function isSame(a: unknown, b: unknown): boolean {
  if (a === b) return true;
  if (typeof a !== 'object' || typeof b !== 'object' || a === null || b === null) return false;
  if (Array.isArray(a) !== Array.isArray(b)) return false;
  const keys = Object.keys(a);
  if (keys.length !== Object.keys(b).length) return false;
  return keys.every(
    (key) => Object.hasOwn(b, key) && isSame((a as Record<string, unknown>)[key], (b as Record<string, unknown>)[key]),
  );
}
