import { and, eq } from 'drizzle-orm';

import type { Role } from '#shared/access/matrix.ts';

import type { Database } from './connect.ts';
import { shopMember } from './schema/shops.ts';
import { vessel, vesselMember } from './schema/vessels.ts';

/** What a person is to a vessel and to its shop. */
export interface Standing {
  readonly vesselId: string;
  readonly shopId: string;
  /** A shop admin is a designer on every vessel of the shop. */
  readonly role: Role | undefined;
  readonly member: { readonly admin: boolean } | undefined;
  readonly archivedAt: Date | null;
  readonly deletedAt: Date | null;
}

export async function readStanding(db: Database, vesselId: string, personId: string): Promise<Standing | undefined> {
  const [row] = await db
    .select({
      vesselId: vessel.id,
      shopId: vessel.shopId,
      archivedAt: vessel.archivedAt,
      deletedAt: vessel.deletedAt,
      role: vesselMember.role,
      admin: shopMember.admin,
    })
    .from(vessel)
    .leftJoin(vesselMember, and(eq(vesselMember.vesselId, vessel.id), eq(vesselMember.personId, personId)))
    .leftJoin(shopMember, and(eq(shopMember.shopId, vessel.shopId), eq(shopMember.personId, personId)))
    .where(eq(vessel.id, vesselId));
  if (row === undefined) return undefined;
  const { role, admin, ...rest } = row;
  return {
    ...rest,
    role: admin === true ? 'designer' : (role ?? undefined),
    member: admin === null ? undefined : { admin },
  };
}

export async function readMembership(
  db: Database,
  shopId: string,
  personId: string,
): Promise<{ readonly admin: boolean } | undefined> {
  const [row] = await db
    .select({ admin: shopMember.admin })
    .from(shopMember)
    .where(and(eq(shopMember.shopId, shopId), eq(shopMember.personId, personId)));
  return row;
}
