import type { OpenDatabase } from '#server/db/connect.ts';
import { lockDesign } from '#server/db/design-queries.ts';
import { inTransaction } from '#server/db/transaction.ts';
import { NotFound } from '#server/refusals.ts';

import { applyChange } from './make-change.ts';

/** A new name is a change of the design like any other: in its history, and told to whoever has it open. */
export function renameVesselAsChange(
  db: OpenDatabase,
  { vesselId, personId, name, changeId }: { vesselId: string; personId: string; name: string; changeId: string },
): Promise<{ seq: number }> {
  return inTransaction(db, async (tx) => {
    const row = await lockDesign(tx, vesselId);
    if (row === undefined) throw new NotFound();
    return applyChange(tx, vesselId, personId, {
      id: changeId,
      base: row.seq,
      label: 'Rename the vessel',
      patches: [{ op: 'set', path: ['vessel', 'name'], value: name }],
    });
  });
}
