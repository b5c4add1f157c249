import { Router } from 'express';

import {
  archiveVessel,
  createVessel,
  deleteVessel,
  duplicateVessel,
  getVessel,
  importVessel,
  listVessels,
  renameVessel,
  restoreVessel,
  unarchiveVessel,
} from '#shared/api/vessels.ts';
import { newDesign } from '#shared/edits/new-design.ts';
import { readDesign } from '#shared/files/read-design.ts';
import { inSnapshot } from '#server/db/transaction.ts';
import { readWholeDesign } from '#server/db/design-queries.ts';
import { newId } from '#server/db/ids.ts';
import { readVesselFacts, readVesselPage } from '#server/db/vessel-queries.ts';
import { serve } from '#server/http/serve.ts';
import { Invalid, NotFound } from '#server/refusals.ts';
import { addVessel } from '#server/services/add-vessel.ts';
import { changeVesselState } from '#server/services/change-vessel-state.ts';
import { renameVesselAsChange } from '#server/services/rename-vessel.ts';

import { presentOneVessel, presentVessel } from './present-vessel.ts';

export const vesselRoutes = Router();

serve(vesselRoutes, listVessels, 'signed-in', async ({ query, caller, db }) => {
  const { state = 'active', after, limit = 50 } = query;
  const page = await readVesselPage(db, { personId: caller.personId, state, after, limit });
  const facts = await readVesselFacts(
    db,
    page.rows.map((row) => row.vesselId),
  );
  return {
    rows: page.rows.map((row) => presentVessel(row, facts.get(row.vesselId)!)),
    next: page.next,
    total: page.total,
  };
});

serve(vesselRoutes, createVessel, 'make-vessel', async ({ body, caller, db, key }) => {
  const { shopId, ...asked } = body;
  await addVessel(db, {
    vesselId: key,
    shopId,
    personId: caller.personId,
    design: newDesign({ ...asked, type: asked.type || undefined }, newId),
    deed: 'vessel-created',
  });
  return presentOneVessel(db, key, caller.personId);
});

serve(vesselRoutes, importVessel, 'make-vessel', async ({ body, caller, db, key }) => {
  const read = readDesign(body.file);
  if (!read.ok) throw new Invalid(`${read.path}: ${read.reason}`, read.path);
  await addVessel(db, {
    vesselId: key,
    shopId: body.shopId,
    personId: caller.personId,
    design: read.design,
    deed: 'vessel-imported',
  });
  return presentOneVessel(db, key, caller.personId);
});

serve(
  vesselRoutes,
  getVessel,
  'see-vessel',
  async ({ params, caller, db }) => presentOneVessel(db, params.vesselId, caller.personId),
  { evenDeleted: true },
);

serve(vesselRoutes, renameVessel, 'manage-vessel', async ({ params, body, caller, db, key }) => {
  await renameVesselAsChange(db, {
    vesselId: params.vesselId,
    personId: caller.personId,
    name: body.name,
    changeId: key,
  });
  return presentOneVessel(db, params.vesselId, caller.personId);
});

serve(vesselRoutes, duplicateVessel, 'manage-vessel', async ({ params, standing, caller, db, key }) => {
  const whole = await inSnapshot(db, (tx) => readWholeDesign(tx, params.vesselId));
  if (whole === undefined) throw new NotFound();
  const { design } = whole;
  const name = `Copy of ${design.vessel?.name ?? 'unnamed vessel'}`.slice(0, 100);
  await addVessel(db, {
    vesselId: key,
    shopId: standing.shopId,
    personId: caller.personId,
    design: { ...design, vessel: { ...design.vessel, name } },
    deed: 'vessel-duplicated',
  });
  return presentOneVessel(db, key, caller.personId);
});

serve(vesselRoutes, archiveVessel, 'manage-vessel', async ({ params, caller, db }) => {
  await changeVesselState(db, { vesselId: params.vesselId, personId: caller.personId, to: 'archived' });
  return presentOneVessel(db, params.vesselId, caller.personId);
});

serve(vesselRoutes, unarchiveVessel, 'manage-vessel', async ({ params, caller, db }) => {
  await changeVesselState(db, { vesselId: params.vesselId, personId: caller.personId, to: 'unarchived' });
  return presentOneVessel(db, params.vesselId, caller.personId);
});

serve(vesselRoutes, deleteVessel, 'manage-vessel', async ({ params, caller, db }) => {
  await changeVesselState(db, { vesselId: params.vesselId, personId: caller.personId, to: 'deleted' });
  return presentOneVessel(db, params.vesselId, caller.personId);
});

serve(
  vesselRoutes,
  restoreVessel,
  'manage-vessel',
  async ({ params, caller, db }) => {
    await changeVesselState(db, { vesselId: params.vesselId, personId: caller.personId, to: 'restored' });
    return presentOneVessel(db, params.vesselId, caller.personId);
  },
  { evenDeleted: true },
);
