import { isDeepStrictEqual } from 'node:util';

import { and, eq, gt, ne } from 'drizzle-orm';

import type { Problem } from '#shared/api/problem.ts';
import type { Family } from '#shared/model/design.ts';
import { pathsOverlap, type Patch } from '#shared/model/patch.ts';
import type { Database } from '#server/db/connect.ts';
import { person } from '#server/db/schema/accounts.ts';
import { changeLog } from '#server/db/schema/designs.ts';

import type { TouchedRows } from './touched-rows.ts';

export type FieldConflict = NonNullable<Problem['conflicts']>[number];

/** What others changed since a number, found by path. */
export interface OthersChanges {
  /** The latest of them that overlaps a path. */
  touching(path: readonly string[]): { readonly by: string; readonly at: string } | undefined;
}

export async function readOthersChanges(
  tx: Database,
  vesselId: string,
  since: number,
  personId: string,
): Promise<OthersChanges> {
  const rows = await tx
    .select({ patches: changeLog.patches, at: changeLog.at, by: person.name })
    .from(changeLog)
    .innerJoin(person, eq(person.id, changeLog.personId))
    .where(and(eq(changeLog.vesselId, vesselId), gt(changeLog.seq, since), ne(changeLog.personId, personId)))
    .orderBy(changeLog.seq);
  const byPlace = new Map<string, { path: readonly string[]; by: string; at: string }[]>();
  for (const row of rows) {
    for (const { path } of row.patches as Patch[]) {
      const place = placeOf(path);
      byPlace.set(place, [...(byPlace.get(place) ?? []), { path, by: row.by, at: row.at.toISOString() }]);
    }
  }
  return {
    touching(path) {
      const near = [byPlace.get(placeOf(path)), byPlace.get(placeOf(path.slice(0, 1)))];
      const wide = path.length === 1 ? [...byPlace.values()] : [];
      return [...near, ...wide].flatMap((list) => list ?? []).findLast((theirs) => pathsOverlap(theirs.path, path));
    },
  };
}

/** The patches that touch what someone else has changed since, unless both made it the same. */
export function findConflicts(others: OthersChanges, now: TouchedRows, patches: readonly Patch[]): FieldConflict[] {
  return patches.flatMap((patch) => {
    const theirs = others.touching(patch.path);
    if (theirs === undefined) return [];
    const value = valueAt(now, patch.path);
    if (isDeepStrictEqual(value, patch.op === 'set' ? patch.value : undefined)) return [];
    return [{ path: [...patch.path], theirs: value ?? null, by: theirs.by, at: theirs.at }];
  });
}

function valueAt(rows: TouchedRows, path: readonly string[]): unknown {
  const [root, id, ...below] = path as [string, ...string[]];
  if (root === 'vessel' || root === 'basis') return walk(rows[root], path.slice(1));
  const family = rows.families[root as Family];
  if (id === undefined) return Object.fromEntries(family);
  return walk(family.get(id), below);
}

function walk(value: unknown, path: readonly string[]): unknown {
  let at = value;
  for (const key of path) {
    if (typeof at !== 'object' || at === null || !Object.hasOwn(at, key)) return undefined;
    at = (at as Record<string, unknown>)[key];
  }
  return at;
}

/** Overlapping paths share it, or one of them is a family whole. */
function placeOf(path: readonly string[]): string {
  return path.slice(0, 2).join('/');
}
