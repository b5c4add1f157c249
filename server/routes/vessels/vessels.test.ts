import { beforeAll, expect, it } from 'vitest';

import { exportDesign, getDesign, getRevision, issueRevision, listRevisions, makeChange } from '#shared/api/design.ts';
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
import { newId } from '#server/db/ids.ts';
import { vessel as vesselTable } from '#server/db/schema/vessels.ts';
import { clearDeletedVessels } from '#server/services/clear-deleted-vessels.ts';
import { aSmallDesign } from '#server/testing/designs.ts';
import { openHouse, type TestHouse } from '#server/testing/open-house.ts';
import { aMember, aShopAdmin, aVessel } from '#server/testing/people.ts';

let house: TestHouse;
beforeAll(async () => {
  house = await openHouse();
});

it('a vessel is made once though asked for twice, with its particulars in its design', async () => {
  const admin = await aShopAdmin(house);
  const asking = {
    body: {
      shopId: admin.shopId,
      name: 'Curlew',
      lengthM: 8.4,
      nominalV: [12],
      profile: 'iso-13297',
      zones: [{ name: 'Engine space', engineSpace: true }],
    },
    headers: { 'idempotency-key': newId() },
  };
  const [first, second] = [await admin.ask(createVessel, asking), await admin.ask(createVessel, asking)];
  expect(second.body).toEqual(first.body);
  expect(first.body).toMatchObject({
    name: 'Curlew',
    lengthM: 8.4,
    profile: 'iso-13297',
    role: 'designer',
    state: 'active',
  });
  expect((await admin.ask(listVessels)).body).toMatchObject({ total: 1, next: null });
  const { design } = (await admin.ask(getDesign, { params: { vesselId: first.body.vesselId } })).body;
  expect(Object.values(design.zones)).toMatchObject([{ name: 'Engine space', engineSpace: true }]);
});

it('a list longer than a page comes whole, page after page, by name', async () => {
  const admin = await aShopAdmin(house);
  const names = ['Avocet', 'Bittern', 'Curlew', 'Dunlin', 'Egret'];
  for (const name of names.toReversed()) await admin.ask(createVessel, { body: { shopId: admin.shopId, name } });
  const seen: string[] = [];
  const page = async (after: string | null) =>
    (await admin.ask(listVessels, { query: { limit: 2, ...(after === null ? {} : { after }) } })).body;
  let next: string | null = null;
  do {
    const body: Awaited<ReturnType<typeof page>> = await page(next);
    expect(body.total).toBe(5);
    seen.push(...body.rows.map((row) => row.name));
    next = body.next;
  } while (next !== null);
  expect(seen).toEqual(names);
});

it('a file that was exported opens as a new vessel with the same drawing; a bad one is refused with path and reason', async () => {
  const { admin, vesselId, shopId } = await aVessel(house, { design: aSmallDesign() });
  const file = await admin.ask(exportDesign, { params: { vesselId } });
  const opened = await admin.ask(importVessel, { body: { shopId, file: JSON.stringify(file.body) } });
  const { design } = (await admin.ask(getDesign, { params: { vesselId: opened.body.vesselId } })).body;
  expect(design).toEqual(aSmallDesign());
  const bad = structuredClone(file.body) as unknown as { runs: { w1: { lengthM: number } } };
  bad.runs.w1.lengthM = -1;
  const refused = await admin.ask(importVessel, { body: { shopId, file: JSON.stringify(bad) } });
  expect(refused.problem).toMatchObject({
    status: 400,
    field: 'runs.w1.lengthM',
    detail: expect.stringContaining('must be greater than 0'),
  });
  expect((await admin.ask(listVessels)).body.total).toBe(2);
});

it('a vessel is renamed, doubled, put aside and taken back', async () => {
  const { admin, vesselId } = await aVessel(house, { design: aSmallDesign() });
  const params = { vesselId };
  expect((await admin.ask(renameVessel, { params, body: { name: 'Plover' } })).body.name).toBe('Plover');
  expect((await admin.ask(getDesign, { params })).body).toMatchObject({
    seq: 1,
    design: { vessel: { name: 'Plover' } },
  });
  const copy = (await admin.ask(duplicateVessel, { params })).body;
  expect(copy).toMatchObject({ name: 'Copy of Plover', drawn: { sheets: 1, devices: 3, runs: 3 }, lastChange: null });
  expect((await admin.ask(archiveVessel, { params })).body.state).toBe('archived');
  expect((await admin.ask(listVessels)).body.rows.map((row) => row.name)).toEqual(['Copy of Plover']);
  expect((await admin.ask(unarchiveVessel, { params })).body.state).toBe('active');
});

it('what was deleted is gone for all but who can bring it back, and after 30 days for them too', async () => {
  const vessel = await aVessel(house);
  const { admin, vesselId } = vessel;
  const reviewer = await aMember(house, vessel, 'reviewer');
  const params = { vesselId };
  expect((await admin.ask(deleteVessel, { params })).body.state).toBe('deleted');
  expect((await admin.ask(getDesign, { params })).status).toBe(404);
  expect((await reviewer.ask(getVessel, { params })).status).toBe(404);
  expect((await admin.ask(listVessels, { query: { state: 'deleted' } })).body.rows).toHaveLength(1);
  expect((await reviewer.ask(listVessels, { query: { state: 'deleted' } })).body.rows).toHaveLength(0);
  await clearDeletedVessels(house.db);
  expect((await admin.ask(restoreVessel, { params })).body.state).toBe('active');
  expect((await reviewer.ask(getDesign, { params })).status).toBe(200);
  await admin.ask(deleteVessel, { params });
  await clearDeletedVessels(house.db, new Date(Date.now() + 31 * 24 * 60 * 60 * 1000));
  expect((await house.db.select().from(vesselTable)).some((row) => row.id === vesselId)).toBe(false);
});

it('an owner sees what was issued, as it was then, and nothing of what is drawn since', async () => {
  const vessel = await aVessel(house, { design: aSmallDesign() });
  const { admin, vesselId } = vessel;
  const owner = await aMember(house, vessel, 'owner');
  const params = { vesselId };
  expect((await owner.ask(listRevisions, { params })).body.rows).toEqual([]);
  const id = newId();
  const issue = (seq: number, key = newId()) =>
    admin.ask(issueRevision, { params, body: { id: key, seq, note: 'First' } });
  expect((await issue(0, id)).body).toMatchObject({ letter: 'A', seq: 0, issuedBy: admin.name });
  expect((await issue(0, id)).body.letter).toBe('A');
  const patches = [{ op: 'set', path: ['runs', 'w1', 'lengthM'], value: 9 }];
  await admin.ask(makeChange, { params, body: { id: newId(), base: 0, label: 'Lengthen', patches } });
  expect((await issue(0)).problem).toMatchObject({ code: 'conflict', seq: 1 });
  expect((await issue(1)).body.letter).toBe('B');
  const seen = await owner.ask(getRevision, { params: { vesselId, letter: 'A' } });
  expect(seen.body.design).toEqual(aSmallDesign());
  const summary = (await owner.ask(getVessel, { params })).body;
  expect(summary).toMatchObject({ drawn: null, lastChange: null, people: [], revision: { letter: 'B' } });
});
