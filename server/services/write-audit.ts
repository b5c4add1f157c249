import type { Database } from '#server/db/connect.ts';
import { newId } from '#server/db/ids.ts';
import { auditLog } from '#server/db/schema/records.ts';

/** Who did what, in the transaction it was done in. Edits of a drawing are in its change log and not repeated here. */
export async function writeAudit(
  tx: Database,
  entry: {
    readonly personId: string;
    readonly deed: string;
    readonly vesselId?: string;
    readonly shopId?: string;
    readonly detail?: Readonly<Record<string, unknown>>;
  },
): Promise<void> {
  await tx.insert(auditLog).values({
    id: newId(),
    at: new Date(),
    personId: entry.personId,
    vesselId: entry.vesselId ?? null,
    shopId: entry.shopId ?? null,
    deed: entry.deed,
    detail: entry.detail ?? null,
  });
}
