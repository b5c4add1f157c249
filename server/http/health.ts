import { sql } from 'drizzle-orm';
import { Router } from 'express';

import { houseOf } from './house.ts';

/** For whoever runs the server: alive is the process, ready is the process with its database. */
export const healthRoutes = Router();

healthRoutes.get('/healthz', (_request, response) => {
  response.type('text/plain').send('alive\n');
});

healthRoutes.get('/readyz', async (request, response) => {
  try {
    await houseOf(request).db.execute(sql`select 1`);
    response.type('text/plain').send('ready\n');
  } catch {
    response.status(503).type('text/plain').send('the database does not answer\n');
  }
});
