import { asc, eq } from 'drizzle-orm';
import { Router } from 'express';

import { getMe, getServerFacts } from '#shared/api/me.ts';
import { shop, shopMember } from '#server/db/schema/shops.ts';
import { isFromLoopback } from '#server/http/guard.ts';
import { serve } from '#server/http/serve.ts';

export const meRoutes = Router();

serve(meRoutes, getMe, 'signed-in', async ({ caller, db }) => {
  const shops = await db
    .select({ shopId: shop.id, name: shop.name, admin: shopMember.admin })
    .from(shopMember)
    .innerJoin(shop, eq(shop.id, shopMember.shopId))
    .where(eq(shopMember.personId, caller.personId))
    .orderBy(asc(shopMember.joinedAt), asc(shop.id));
  return { personId: caller.personId, name: caller.name, email: caller.email, shops };
});

serve(meRoutes, getServerFacts, 'public', async ({ house, request }) => ({
  mailbox: house.mailbox !== undefined && isFromLoopback(request),
}));
