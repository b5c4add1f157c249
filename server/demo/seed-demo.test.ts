import { mkdtempSync, readFileSync, statSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { beforeAll, expect, it } from 'vitest';

import { getDesign, getRevision } from '#shared/api/design.ts';
import { listVessels } from '#shared/api/vessels.ts';
import { openHouse, type TestHouse } from '#server/testing/open-house.ts';
import { aPerson, signIn } from '#server/testing/people.ts';

import { seedDemo } from './seed-demo.ts';

let house: TestHouse;
beforeAll(async () => {
  house = await openHouse();
});

const folder = mkdtempSync(join(tmpdir(), 'ampwright-demo-'));

it('the demo people can sign in and see Minnow in their roles, the owner what was issued of her', async () => {
  const { seeded, signIns } = await seedDemo(house.db, { folder });
  expect([seeded, signIns.map((one) => one.role)]).toEqual([true, ['designer', 'installer', 'reviewer', 'owner']]);
  expect(new Set(signIns.map((one) => one.password)).size).toBe(4);
  const file = join(folder, 'sign-ins.json');
  expect(JSON.parse(readFileSync(file, 'utf8'))).toEqual(signIns);
  expect(statSync(file).mode & 0o077).toBe(0);

  for (const { email, password, role } of signIns) {
    const headers = { cookie: await signIn(house, email, password) };
    const response = await fetch(`${house.address}${listVessels.path}`, { headers });
    const { rows } = listVessels.reply.parse(await response.json());
    expect(rows).toMatchObject([{ name: 'Minnow', role, revision: { letter: 'A' } }]);
    const at = (path: string) =>
      fetch(`${house.address}${path.replace(':vesselId', rows[0]!.vesselId).replace(':letter', 'A')}`, { headers });
    expect((await at(getDesign.path)).status).toBe(role === 'owner' ? 404 : 200);
    expect((await at(getRevision.path)).status).toBe(200);
  }
});

it('a database in which there is somebody gets no demo', async () => {
  expect(await seedDemo(house.db, { folder })).toEqual({ seeded: false, signIns: [] });
  const other = await openHouse();
  await aPerson(other);
  const elsewhere = mkdtempSync(join(tmpdir(), 'ampwright-demo-'));
  expect((await seedDemo(other.db, { folder: elsewhere })).seeded).toBe(false);
  expect(() => readFileSync(join(elsewhere, 'sign-ins.json'))).toThrow('no such file');
});
