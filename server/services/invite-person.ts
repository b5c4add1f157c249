import { createHash, randomBytes } from 'node:crypto';

import { and, eq, gt, isNull, sql } from 'drizzle-orm';

import type { Role } from '#shared/access/matrix.ts';
import type { Database, OpenDatabase } from '#server/db/connect.ts';
import { readInvitation, readPeople, type InvitationRow } from '#server/db/people-queries.ts';
import { shop } from '#server/db/schema/shops.ts';
import { invitation, vessel } from '#server/db/schema/vessels.ts';
import { inTransaction } from '#server/db/transaction.ts';
import { invitationMail } from '#server/mail/letters.ts';
import { queueMail } from '#server/mail/outbox.ts';
import { Conflict, TooManyRequests } from '#server/refusals.ts';

import { writeAudit } from './write-audit.ts';

const DAYS_OPEN = 14;
const MOST_AN_HOUR = 50;

/** An invitation by mail to one vessel in one role. A newer one to the same address takes the place of the older. */
export function invitePerson(
  db: OpenDatabase,
  asked: {
    readonly invitationId: string;
    readonly vesselId: string;
    readonly email: string;
    readonly role: Role;
    readonly by: { readonly personId: string; readonly name: string };
    readonly publicUrl: string;
  },
): Promise<InvitationRow> {
  const email = asked.email.toLowerCase();
  return inTransaction(db, async (tx) => {
    const [boat] = await tx
      .select({ name: vessel.name, shopId: vessel.shopId, shopName: shop.name })
      .from(vessel)
      .innerJoin(shop, eq(shop.id, vessel.shopId))
      .where(eq(vessel.id, asked.vesselId))
      .for('update');
    const already = await readInvitation(tx, asked.invitationId);
    if (already !== undefined) return sameInvitation(already, asked.vesselId, email);
    await refuseTooMany(tx, asked.by.personId);
    const people = await readPeople(tx, asked.vesselId, boat!.shopId);
    if (people.some((one) => one.email === email)) throw new Conflict('This person is on the vessel already.');

    const token = randomBytes(32).toString('base64url');
    const now = new Date();
    await tx
      .update(invitation)
      .set({ withdrawnAt: now })
      .where(
        and(
          eq(invitation.vesselId, asked.vesselId),
          eq(invitation.email, email),
          isNull(invitation.acceptedAt),
          isNull(invitation.withdrawnAt),
        ),
      );
    await tx.insert(invitation).values({
      id: asked.invitationId,
      vesselId: asked.vesselId,
      email,
      role: asked.role,
      tokenHash: hashToken(token),
      invitedBy: asked.by.personId,
      invitedAt: now,
      expiresAt: new Date(now.getTime() + DAYS_OPEN * 24 * 60 * 60 * 1000),
    });
    await queueMail(
      tx,
      invitationMail(asked.publicUrl, {
        email,
        token,
        role: asked.role,
        vesselName: boat!.name,
        shopName: boat!.shopName,
        invitedBy: asked.by.name,
      }),
    );
    await writeAudit(tx, {
      personId: asked.by.personId,
      deed: 'person-invited',
      vesselId: asked.vesselId,
      detail: { email, role: asked.role },
    });
    return (await readInvitation(tx, asked.invitationId))!;
  });
}

/** What is kept of an invitation's token; from it the link can not be made again. */
export function hashToken(token: string): string {
  return createHash('sha256').update(token).digest('hex');
}

function sameInvitation(already: InvitationRow, vesselId: string, email: string): InvitationRow {
  if (already.vesselId === vesselId && already.email === email) return already;
  throw new Conflict('This key was used for something else already.');
}

async function refuseTooMany(tx: Database, personId: string): Promise<void> {
  const hourAgo = new Date(Date.now() - 60 * 60 * 1000);
  const [row] = await tx
    .select({ n: sql<number>`count(*)` })
    .from(invitation)
    .where(and(eq(invitation.invitedBy, personId), gt(invitation.invitedAt, hourAgo)));
  if ((row?.n ?? 0) >= MOST_AN_HOUR) {
    throw new TooManyRequests(`No more than ${MOST_AN_HOUR} invitations an hour. Wait a little and try again.`);
  }
}
