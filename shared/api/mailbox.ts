import { z } from 'zod';

import { endpoint, Instant } from './endpoint.ts';

/** The local stand-in's mailbox. There only where `npm start` started it, and only for callers on loopback. */
export const listMail = endpoint({
  method: 'GET',
  path: '/api/mailbox',
  reply: z.object({
    rows: z.array(
      z.object({
        mailId: z.string(),
        to: z.string(),
        from: z.string(),
        subject: z.string(),
        at: Instant,
        text: z.string(),
        links: z.array(z.string()),
      }),
    ),
  }),
});
