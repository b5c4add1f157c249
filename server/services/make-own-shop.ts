import { eq } from 'drizzle-orm';

import type { OpenDatabase } from '#server/db/connect.ts';
import { newId } from '#server/db/ids.ts';
import { person } from '#server/db/schema/accounts.ts';
import { shop, shopMember } from '#server/db/schema/shops.ts';
import { inTransaction } from '#server/db/transaction.ts';

/** The shop of who signed up, once: confirming twice makes no second one. */
export function makeOwnShop(
  db: OpenDatabase,
  { personId, name }: { personId: string; name: string },
): Promise<{ shopId: string }> {
  return inTransaction(db, async (tx) => {
    await tx.select({ id: person.id }).from(person).where(eq(person.id, personId)).for('update');
    const [member] = await tx.select().from(shopMember).where(eq(shopMember.personId, personId));
    if (member !== undefined) return { shopId: member.shopId };
    const shopId = newId();
    const now = new Date();
    await tx.insert(shop).values({ id: shopId, name: `${name.trim()}’s shop`, createdAt: now });
    await tx.insert(shopMember).values({ shopId, personId, admin: true, joinedAt: now });
    return { shopId };
  });
}
