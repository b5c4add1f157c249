import { and, desc, eq } from 'drizzle-orm';

import type { Design } from '#shared/model/design.ts';

import type { Database } from './connect.ts';
import { person } from './schema/accounts.ts';
import { revision } from './schema/designs.ts';

export interface RevisionRow {
  readonly revisionId: string;
  readonly number: number;
  readonly letter: string;
  readonly note: string | null;
  readonly issuedBy: string;
  readonly issuedAt: Date;
  readonly seq: number;
  readonly design: Design;
}

/** The latest first, without the documents. */
export function readRevisions(db: Database, vesselId: string): Promise<Omit<RevisionRow, 'design'>[]> {
  return db
    .select(FACTS)
    .from(revision)
    .innerJoin(person, eq(person.id, revision.issuedBy))
    .where(eq(revision.vesselId, vesselId))
    .orderBy(desc(revision.number));
}

export async function readRevision(
  db: Database,
  vesselId: string,
  which: { readonly letter: string } | { readonly revisionId: string },
): Promise<RevisionRow | undefined> {
  const [row] = await db
    .select({ ...FACTS, design: revision.design })
    .from(revision)
    .innerJoin(person, eq(person.id, revision.issuedBy))
    .where(
      and(
        eq(revision.vesselId, vesselId),
        'letter' in which ? eq(revision.letter, which.letter) : eq(revision.id, which.revisionId),
      ),
    );
  return row === undefined ? undefined : { ...row, design: row.design as Design };
}

const FACTS = {
  revisionId: revision.id,
  number: revision.number,
  letter: revision.letter,
  note: revision.note,
  issuedBy: person.name,
  issuedAt: revision.issuedAt,
  seq: revision.seq,
};
