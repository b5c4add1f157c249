import { z } from 'zod';

/** One step of a change. Paths start at the document: `['runs', 'w12', 'conductor', 'size']`. Arrays are set whole. */
export const Patch = z.strictObject({
  op: z.enum(['set', 'remove']),
  path: z.array(z.string().min(1).max(128)).min(1).max(8),
  value: z.json().optional(),
});
export interface Patch {
  readonly op: 'set' | 'remove';
  readonly path: readonly string[];
  readonly value?: unknown;
}

export const MOST_PATCHES = 5_000;

type Branch = Record<string, unknown>;

/**
 * The document with the patches applied in order. What they do not touch stays the same object, so that a
 * comparison by identity tells what changed. Setting below something missing makes the way there; removing
 * something missing changes nothing.
 */
export function applyPatches<T extends object>(document: T, patches: readonly Patch[]): T {
  return patches.reduce<T>((now, patch) => applyAt(now as Branch, patch, 0) as T, document);
}

function applyAt(branch: Branch, patch: Patch, depth: number): Branch {
  const key = patch.path[depth]!;
  if (key === '__proto__') return branch;
  if (depth === patch.path.length - 1) {
    if (patch.op === 'set') return { ...branch, [key]: patch.value };
    if (!Object.hasOwn(branch, key)) return branch;
    const { [key]: _removed, ...rest } = branch;
    return rest;
  }
  const below = Object.hasOwn(branch, key) ? branch[key] : undefined;
  const isBranch = typeof below === 'object' && below !== null && !Array.isArray(below);
  if (!isBranch && patch.op === 'remove') return branch;
  const changed = applyAt(isBranch ? (below as Branch) : {}, patch, depth + 1);
  return changed === below ? branch : { ...branch, [key]: changed };
}

/** Patches that take a document on which `patches` were applied back to `before`. */
export function invertPatches(before: object, patches: readonly Patch[]): Patch[] {
  const inverse: Patch[] = [];
  let now = before;
  for (const patch of patches) {
    inverse.unshift(invertOne(now as Branch, patch));
    now = applyPatches(now, [patch]);
  }
  return inverse;
}

/** Undoes at the shallowest place that was missing or was no branch, so that nothing is left behind or lost. */
function invertOne(before: Branch, patch: Patch): Patch {
  let at: unknown = before;
  for (let depth = 0; depth < patch.path.length; depth++) {
    if (typeof at !== 'object' || at === null || Array.isArray(at)) {
      return { op: 'set', path: patch.path.slice(0, depth), value: at };
    }
    if (!Object.hasOwn(at, patch.path[depth]!)) return { op: 'remove', path: patch.path.slice(0, depth + 1) };
    at = (at as Branch)[patch.path[depth]!];
  }
  return { op: 'set', path: patch.path, value: at };
}

/** Whether one path lies on or below the other: two changes of such paths touch the same thing. */
export function pathsOverlap(a: readonly string[], b: readonly string[]): boolean {
  const depth = Math.min(a.length, b.length);
  return a.slice(0, depth).every((key, i) => key === b[i]);
}
