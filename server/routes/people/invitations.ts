import { eq } from 'drizzle-orm';
import { Router } from 'express';

import {
  acceptInvitation as acceptInvitationContract,
  getInvitation,
  joinByInvitation as joinByInvitationContract,
} from '#shared/api/people.ts';
import type { Database } from '#server/db/connect.ts';
import { readInvitationByToken } from '#server/db/people-queries.ts';
import { person } from '#server/db/schema/accounts.ts';
import { serve } from '#server/http/serve.ts';
import { hashPassword } from '#server/http/sign-in.ts';
import { NotFound } from '#server/refusals.ts';
import { hashToken } from '#server/services/invite-person.ts';
import { acceptInvitation, joinByInvitation } from '#server/services/join-vessel.ts';

/** For who holds the link of an invitation's mail. The token is the right. */
export const invitationRoutes = Router();

serve(invitationRoutes, getInvitation, 'public', async ({ params, db }) => {
  const { email, role, vesselName, shopName, invitedBy } = await requireInvitation(db, params.token);
  return { email, role, vesselName, shopName, invitedBy, hasAccount: await hasAccount(db, email) };
});

serve(invitationRoutes, acceptInvitationContract, 'signed-in', async ({ params, caller, db }) =>
  acceptInvitation(db, { token: params.token, caller }),
);

serve(invitationRoutes, joinByInvitationContract, 'public', async ({ params, body, db, house, request, response }) => {
  await requireInvitation(db, params.token);
  const passwordHash = await hashPassword(body.password);
  const { vesselId, email } = await joinByInvitation(db, { token: params.token, name: body.name, passwordHash });
  for (const cookie of await house.signIn.signInAgain(request, email, body.password))
    response.append('Set-Cookie', cookie);
  return { vesselId };
});

async function requireInvitation(db: Database, token: string) {
  const invited = await readInvitationByToken(db, hashToken(token));
  if (invited === undefined) throw new NotFound('This invitation is not open any more. Ask for a new one.');
  return invited;
}

async function hasAccount(db: Database, email: string): Promise<boolean> {
  const [row] = await db.select({ verified: person.emailVerified }).from(person).where(eq(person.email, email));
  return row?.verified === true;
}
