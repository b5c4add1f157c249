import { and, eq, max } from 'drizzle-orm';

import type { Database, OpenDatabase } from '#server/db/connect.ts';
import { lockDesign, readWholeDesign } from '#server/db/design-queries.ts';
import { readRevision, type RevisionRow } from '#server/db/revision-queries.ts';
import { revision } from '#server/db/schema/designs.ts';
import { inTransaction } from '#server/db/transaction.ts';
import { Conflict, Invalid, NotFound } from '#server/refusals.ts';

import { writeAudit } from './write-audit.ts';

export interface Issue {
  readonly vesselId: string;
  readonly personId: string;
  readonly id: string;
  /** The number the person was looking at: what is issued is what was seen. */
  readonly seq: number;
  readonly note?: string | undefined;
}

/** Freezes the design as it stands as the next letter. Sent again with the same id it answers the same revision. */
export function issueRevision(db: OpenDatabase, issue: Issue): Promise<RevisionRow> {
  return inTransaction(db, (tx) => insertRevision(tx, issue));
}

export async function insertRevision(tx: Database, { vesselId, personId, id, seq, note }: Issue): Promise<RevisionRow> {
  const row = await lockDesign(tx, vesselId);
  if (row === undefined) throw new NotFound();
  const already = await readRevision(tx, vesselId, { revisionId: id });
  if (already !== undefined) return already;
  if (seq > row.seq) throw new Invalid('seq: this design has no such change yet', 'seq');
  if (seq < row.seq)
    throw new Conflict('The drawing was changed since. Look at it again before it is issued.', { seq: row.seq });
  const whole = await readWholeDesign(tx, vesselId);
  const number = (await readLastNumber(tx, vesselId)) + 1;
  await tx.insert(revision).values({
    id,
    vesselId,
    number,
    letter: letterOf(number),
    note: note ?? null,
    issuedBy: personId,
    issuedAt: new Date(),
    seq,
    design: whole!.design,
  });
  await writeAudit(tx, { personId, deed: 'revision-issued', vesselId, detail: { letter: letterOf(number), seq } });
  return (await readRevision(tx, vesselId, { revisionId: id }))!;
}

/** A to Z, then AA, AB … */
export function letterOf(number: number): string {
  const last = String.fromCharCode(65 + ((number - 1) % 26));
  const before = Math.floor((number - 1) / 26);
  return before === 0 ? last : letterOf(before) + last;
}

async function readLastNumber(tx: Database, vesselId: string): Promise<number> {
  const [row] = await tx
    .select({ last: max(revision.number) })
    .from(revision)
    .where(and(eq(revision.vesselId, vesselId)));
  return row?.last ?? 0;
}
