import { Router } from 'express';

import { exportParts } from '#shared/api/design.ts';
import { partsCsv } from '#shared/files/lists-csv.ts';
import { fileNameOf } from '#shared/files/write-design.ts';
import { partsList } from '#shared/lists/parts-list.ts';
import { readWholeDesign } from '#server/db/design-queries.ts';
import { inSnapshot } from '#server/db/transaction.ts';
import { serve } from '#server/http/serve.ts';
import { NotFound } from '#server/refusals.ts';

export const partsRoutes = Router();

serve(partsRoutes, exportParts, 'see-parts', async ({ params, db, response }) => {
  const whole = await inSnapshot(db, (tx) => readWholeDesign(tx, params.vesselId));
  if (whole === undefined) throw new NotFound();
  const { design } = whole;
  response.attachment(fileNameOf(design).replace('.ampwright.json', '-parts.csv')).type('text/csv');
  return partsCsv(design, partsList(design));
});
