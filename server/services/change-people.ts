import { and, eq, isNull } from 'drizzle-orm';

import type { Role } from '#shared/access/matrix.ts';
import type { Database, OpenDatabase } from '#server/db/connect.ts';
import { invitation, vesselMember } from '#server/db/schema/vessels.ts';
import { inTransaction } from '#server/db/transaction.ts';
import { readMembership } from '#server/db/standing-queries.ts';
import { Forbidden, NotFound } from '#server/refusals.ts';

import { settleMembership } from './shop-membership.ts';
import { writeAudit } from './write-audit.ts';

interface Place {
  readonly vesselId: string;
  readonly shopId: string;
  readonly personId: string;
  /** The admin who does it. */
  readonly byId: string;
}

export function changeRole(
  db: OpenDatabase,
  { vesselId, shopId, personId, byId, role }: Place & { role: Role },
): Promise<void> {
  return inTransaction(db, async (tx) => {
    await refuseForAdmin(tx, shopId, personId);
    await lockMember(tx, vesselId, personId);
    await tx.update(vesselMember).set({ role }).where(ofMember(vesselId, personId));
    await settleMembership(tx, shopId, personId);
    await writeAudit(tx, { personId: byId, deed: 'role-changed', vesselId, shopId, detail: { personId, role } });
  });
}

export function removePerson(db: OpenDatabase, { vesselId, shopId, personId, byId }: Place): Promise<void> {
  return inTransaction(db, async (tx) => {
    await refuseForAdmin(tx, shopId, personId);
    await lockMember(tx, vesselId, personId);
    await tx.delete(vesselMember).where(ofMember(vesselId, personId));
    await settleMembership(tx, shopId, personId);
    await writeAudit(tx, { personId: byId, deed: 'person-removed', vesselId, shopId, detail: { personId } });
  });
}

/** Its link opens nothing any more. */
export function withdrawInvitation(
  db: OpenDatabase,
  { vesselId, invitationId, byId }: { vesselId: string; invitationId: string; byId: string },
): Promise<void> {
  return inTransaction(db, async (tx) => {
    const [row] = await tx
      .select()
      .from(invitation)
      .where(and(eq(invitation.id, invitationId), eq(invitation.vesselId, vesselId), isNull(invitation.acceptedAt)))
      .for('update');
    if (row === undefined) throw new NotFound();
    if (row.withdrawnAt !== null) return;
    await tx.update(invitation).set({ withdrawnAt: new Date() }).where(eq(invitation.id, invitationId));
    await writeAudit(tx, { personId: byId, deed: 'invitation-withdrawn', vesselId, detail: { email: row.email } });
  });
}

async function lockMember(tx: Database, vesselId: string, personId: string): Promise<void> {
  const [row] = await tx.select().from(vesselMember).where(ofMember(vesselId, personId)).for('update');
  if (row === undefined) throw new NotFound();
}

async function refuseForAdmin(tx: Database, shopId: string, personId: string): Promise<void> {
  const member = await readMembership(tx, shopId, personId);
  if (member?.admin) throw new Forbidden('A shop admin is a designer on every vessel of the shop.');
}

function ofMember(vesselId: string, personId: string) {
  return and(eq(vesselMember.vesselId, vesselId), eq(vesselMember.personId, personId));
}
