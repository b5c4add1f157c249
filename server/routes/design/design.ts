import { Router } from 'express';

import {
  exportDesign,
  getDesign,
  getDesignSchema,
  listChanges,
  makeChange as makeChangeContract,
} from '#shared/api/design.ts';
import type { Design } from '#shared/model/design.ts';
import { designJsonSchema } from '#shared/files/json-schema.ts';
import { fileNameOf, writeDesign } from '#shared/files/write-design.ts';
import { readChangesSince } from '#server/db/change-log-queries.ts';
import type { OpenDatabase } from '#server/db/connect.ts';
import { readWholeDesign } from '#server/db/design-queries.ts';
import { inSnapshot } from '#server/db/transaction.ts';
import { serve } from '#server/http/serve.ts';
import { NotFound } from '#server/refusals.ts';
import { makeChange } from '#server/services/make-change.ts';

export const designRoutes = Router();

serve(designRoutes, getDesign, 'see-design', async ({ params, db }) => readWhole(db, params.vesselId));

serve(designRoutes, exportDesign, 'see-design', async ({ params, db, response }) => {
  const { design } = await readWhole(db, params.vesselId);
  response
    .attachment(fileNameOf(design))
    .type('application/json')
    .set('Cache-Control', 'no-store')
    .send(writeDesign(design));
  return design;
});

serve(designRoutes, makeChangeContract, 'edit-design', async ({ params, body, caller, db }) =>
  makeChange(db, { vesselId: params.vesselId, personId: caller.personId, change: body }),
);

serve(designRoutes, listChanges, 'see-design', async ({ params, query, db }) =>
  readChangesSince(db, params.vesselId, query.since),
);

serve(designRoutes, getDesignSchema, 'public', async ({ response }) => {
  response.set('Cache-Control', 'public, max-age=3600').set('Access-Control-Allow-Origin', '*');
  return designJsonSchema();
});

async function readWhole(db: OpenDatabase, vesselId: string): Promise<{ seq: number; design: Design }> {
  const whole = await inSnapshot(db, (tx) => readWholeDesign(tx, vesselId));
  if (whole === undefined) throw new NotFound();
  return whole;
}
