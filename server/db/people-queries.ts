import { and, asc, eq, gt, isNull } from 'drizzle-orm';

import type { Role } from '#shared/access/matrix.ts';

import type { Database } from './connect.ts';
import { person } from './schema/accounts.ts';
import { shop, shopMember } from './schema/shops.ts';
import { invitation, vessel, vesselMember } from './schema/vessels.ts';

export interface PersonRow {
  readonly personId: string;
  readonly name: string;
  readonly email: string;
  readonly role: Role;
  readonly admin: boolean;
}

/** Who has a role on a vessel, and the shop's admins, who are designers on each. */
export async function readPeople(db: Database, vesselId: string, shopId: string): Promise<PersonRow[]> {
  const members = await db
    .select({
      personId: person.id,
      name: person.name,
      email: person.email,
      role: vesselMember.role,
      admin: shopMember.admin,
    })
    .from(vesselMember)
    .innerJoin(person, eq(person.id, vesselMember.personId))
    .leftJoin(shopMember, and(eq(shopMember.shopId, shopId), eq(shopMember.personId, person.id)))
    .where(eq(vesselMember.vesselId, vesselId))
    .orderBy(asc(vesselMember.joinedAt), asc(person.name));
  const admins = await db
    .select({ personId: person.id, name: person.name, email: person.email })
    .from(shopMember)
    .innerJoin(person, eq(person.id, shopMember.personId))
    .where(and(eq(shopMember.shopId, shopId), eq(shopMember.admin, true)))
    .orderBy(asc(shopMember.joinedAt));
  const people = members.map((row): PersonRow => {
    const admin = row.admin === true;
    return { ...row, admin, role: admin ? 'designer' : row.role };
  });
  const known = new Set(people.map((row) => row.personId));
  const others = admins.filter((row) => !known.has(row.personId));
  return [...others.map((row): PersonRow => ({ ...row, role: 'designer', admin: true })), ...people];
}

export interface InvitationRow {
  readonly invitationId: string;
  readonly vesselId: string;
  readonly email: string;
  readonly role: Role;
  readonly invitedBy: string;
  readonly invitedAt: Date;
  readonly expiresAt: Date;
}

export function readOpenInvitations(db: Database, vesselId: string): Promise<InvitationRow[]> {
  return db
    .select(FACTS)
    .from(invitation)
    .innerJoin(person, eq(person.id, invitation.invitedBy))
    .where(and(eq(invitation.vesselId, vesselId), isOpen()))
    .orderBy(asc(invitation.invitedAt));
}

export async function readInvitation(db: Database, invitationId: string): Promise<InvitationRow | undefined> {
  const [row] = await db
    .select(FACTS)
    .from(invitation)
    .innerJoin(person, eq(person.id, invitation.invitedBy))
    .where(eq(invitation.id, invitationId));
  return row;
}

export type InvitationByToken = InvitationRow & {
  readonly vesselName: string;
  readonly shopName: string;
  readonly shopId: string;
};

/** An invitation that can still be taken up; of a vessel that is there. */
export async function readInvitationByToken(db: Database, tokenHash: string): Promise<InvitationByToken | undefined> {
  const [row] = await db
    .select({ ...FACTS, vesselName: vessel.name, shopName: shop.name, shopId: shop.id })
    .from(invitation)
    .innerJoin(person, eq(person.id, invitation.invitedBy))
    .innerJoin(vessel, eq(vessel.id, invitation.vesselId))
    .innerJoin(shop, eq(shop.id, vessel.shopId))
    .where(and(eq(invitation.tokenHash, tokenHash), isOpen(), isNull(vessel.deletedAt)));
  return row;
}

const FACTS = {
  invitationId: invitation.id,
  vesselId: invitation.vesselId,
  email: invitation.email,
  role: invitation.role,
  invitedBy: person.name,
  invitedAt: invitation.invitedAt,
  expiresAt: invitation.expiresAt,
};

function isOpen() {
  return and(isNull(invitation.acceptedAt), isNull(invitation.withdrawnAt), gt(invitation.expiresAt, new Date()));
}
