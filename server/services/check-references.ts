import { FAMILIES, type Device, type Family } from '#shared/model/design.ts';
import type { Database } from '#server/db/connect.ts';
import {
  deleteReferencesOf,
  insertReferences,
  readEntities,
  readReferencesTo,
  type ReferenceRow,
} from '#server/db/design-queries.ts';
import { Conflict, Invalid } from '#server/refusals.ts';

import { namesTheSame, referencesOf, terminalNamesOf, type Reference } from './entity-references.ts';
import type { OthersChanges } from './others-changes.ts';
import { changedIds, type TouchedRows } from './touched-rows.ts';

interface Naming extends Reference {
  readonly family: Family;
  readonly entityId: string;
}

/** Keeps the table of who names whom in step with the rows just written. */
export async function writeReferences(
  tx: Database,
  vesselId: string,
  before: TouchedRows,
  after: TouchedRows,
): Promise<void> {
  for (const family of FAMILIES) {
    const moved = changedIds(before, after, family).filter(
      (id) =>
        !namesTheSame(
          referencesOf(family, before.families[family].get(id)),
          referencesOf(family, after.families[family].get(id)),
        ),
    );
    await deleteReferencesOf(tx, vesselId, family, moved);
    await insertReferences(
      tx,
      vesselId,
      moved.flatMap((id) => referenceRowsOf(family, id, after.families[family].get(id))),
    );
  }
}

export function referenceRowsOf(family: Family, entityId: string, entity: unknown): ReferenceRow[] {
  const once = new Map(referencesOf(family, entity).map((to) => [`${to.toFamily}/${to.toId}`, to]));
  return [...once.values()].map(({ toFamily, toId }) => ({ family, entityId, toFamily, toId }));
}

/**
 * Whatever the change names is there after it, and whatever it deletes is named by nothing any more. A run left
 * without its device is a conflict whoever is to blame; the rest is one only where someone else had a hand in it.
 */
export async function checkReferences(
  tx: Database,
  vesselId: string,
  before: TouchedRows,
  after: TouchedRows,
  others: OthersChanges,
  seq: number,
): Promise<void> {
  await refuseParentCycles(tx, vesselId, before, after);
  const missing = [
    ...(await findMissing(tx, vesselId, before, after)),
    ...(await findLeftBehind(tx, vesselId, before, after)),
    ...(await findLostTerminals(tx, vesselId, before, after)),
  ];
  const first = missing[0];
  if (first === undefined) return;
  const conflicts = missing.flatMap((naming) => {
    const theirs = others.touching([naming.toFamily, naming.toId]) ?? others.touching([naming.family, naming.entityId]);
    return theirs === undefined
      ? []
      : [{ path: [naming.toFamily, naming.toId], theirs: null, by: theirs.by, at: theirs.at }];
  });
  const path = `${first.family}.${first.entityId}.${first.field}`;
  const what =
    first.terminal !== undefined && first.isThere
      ? `terminal ${first.terminal}, which ${first.toId} does not have`
      : `${first.toFamily.slice(0, -1)} ${first.toId}, which is not there`;
  const leavesRunWithoutDevice = missing.some(
    (naming) => naming.family === 'runs' && naming.toFamily === 'devices' && !naming.isThere,
  );
  if (conflicts.length > 0 || leavesRunWithoutDevice) {
    throw new Conflict(`${path}: names ${what}.`, { conflicts, seq });
  }
  throw new Invalid(`${path}: names ${what}`, path);
}

type Missing = Naming & { readonly isThere: boolean };

/** What the changed entities name and is not there. */
async function findMissing(
  tx: Database,
  vesselId: string,
  before: TouchedRows,
  after: TouchedRows,
): Promise<Missing[]> {
  const namings = FAMILIES.flatMap((family) =>
    changedIds(before, after, family).flatMap((id) => {
      const now = referencesOf(family, after.families[family].get(id));
      if (namesTheSame(now, referencesOf(family, before.families[family].get(id)))) return [];
      return now.map((reference): Naming => ({ ...reference, family, entityId: id }));
    }),
  );
  const missing: Missing[] = [];
  for (const family of FAMILIES) {
    const toThis = namings.filter((naming) => naming.toFamily === family);
    const there = await readTargets(tx, vesselId, after, family, toThis);
    for (const naming of toThis) {
      const target = there.get(naming.toId);
      if (target === undefined) missing.push({ ...naming, isThere: false });
      else if (naming.terminal !== undefined && !terminalNamesOf(target as Device).has(naming.terminal)) {
        missing.push({ ...naming, isThere: true });
      }
    }
  }
  return missing;
}

