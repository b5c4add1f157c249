import { DesignFile } from '#shared/kinds/design-file.ts';
import { findBadReference, type Refusal } from '#shared/kinds/references.ts';
import { sizeOf } from '#shared/model/size.ts';
import type { Design, Run } from '#shared/model/design.ts';

import { firstOf, refusalOf, type Path } from './refusal.ts';

export type ReadDesign =
  | { readonly ok: true; readonly design: Design }
  | { readonly ok: false; readonly path: string; readonly reason: string };

/** Far more than the format needs; deeper than this is no design but an attempt to exhaust the reader. */
const MOST_DEPTH = 32;

/**
 * A design file read whole, or refused whole with the first thing wrong in it: `runs.w12.lengthM` `must be greater
 * than 0`. Never throws, whatever the text is.
 */
export function readDesign(text: string): ReadDesign {
  let value: unknown;
  try {
    value = JSON.parse(text.startsWith('\uFEFF') ? text.slice(1) : text);
  } catch {
    return { ok: false, path: 'file', reason: 'is not JSON' };
  }
  return readDesignValue(value);
}

/** As readDesign, of what was parsed already. */
export function readDesignValue(value: unknown): ReadDesign {
  const refusal = findReservedKey(value, []);
  if (refusal !== null) return refuse(refusal);

  const parsed = DesignFile.safeParse(value);
  if (!parsed.success)
    return refuse(
      firstOf(
        parsed.error.issues.flatMap((issue) => refusalOf(issue, value)),
        value,
      ),
    );

  const design = spellSizes(parsed.data as unknown as Design);
  const bad = findBadReference(design);
  return bad === null ? { ok: true, design } : refuse(bad);
}

function refuse({ path, reason }: Refusal): ReadDesign {
  return { ok: false, path: path.length === 0 ? 'file' : path.join('.'), reason };
}

/**
 * Names that every object answers to. As an id one of them would be found where nothing was put, so they are
 * refused as keys before anything looks one up.
 */
const RESERVED = new Set([...Object.getOwnPropertyNames(Object.prototype), 'prototype']);

/** The first key of a value that no file may have, with the way to it. */
export function findReservedKey(value: unknown, path: Path): Refusal | null {
  if (typeof value !== 'object' || value === null) return null;
  if (path.length > MOST_DEPTH) return { path: path.slice(0, 8), reason: 'is nested too deeply' };
  for (const key of Object.keys(value)) {
    const here = [...path, key];
    if (RESERVED.has(key)) return { path: here, reason: 'is not a key that a file may have' };
    const found = findReservedKey((value as Record<string, unknown>)[key], here);
    if (found !== null) return found;
  }
  return null;
}

/** `70 mm2` is kept as `70 mm²`. */
function spellSizes(design: Design): Design {
  const runs: Record<string, Run> = {};
  for (const [id, run] of Object.entries(design.runs)) {
    const size = sizeOf(run.conductor.size) ?? run.conductor.size;
    runs[id] = size === run.conductor.size ? run : { ...run, conductor: { ...run.conductor, size } };
  }
  return { ...design, runs };
}
