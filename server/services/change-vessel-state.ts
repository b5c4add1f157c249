import { eq } from 'drizzle-orm';

import type { OpenDatabase } from '#server/db/connect.ts';
import { vessel } from '#server/db/schema/vessels.ts';
import { inTransaction } from '#server/db/transaction.ts';

import { writeAudit } from './write-audit.ts';

type NewState = 'archived' | 'unarchived' | 'deleted' | 'restored';

/** Puts a vessel aside, or out of sight for 30 days, and back. Asked for twice it is done once. */
export function changeVesselState(
  db: OpenDatabase,
  { vesselId, personId, to }: { vesselId: string; personId: string; to: NewState },
): Promise<void> {
  return inTransaction(db, async (tx) => {
    const [row] = await tx.select().from(vessel).where(eq(vessel.id, vesselId)).for('update');
    if (row === undefined) return;
    const now = new Date();
    const change = {
      archived: { archivedAt: row.archivedAt ?? now },
      unarchived: { archivedAt: null },
      deleted: { deletedAt: row.deletedAt ?? now },
      restored: { deletedAt: null },
    }[to];
    await tx.update(vessel).set(change).where(eq(vessel.id, vesselId));
    await writeAudit(tx, { personId, deed: `vessel-${to}`, vesselId, shopId: row.shopId });
  });
}
