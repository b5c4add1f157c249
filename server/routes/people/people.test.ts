import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { beforeAll, expect, it } from 'vitest';

import { getDesign } from '#shared/api/design.ts';
import { listMail } from '#shared/api/mailbox.ts';
import { getMe } from '#shared/api/me.ts';
import {
  acceptInvitation,
  changeRole,
  getInvitation,
  invitePerson,
  joinByInvitation,
  listPeople,
  removePerson,
  withdrawInvitation,
} from '#shared/api/people.ts';
import { getVessel } from '#shared/api/vessels.ts';
import { newId } from '#server/db/ids.ts';
import { invitation } from '#server/db/schema/vessels.ts';
import { openHouse, type TestHouse } from '#server/testing/open-house.ts';
import { aPerson, askSignIn, aVessel, cookiesOf, nobody, PASSWORD, type TestVessel } from '#server/testing/people.ts';

let house: TestHouse;
beforeAll(async () => {
  house = await openHouse({ mailbox: mkdtempSync(join(tmpdir(), 'ampwright-mail-')) });
});

function invite({ admin, vesselId }: TestVessel, email: string, role: string, key = newId()) {
  return admin.ask(invitePerson, { params: { vesselId }, body: { email, role }, headers: { 'idempotency-key': key } });
}

async function tokenFor(email: string): Promise<string> {
  for (;;) {
    const { body } = await nobody(house).ask(listMail);
    const mail = body.rows.find((row) => row.to === email && row.subject.includes('invites you'));
    if (mail !== undefined) return new URL(mail.links[0]!).pathname.replace('/invitations/', '');
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

it('somebody new joins from the mail, is signed in by it, and gets no shop of their own', async () => {
  const vessel = await aVessel(house);
  await invite(vessel, 'Fresh.Owner@people.example', 'owner');
  const token = await tokenFor('fresh.owner@people.example');
  const shown = await nobody(house).ask(getInvitation, { params: { token } });
  expect(shown.body).toMatchObject({ role: 'owner', vesselName: 'Sandpiper', hasAccount: false });

  const path = joinByInvitation.path.replace(':token', token);
  const join = () =>
    fetch(`${house.address}${path}`, {
      method: 'POST',
      headers: { 'content-type': 'application/json', origin: house.publicUrl },
      body: JSON.stringify({ name: 'Fresh Owner', password: PASSWORD }),
    });
  const joined = await join();
  expect(await joined.json()).toEqual({ vesselId: vessel.vesselId });
  const me = await fetch(`${house.address}${getMe.path}`, { headers: { cookie: cookiesOf(joined) } });
  expect(await me.json()).toMatchObject({ name: 'Fresh Owner', shops: [] });
  expect((await join()).status).toBe(404);
  expect(JSON.stringify(await house.db.select().from(invitation))).not.toContain(token);
});

it('an account that somebody else began with the address does not open the vessel to them', async () => {
  const vessel = await aVessel(house);
  const email = 'squatted@people.example';
  await askSignIn(house, 'sign-up/email', { name: 'Squatter', email, password: 'the password of a stranger' });
  await invite(vessel, email, 'reviewer');
  const params = { token: await tokenFor(email) };
  await nobody(house).ask(joinByInvitation, { params, body: { name: 'Real Person', password: PASSWORD } });
  const sign = (password: string) => askSignIn(house, 'sign-in/email', { email, password });
  expect((await sign('the password of a stranger')).status).toBe(401);
  expect((await sign(PASSWORD)).status).toBe(200);
});

it('somebody with an account joins signed in, and only with the address that was invited', async () => {
  const vessel = await aVessel(house);
  const invited = await aPerson(house);
  await invite(vessel, invited.email, 'installer');
  const params = { token: await tokenFor(invited.email) };
  expect((await (await aPerson(house)).ask(acceptInvitation, { params })).status).toBe(403);
  expect((await invited.ask(acceptInvitation, { params })).body).toEqual({ vesselId: vessel.vesselId });
  expect((await invited.ask(getVessel, { params: { vesselId: vessel.vesselId } })).body.role).toBe('installer');
  expect((await invited.ask(getMe)).body.shops).toMatchObject([{ shopId: vessel.shopId, admin: false }]);
});

it('a role that is changed or taken away counts at once', async () => {
  const vessel = await aVessel(house);
  const invited = await aPerson(house);
  const { vesselId } = vessel;
  await invite(vessel, invited.email, 'designer');
  await invited.ask(acceptInvitation, { params: { token: await tokenFor(invited.email) } });
  const params = { vesselId, personId: invited.personId };
  const changed = await vessel.admin.ask(changeRole, { params, body: { role: 'owner' } });
  expect(changed.body).toMatchObject({ role: 'owner', admin: false });
  expect((await invited.ask(getDesign, { params: { vesselId } })).status).toBe(404);
  expect((await invited.ask(getMe)).body.shops).toEqual([]);
  expect((await vessel.admin.ask(removePerson, { params })).body).toEqual({ removed: true });
  expect((await invited.ask(getVessel, { params: { vesselId } })).status).toBe(404);
  const own = { vesselId, personId: vessel.admin.personId };
  expect((await vessel.admin.ask(changeRole, { params: own, body: { role: 'owner' } })).status).toBe(403);
});

it('an invitation asked for twice with one key is one mail; one withdrawn opens nothing', async () => {
  const vessel = await aVessel(house);
  const key = newId();
  const email = 'twice@people.example';
  const [first, second] = [await invite(vessel, email, 'reviewer', key), await invite(vessel, email, 'reviewer', key)];
  expect(second.body).toEqual(first.body);
  const token = await tokenFor(email);
  const { body } = await vessel.admin.ask(listPeople, { params: { vesselId: vessel.vesselId } });
  expect(body.invitations).toHaveLength(1);
  const params = { vesselId: vessel.vesselId, invitationId: key };
  expect((await vessel.admin.ask(withdrawInvitation, { params })).body).toEqual({ withdrawn: true });
  expect((await nobody(house).ask(getInvitation, { params: { token } })).status).toBe(404);
});