/** What still names an entity that the change deletes. */
async function findLeftBehind(
  tx: Database,
  vesselId: string,
  before: TouchedRows,
  after: TouchedRows,
): Promise<Missing[]> {
  const left: Missing[] = [];
  for (const family of FAMILIES) {
    const gone = changedIds(before, after, family).filter((id) => after.families[family].get(id) === undefined);
    for (const row of await readReferencesTo(tx, vesselId, family, gone)) {
      left.push(...(await namingsOf(tx, vesselId, after, row)).map((naming) => ({ ...naming, isThere: false })));
    }
  }
  return left;
}

/** Ends on terminals that a changed device has no more: a breaker of two poles made one of one. */
async function findLostTerminals(
  tx: Database,
  vesselId: string,
  before: TouchedRows,
  after: TouchedRows,
): Promise<Missing[]> {
  const shrunk = new Map<string, ReadonlySet<string>>();
  for (const id of changedIds(before, after, 'devices')) {
    const was = before.families.devices.get(id) as Device | undefined;
    const is = after.families.devices.get(id) as Device | undefined;
    if (was === undefined || is === undefined) continue;
    const names = terminalNamesOf(is);
    if ([...terminalNamesOf(was)].some((name) => !names.has(name))) shrunk.set(id, names);
  }
  const lost: Missing[] = [];
  for (const row of await readReferencesTo(tx, vesselId, 'devices', shrunk.keys())) {
    for (const naming of await namingsOf(tx, vesselId, after, row)) {
      if (naming.terminal !== undefined && !shrunk.get(naming.toId)!.has(naming.terminal)) {
        lost.push({ ...naming, isThere: true });
      }
    }
  }
  return lost;
}

/** A panel in itself, at once or by way of others. */
async function refuseParentCycles(
  tx: Database,
  vesselId: string,
  before: TouchedRows,
  after: TouchedRows,
): Promise<void> {
  const parentOf = async (id: string) => {
    const known = after.families.devices;
    const body = known.has(id) ? known.get(id) : (await readEntities(tx, vesselId, 'devices', [id])).get(id);
    return (body as Device | undefined)?.parent;
  };
  for (const id of changedIds(before, after, 'devices')) {
    const was = before.families.devices.get(id) as Device | undefined;
    const is = after.families.devices.get(id) as Device | undefined;
    if (is?.parent === undefined || is.parent === was?.parent) continue;
    const seen = new Set<string>();
    for (let at: string | undefined = is.parent; at !== undefined && !seen.has(at); at = await parentOf(at)) {
      if (at === id) {
        const path = `devices.${id}.parent`;
        throw new Invalid(`${path}: must not lead back to the device itself`, path);
      }
      seen.add(at);
    }
  }
}

async function namingsOf(tx: Database, vesselId: string, after: TouchedRows, row: ReferenceRow): Promise<Naming[]> {
  const family = row.family as Family;
  const entity =
    after.families[family].get(row.entityId) ??
    (await readEntities(tx, vesselId, family, [row.entityId])).get(row.entityId);
  return referencesOf(family, entity)
    .filter((reference) => reference.toFamily === row.toFamily && reference.toId === row.toId)
    .map((reference) => ({ ...reference, family, entityId: row.entityId }));
}

async function readTargets(
  tx: Database,
  vesselId: string,
  after: TouchedRows,
  family: Family,
  namings: readonly Naming[],
): Promise<Map<string, unknown>> {
  const ids = [...new Set(namings.map((naming) => naming.toId))];
  const known = after.families[family];
  const elsewhere = await readEntities(
    tx,
    vesselId,
    family,
    ids.filter((id) => !known.has(id)),
  );
  return new Map(ids.map((id) => [id, known.has(id) ? known.get(id) : elsewhere.get(id)]));
}
