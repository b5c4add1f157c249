import { Router } from 'express';

import {
  changeRole as changeRoleContract,
  invitePerson as invitePersonContract,
  listPeople,
  removePerson as removePersonContract,
  withdrawInvitation as withdrawInvitationContract,
} from '#shared/api/people.ts';
import { mayInShop } from '#shared/access/matrix.ts';
import type { Database } from '#server/db/connect.ts';
import { readOpenInvitations, readPeople, type PersonRow } from '#server/db/people-queries.ts';
import type { Standing } from '#server/db/standing-queries.ts';
import { serve } from '#server/http/serve.ts';
import { NotFound } from '#server/refusals.ts';
import { changeRole, removePerson, withdrawInvitation } from '#server/services/change-people.ts';
import { invitePerson } from '#server/services/invite-person.ts';

import { presentInvitation } from './present-invitation.ts';

export const peopleRoutes = Router();

serve(peopleRoutes, listPeople, 'see-people', async ({ params, standing, db }) => {
  const people = await readPeople(db, params.vesselId, standing.shopId);
  const invitations = mayInShop(standing.member, 'manage-people') ? await readOpenInvitations(db, params.vesselId) : [];
  return { people, invitations: invitations.map(presentInvitation) };
});

serve(peopleRoutes, invitePersonContract, 'manage-people', async ({ params, body, caller, db, house, key }) => {
  const { publicUrl } = house.configuration;
  const { vesselId } = params;
  return presentInvitation(
    await invitePerson(db, { invitationId: key, vesselId, email: body.email, role: body.role, by: caller, publicUrl }),
  );
});

serve(peopleRoutes, withdrawInvitationContract, 'manage-people', async ({ params, caller, db }) => {
  await withdrawInvitation(db, { ...params, byId: caller.personId });
  return { withdrawn: true as const };
});

serve(peopleRoutes, changeRoleContract, 'manage-people', async ({ params, body, standing, caller, db }) => {
  const { vesselId, personId } = params;
  await changeRole(db, { vesselId, personId, shopId: standing.shopId, byId: caller.personId, role: body.role });
  return requirePerson(db, standing, personId);
});

serve(peopleRoutes, removePersonContract, 'manage-people', async ({ params, standing, caller, db }) => {
  await removePerson(db, { ...params, shopId: standing.shopId, byId: caller.personId });
  return { removed: true as const };
});

async function requirePerson(db: Database, standing: Standing, personId: string): Promise<PersonRow> {
  const people = await readPeople(db, standing.vesselId, standing.shopId);
  const found = people.find((row) => row.personId === personId);
  if (found === undefined) throw new NotFound();
  return found;
}
