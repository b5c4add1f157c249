import { z } from 'zod';

import { endpoint } from './endpoint.ts';

export const Me = z.object({
  personId: z.uuid(),
  name: z.string(),
  email: z.string(),
  shops: z.array(z.object({ shopId: z.uuid(), name: z.string(), admin: z.boolean() })),
});
export type Me = z.infer<typeof Me>;

export const getMe = endpoint({ method: 'GET', path: '/api/me', reply: Me });

/** Before sign-in: whether this server has a mailbox page (only a local stand-in has). */
export const getServerFacts = endpoint({
  method: 'GET',
  path: '/api/server',
  reply: z.object({ mailbox: z.boolean() }),
});
