import { Router } from 'express';

import { getRevision, issueRevision as issueRevisionContract, listRevisions } from '#shared/api/design.ts';
import { readRevision, readRevisions } from '#server/db/revision-queries.ts';
import { serve } from '#server/http/serve.ts';
import { NotFound } from '#server/refusals.ts';
import { issueRevision } from '#server/services/issue-revision.ts';

import { presentRevision } from './present-revision.ts';

export const revisionRoutes = Router();

serve(revisionRoutes, listRevisions, 'see-issued', async ({ params, db }) => {
  const rows = await readRevisions(db, params.vesselId);
  return { rows: rows.map(presentRevision) };
});

serve(revisionRoutes, getRevision, 'see-issued', async ({ params, db }) => {
  const row = await readRevision(db, params.vesselId, { letter: params.letter });
  if (row === undefined) throw new NotFound();
  return { ...presentRevision(row), design: row.design };
});

serve(revisionRoutes, issueRevisionContract, 'issue-revision', async ({ params, body, caller, db }) => {
  const row = await issueRevision(db, { vesselId: params.vesselId, personId: caller.personId, ...body });
  return presentRevision(row);
});
