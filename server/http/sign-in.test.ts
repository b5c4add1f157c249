import { mkdtempSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';

import { beforeAll, expect, it } from 'vitest';

import { getMe } from '#shared/api/me.ts';
import { listMail } from '#shared/api/mailbox.ts';
import { verification } from '#server/db/schema/accounts.ts';
import { openHouse, type TestHouse } from '#server/testing/open-house.ts';
import { aPerson, askSignIn, cookiesOf, nobody, PASSWORD } from '#server/testing/people.ts';

let house: TestHouse;
beforeAll(async () => {
  house = await openHouse({ mailbox: mkdtempSync(join(tmpdir(), 'ampwright-mail-')) });
});

async function mailTo(email: string, subject: RegExp): Promise<{ text: string; token: string }> {
  for (;;) {
    const { body } = await nobody(house).ask(listMail);
    const mail = body.rows.find((row) => row.to === email && subject.test(row.subject));
    if (mail !== undefined) return { text: mail.text, token: new URL(mail.links[0]!).searchParams.get('token') ?? '' };
    await new Promise((resolve) => setTimeout(resolve, 50));
  }
}

async function me(cookie: string) {
  const response = await fetch(`${house.address}${getMe.path}`, { headers: { cookie } });
  return { status: response.status, body: (await response.json()) as { shops?: unknown[]; email?: string } };
}

function confirm(token: string): Promise<Response> {
  return fetch(`${house.address}/api/auth/verify-email?token=${encodeURIComponent(token)}`);
}

it('whoever signs up can sign in once the address is confirmed, and has a shop of their own then', async () => {
  const email = 'new.hand@people.example';
  const signedUp = await askSignIn(house, 'sign-up/email', { name: 'New Hand', email, password: PASSWORD });
  expect([signedUp.status, signedUp.headers.getSetCookie()]).toEqual([200, []]);
  const early = await askSignIn(house, 'sign-in/email', { email, password: PASSWORD });
  expect([early.status, ((await early.json()) as { reason: string }).reason]).toEqual([403, 'EMAIL_NOT_VERIFIED']);

  const { token } = await mailTo(email, /Confirm/);
  const confirmed = await confirm(token);
  expect(confirmed.status).toBe(200);
  const mine = await me(cookiesOf(confirmed));
  expect(mine.body).toMatchObject({ email, shops: [{ name: 'New Hand’s shop', admin: true }] });
  expect((await confirm(token)).headers.getSetCookie()).toEqual([]);
  expect((await me(cookiesOf(confirmed))).body.shops).toHaveLength(1);
  expect((await confirm(`${token}x`)).status).toBe(401);
});

it('the cookie of a session is closed to scripts and to other sites', async () => {
  const { email } = await aPerson(house);
  const response = await askSignIn(house, 'sign-in/email', { email, password: PASSWORD });
  expect(response.headers.getSetCookie()[0]).toMatch(/; HttpOnly; SameSite=Lax/);
  expect(await response.json()).toEqual({ done: true });
});

it('signing up with an address that is known answers as with one that is not, and tells its owner by mail', async () => {
  const { email } = await aPerson(house);
  const body = { name: 'Somebody', password: 'another long password' };
  const known = await askSignIn(house, 'sign-up/email', { ...body, email });
  const unknown = await askSignIn(house, 'sign-up/email', { ...body, email: 'not.yet@people.example' });
  expect([known.status, await known.text()]).toEqual([unknown.status, await unknown.text()]);
  expect((await mailTo(email, /already/)).text).toContain(`${house.publicUrl}/sign-in`);
});

it('a wrong password and an unknown address are told alike', async () => {
  const { email } = await aPerson(house);
  const wrong = await askSignIn(house, 'sign-in/email', { email, password: 'not this password' });
  const unknown = await askSignIn(house, 'sign-in/email', {
    email: 'who@people.example',
    password: 'not this password',
  });
  expect(await wrong.json()).toEqual(await unknown.json());
  expect([wrong.status, unknown.status]).toEqual([401, 401]);
});

it('ten wrong passwords for one address put it to rest, for the right one too', async () => {
  const { email } = await aPerson(house);
  const statuses: number[] = [];
  for (let i = 0; i < 10; i++) {
    statuses.push((await askSignIn(house, 'sign-in/email', { email, password: `wrong password ${i}` })).status);
  }
  expect(new Set(statuses)).toEqual(new Set([401]));
  expect((await askSignIn(house, 'sign-in/email', { email, password: PASSWORD })).status).toBe(429);
});

it('a new password is set by mail, once, and ends every session that was open', async () => {
  const { email, cookie } = await aPerson(house);
  const asked = await askSignIn(house, 'request-password-reset', { email });
  const unknown = await askSignIn(house, 'request-password-reset', { email: 'nobody@people.example' });
  expect([asked.status, await asked.text()]).toEqual([unknown.status, await unknown.text()]);
  const { token } = await mailTo(email, /new password/);
  const kept = await house.db.select().from(verification);
  expect(JSON.stringify(kept)).not.toContain(token);

  expect((await askSignIn(house, 'reset-password', { token, newPassword: 'short' })).status).toBe(400);
  expect((await askSignIn(house, 'reset-password', { token, newPassword: 'a new brass cleat' })).status).toBe(200);
  expect((await askSignIn(house, 'reset-password', { token, newPassword: 'a newer brass cleat' })).status).toBe(400);
  expect((await me(cookie)).status).toBe(401);
  expect((await askSignIn(house, 'sign-in/email', { email, password: 'a new brass cleat' })).status).toBe(200);
});

it('signing out ends the session on the server, not only in the browser', async () => {
  const { cookie } = await aPerson(house);
  expect((await me(cookie)).status).toBe(200);
  expect((await askSignIn(house, 'sign-out', {}, { cookie })).status).toBe(200);
  expect((await me(cookie)).status).toBe(401);
});
