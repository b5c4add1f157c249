import { Router } from 'express';

import { listMail } from '#shared/api/mailbox.ts';
import { isFromLoopback } from '#server/http/guard.ts';
import { serve } from '#server/http/serve.ts';
import { NotFound } from '#server/refusals.ts';

export const mailboxRoutes = Router();

/** Open to who sits at this machine: they could read the files as well. To anyone else there is no such page. */
serve(mailboxRoutes, listMail, 'public', async ({ house, request }) => {
  if (house.mailbox === undefined || !isFromLoopback(request)) throw new NotFound();
  const mails = await house.mailbox.list();
  return { rows: mails.map((mail) => ({ ...mail, links: [...mail.links] })) };
});
