import { eq } from 'drizzle-orm';

import type { Design } from '#shared/model/design.ts';
import type { Database, OpenDatabase } from '#server/db/connect.ts';
import { vessel, vesselMember } from '#server/db/schema/vessels.ts';
import { inTransaction, isDuplicate } from '#server/db/transaction.ts';
import { Conflict } from '#server/refusals.ts';

import { insertDesign } from './insert-design.ts';
import { writeAudit } from './write-audit.ts';

export interface AddedVessel {
  /** Of the vessel to be: asked for again with the same one, by the same person, it is made once. */
  readonly vesselId: string;
  readonly shopId: string;
  readonly personId: string;
  readonly design: Design;
  readonly deed: 'vessel-created' | 'vessel-imported' | 'vessel-duplicated';
}

/** A vessel with its design; who makes it is its designer. */
export async function addVessel(db: OpenDatabase, added: AddedVessel): Promise<void> {
  try {
    await inTransaction(db, (tx) => insertVessel(tx, added));
  } catch (error) {
    if (!isDuplicate(error) || !(await isMadeBy(db, added))) throw error;
  }
}

export async function insertVessel(
  tx: Database,
  { vesselId, shopId, personId, design, deed }: AddedVessel,
): Promise<void> {
  const now = new Date();
  const name = design.vessel?.name.trim().slice(0, 100) || 'Unnamed vessel';
  await tx.insert(vessel).values({ id: vesselId, shopId, name, createdBy: personId, createdAt: now });
  await tx.insert(vesselMember).values({ vesselId, personId, role: 'designer', joinedAt: now });
  await insertDesign(tx, vesselId, design);
  await writeAudit(tx, { personId, deed, vesselId, shopId });
}

async function isMadeBy(db: OpenDatabase, { vesselId, shopId, personId }: AddedVessel): Promise<boolean> {
  const [there] = await db.select().from(vessel).where(eq(vessel.id, vesselId));
  if (there === undefined) return false;
  if (there.createdBy === personId && there.shopId === shopId) return true;
  throw new Conflict('This key was used for something else already.');
}
