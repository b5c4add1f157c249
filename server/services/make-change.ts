import { and, eq } from 'drizzle-orm';

import type { Change } from '#shared/api/design.ts';
import { FAMILIES, type Vessel } from '#shared/model/design.ts';
import type { Database, OpenDatabase } from '#server/db/connect.ts';
import { countFamily, deleteEntities, lockDesign, writeEntities } from '#server/db/design-queries.ts';
import { changeLog, design } from '#server/db/schema/designs.ts';
import { vessel } from '#server/db/schema/vessels.ts';
import { inTransaction } from '#server/db/transaction.ts';
import { Conflict, Invalid, NotFound } from '#server/refusals.ts';

import { checkReferences, writeReferences } from './check-references.ts';
import { findConflicts, readOthersChanges } from './others-changes.ts';
import { changedIds, checkPaths, checkShapes, loadTouched, patchTouched, type TouchedRows } from './touched-rows.ts';

/**
 * One change, applied whole or not at all, in one transaction under the lock of the design's row. Sent again it
 * answers the number it got the first time. Only the rows it touches are read and written.
 */
export function makeChange(
  db: OpenDatabase,
  { vesselId, personId, change }: { vesselId: string; personId: string; change: Change },
): Promise<{ seq: number }> {
  checkPaths(change.patches);
  return inTransaction(db, (tx) => applyChange(tx, vesselId, personId, change));
}

export async function applyChange(
  tx: Database,
  vesselId: string,
  personId: string,
  change: Change,
): Promise<{ seq: number }> {
  const row = await lockDesign(tx, vesselId);
  if (row === undefined) throw new NotFound();
  const already = await readNumberOf(tx, vesselId, change.id);
  if (already !== undefined) return { seq: already };
  if (change.base > row.seq) throw new Invalid('base: this design has no such change yet', 'base');

  const others = await readOthersChanges(tx, vesselId, change.base, personId);
  const before = await loadTouched(tx, vesselId, row, change.patches);
  const conflicts = findConflicts(others, before, change.patches);
  if (conflicts.length > 0) {
    throw new Conflict(`${conflicts[0]!.by} changed the same thing meanwhile.`, { conflicts, seq: row.seq });
  }

  const after = patchTouched(before, change.patches);
  checkShapes(before, after);
  const seq = row.seq + 1;
  await writeRows(tx, vesselId, seq, before, after);
  await checkReferences(tx, vesselId, before, after, others, row.seq);
  await tx.insert(changeLog).values({
    vesselId,
    seq,
    changeId: change.id,
    label: change.label,
    patches: change.patches,
    personId,
    at: new Date(),
  });
  return { seq };
}

async function readNumberOf(tx: Database, vesselId: string, changeId: string): Promise<number | undefined> {
  const [logged] = await tx
    .select({ seq: changeLog.seq })
    .from(changeLog)
    .where(and(eq(changeLog.vesselId, vesselId), eq(changeLog.changeId, changeId)));
  return logged?.seq;
}

async function writeRows(
  tx: Database,
  vesselId: string,
  seq: number,
  before: TouchedRows,
  after: TouchedRows,
): Promise<void> {
  for (const family of FAMILIES) {
    const ids = changedIds(before, after, family);
    const bodies = after.families[family];
    const gone = ids.filter((id) => bodies.get(id) === undefined);
    const kept = ids.filter((id) => bodies.get(id) !== undefined);
    await deleteEntities(tx, vesselId, family, gone);
    await writeEntities(
      tx,
      vesselId,
      family,
      seq,
      kept.map((id) => [id, bodies.get(id)] as const),
    );
    if (family === 'sheets' && gone.length > 0 && (await countFamily(tx, vesselId, 'sheets')) === 0) {
      throw new Invalid('sheets: a design has at least one sheet', 'sheets');
    }
  }
  await writeReferences(tx, vesselId, before, after);
  await tx
    .update(design)
    .set({
      seq,
      ...(after.vessel === before.vessel ? {} : { vessel: after.vessel ?? null }),
      ...(after.basis === before.basis ? {} : { basis: after.basis }),
    })
    .where(eq(design.vesselId, vesselId));
  if (after.vessel !== before.vessel) await followName(tx, vesselId, after.vessel as Vessel | undefined);
}

/** The name in the design is the one truth. Without one the list goes on with the last. */
async function followName(tx: Database, vesselId: string, named: Vessel | undefined): Promise<void> {
  const name = named?.name.trim().slice(0, 100);
  if (name) await tx.update(vessel).set({ name }).where(eq(vessel.id, vesselId));
}
