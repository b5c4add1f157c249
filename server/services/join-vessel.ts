import { and, eq, isNull } from 'drizzle-orm';

import type { Database, OpenDatabase } from '#server/db/connect.ts';
import { newId } from '#server/db/ids.ts';
import { readInvitationByToken, type InvitationByToken } from '#server/db/people-queries.ts';
import { credential, person, session } from '#server/db/schema/accounts.ts';
import { invitation, vesselMember } from '#server/db/schema/vessels.ts';
import { inTransaction } from '#server/db/transaction.ts';
import { Conflict, Forbidden, NotFound } from '#server/refusals.ts';

import { hashToken } from './invite-person.ts';
import { settleMembership } from './shop-membership.ts';
import { writeAudit } from './write-audit.ts';

/** Takes up an invitation as who is signed in; only with the address it was sent to. */
export function acceptInvitation(
  db: OpenDatabase,
  { token, caller }: { token: string; caller: { readonly personId: string; readonly email: string } },
): Promise<{ vesselId: string }> {
  return inTransaction(db, async (tx) => {
    const invited = await lockInvitation(tx, token);
    if (invited.email !== caller.email.toLowerCase()) {
      throw new Forbidden('This invitation was sent to another address. Sign in with that one to join.');
    }
    await takeUp(tx, invited, caller.personId);
    return { vesselId: invited.vesselId };
  });
}

/**
 * Takes up an invitation by making an account: the mail has proved the address. An account that someone began with
 * this address and never confirmed is taken over with everything it had: its password was not the reader's of the mail.
 */
export function joinByInvitation(
  db: OpenDatabase,
  { token, name, passwordHash }: { token: string; name: string; passwordHash: string },
): Promise<{ vesselId: string; email: string }> {
  return inTransaction(db, async (tx) => {
    const invited = await lockInvitation(tx, token);
    const [there] = await tx.select().from(person).where(eq(person.email, invited.email)).for('update');
    if (there?.emailVerified === true) throw new Conflict('There is an account with this address. Sign in to join.');
    const personId = there?.id ?? newId();
    const now = new Date();
    if (there !== undefined) await emptyAccount(tx, personId);
    await tx
      .insert(person)
      .values({ id: personId, name, email: invited.email, emailVerified: true, createdAt: now, updatedAt: now })
      .onDuplicateKeyUpdate({ set: { name, emailVerified: true, updatedAt: now } });
    await tx.insert(credential).values({
      id: newId(),
      accountId: personId,
      providerId: 'credential',
      userId: personId,
      password: passwordHash,
      createdAt: now,
      updatedAt: now,
    });
    await takeUp(tx, invited, personId);
    return { vesselId: invited.vesselId, email: invited.email };
  });
}

async function lockInvitation(tx: Database, token: string): Promise<InvitationByToken> {
  const tokenHash = hashToken(token);
  await tx.select({ id: invitation.id }).from(invitation).where(eq(invitation.tokenHash, tokenHash)).for('update');
  const invited = await readInvitationByToken(tx, tokenHash);
  if (invited === undefined) throw new NotFound('This invitation is not open any more. Ask for a new one.');
  return invited;
}

async function takeUp(tx: Database, invited: InvitationByToken, personId: string): Promise<void> {
  const { vesselId, role, invitationId, shopId } = invited;
  const now = new Date();
  await tx
    .update(invitation)
    .set({ acceptedAt: now })
    .where(and(eq(invitation.id, invitationId), isNull(invitation.acceptedAt)));
  await tx
    .insert(vesselMember)
    .values({ vesselId, personId, role, joinedAt: now })
    .onDuplicateKeyUpdate({ set: { role } });
  await settleMembership(tx, shopId, personId);
  await writeAudit(tx, { personId, deed: 'invitation-accepted', vesselId, shopId, detail: { role } });
}

async function emptyAccount(tx: Database, personId: string): Promise<void> {
  await tx.delete(session).where(eq(session.userId, personId));
  await tx.delete(credential).where(eq(credential.userId, personId));
}
