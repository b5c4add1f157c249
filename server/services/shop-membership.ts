import { and, eq, inArray, isNull } from 'drizzle-orm';

import type { Database } from '#server/db/connect.ts';
import { shopMember } from '#server/db/schema/shops.ts';
import { vessel, vesselMember } from '#server/db/schema/vessels.ts';

/**
 * Designers and installers of a vessel belong to its shop; reviewers and owners come from outside and see only
 * their vessels. After a role was given, changed or taken this sets the membership right. An admin stays one.
 */
export async function settleMembership(tx: Database, shopId: string, personId: string): Promise<void> {
  const ofThisPerson = and(eq(shopMember.shopId, shopId), eq(shopMember.personId, personId));
  const [member] = await tx.select().from(shopMember).where(ofThisPerson).for('update');
  if (member?.admin === true) return;
  const [works] = await tx
    .select({ vesselId: vessel.id })
    .from(vesselMember)
    .innerJoin(vessel, eq(vessel.id, vesselMember.vesselId))
    .where(
      and(
        eq(vessel.shopId, shopId),
        isNull(vessel.deletedAt),
        eq(vesselMember.personId, personId),
        inArray(vesselMember.role, ['designer', 'installer']),
      ),
    )
    .limit(1);
  if (works === undefined && member !== undefined) await tx.delete(shopMember).where(ofThisPerson);
  if (works !== undefined && member === undefined) {
    await tx.insert(shopMember).values({ shopId, personId, admin: false, joinedAt: new Date() });
  }
}
