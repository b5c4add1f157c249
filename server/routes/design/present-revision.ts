import type { Revision } from '#shared/api/design.ts';
import type { RevisionRow } from '#server/db/revision-queries.ts';

export function presentRevision(row: Omit<RevisionRow, 'design'>): Revision {
  return {
    revisionId: row.revisionId,
    letter: row.letter,
    note: row.note,
    issuedBy: row.issuedBy,
    issuedAt: row.issuedAt.toISOString(),
    seq: row.seq,
  };
}
