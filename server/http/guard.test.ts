import { beforeAll, expect, it } from 'vitest';

import { makeChange } from '#shared/api/design.ts';
import { createVessel, listVessels } from '#shared/api/vessels.ts';
import { aSmallDesign } from '#server/testing/designs.ts';
import { openHouse, type TestHouse } from '#server/testing/open-house.ts';
import { aVessel, nobody, type TestVessel } from '#server/testing/people.ts';

let house: TestHouse;
let vessel: TestVessel;
beforeAll(async () => {
  house = await openHouse();
  vessel = await aVessel(house, { design: aSmallDesign() });
});

it.each([
  ['another site by its origin', { origin: 'https://elsewhere.example' }],
  ['a page without an origin', { origin: 'null' }],
  ['another port of this host', { 'sec-fetch-site': 'same-site' }],
  ['another site by what the browser says', { 'sec-fetch-site': 'cross-site' }],
])('a write from %s is refused, signed in or not', async (_from, headers) => {
  const body = { shopId: vessel.shopId, name: 'Forged' };
  expect((await vessel.admin.ask(createVessel, { body, headers })).problem.code).toBe('forbidden');
  const signIn = await fetch(`${house.address}/api/auth/sign-in/email`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', ...headers },
    body: JSON.stringify({ email: vessel.admin.email, password: 'x' }),
  });
  expect(signIn.status).toBe(403);
  expect((await vessel.admin.ask(listVessels)).body.total).toBe(1);
});

it.each<[string, string]>([
  ['no JSON', '{"id":'],
  ['JSON 100,000 deep', `${'['.repeat(100_000)}${']'.repeat(100_000)}`],
  [
    'a value 60 deep',
    JSON.stringify({
      patches: [{ op: 'set', path: ['runs'], value: JSON.parse(`${'{"a":'.repeat(60)}1${'}'.repeat(60)}`) }],
    }),
  ],
  ['a list', '[]'],
  ['null', 'null'],
  ['text', '"text"'],
  ['a number where a list belongs', '{"id":1,"base":"x","label":[],"patches":7}'],
  ['nothing', ''],
])('a body of %s is told to be wrong, and is no failure of ours', async (_what, body) => {
  const answer = await vessel.admin.ask(makeChange, { params: { vesselId: vessel.vesselId }, body });
  expect([answer.status, answer.problem.code]).toEqual([400, 'invalid']);
});

it('a body larger than any file of a design is refused', async () => {
  const body = { shopId: vessel.shopId, name: 'x'.repeat(27_000_000) };
  expect((await vessel.admin.ask(createVessel, { body })).status).toBe(413);
});

it('an address that is not there answers with a problem, and with headers that keep scripts out', async () => {
  const response = await fetch(`${house.address}/api/nothing/here`);
  expect(response.status).toBe(404);
  expect(response.headers.get('content-type')).toContain('application/problem+json');
  expect(response.headers.get('content-security-policy')).toContain("script-src 'self' 'wasm-unsafe-eval'");
  expect(response.headers.get('x-content-type-options')).toBe('nosniff');
  expect(response.headers.get('x-powered-by')).toBeNull();
});

it('a key that is none is told to be wrong', async () => {
  const body = { shopId: vessel.shopId, name: 'Keyed' };
  const answer = await vessel.admin.ask(createVessel, { body, headers: { 'idempotency-key': 'again' } });
  expect(answer.problem).toMatchObject({ status: 400, field: 'Idempotency-Key' });
});

it('without a session every list is closed', async () => {
  expect((await nobody(house).ask(listVessels)).problem.code).toBe('not-signed-in');
});
