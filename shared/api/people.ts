import { z } from 'zod';

import { ROLES } from '#shared/access/matrix.ts';

import { endpoint, Instant, VesselParams } from './endpoint.ts';

export const VesselPerson = z.object({
  personId: z.uuid(),
  name: z.string(),
  email: z.string(),
  role: z.enum(ROLES),
  admin: z.boolean(),
});
export const Invitation = z.object({
  invitationId: z.uuid(),
  email: z.string(),
  role: z.enum(ROLES),
  invitedBy: z.string(),
  invitedAt: Instant,
  expiresAt: Instant,
});

export const listPeople = endpoint({
  method: 'GET',
  path: '/api/vessels/:vesselId/people',
  params: VesselParams,
  reply: z.object({ people: z.array(VesselPerson), invitations: z.array(Invitation) }),
});

export const invitePerson = endpoint({
  method: 'POST',
  path: '/api/vessels/:vesselId/invitations',
  params: VesselParams,
  body: z.strictObject({ email: z.email().max(254), role: z.enum(ROLES) }),
  reply: Invitation,
});
export const withdrawInvitation = endpoint({
  method: 'DELETE',
  path: '/api/vessels/:vesselId/invitations/:invitationId',
  params: VesselParams.extend({ invitationId: z.uuid() }),
  reply: z.object({ withdrawn: z.literal(true) }),
});
export const changeRole = endpoint({
  method: 'PATCH',
  path: '/api/vessels/:vesselId/people/:personId',
  params: VesselParams.extend({ personId: z.uuid() }),
  body: z.strictObject({ role: z.enum(ROLES) }),
  reply: VesselPerson,
});
export const removePerson = endpoint({
  method: 'DELETE',
  path: '/api/vessels/:vesselId/people/:personId',
  params: VesselParams.extend({ personId: z.uuid() }),
  reply: z.object({ removed: z.literal(true) }),
});

/** What the link of an invitation's mail shows, to anyone who holds it. */
export const getInvitation = endpoint({
  method: 'GET',
  path: '/api/invitations/:token',
  params: z.strictObject({ token: z.string().min(20).max(200) }),
  reply: z.object({
    email: z.string(),
    role: z.enum(ROLES),
    vesselName: z.string(),
    shopName: z.string(),
    invitedBy: z.string(),
    /** Whether an account with this address is there already: then sign in, else sign up. Told to the holder only. */
    hasAccount: z.boolean(),
  }),
});

/** Joins: signed in with the invited address. */
export const acceptInvitation = endpoint({
  method: 'POST',
  path: '/api/invitations/:token/accept',
  params: z.strictObject({ token: z.string().min(20).max(200) }),
  reply: z.object({ vesselId: z.uuid() }),
});

/** Joins without an account yet: name and password; the mail has proved the address. No shop of one's own is made. */
export const joinByInvitation = endpoint({
  method: 'POST',
  path: '/api/invitations/:token/join',
  params: z.strictObject({ token: z.string().min(20).max(200) }),
  body: z.strictObject({ name: z.string().trim().min(1).max(100), password: z.string().min(12).max(256) }),
  reply: z.object({ vesselId: z.uuid() }),
});
