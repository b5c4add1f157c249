import { beforeAll, describe, expect, it } from 'vitest';

import type { Role } from '#shared/access/matrix.ts';
import { createApp } from '#server/app.ts';
import { newId } from '#server/db/ids.ts';
import type { House } from '#server/http/house.ts';
import { servedBy } from '#server/http/serve.ts';
import { SIGN_IN_ADDRESSES } from '#server/http/sign-in-addresses.ts';
import { aSmallDesign } from '#server/testing/designs.ts';
import { openHouse, type TestHouse } from '#server/testing/open-house.ts';
import { aMember, aPerson, aVessel, nobody, type TestPerson, type TestVessel } from '#server/testing/people.ts';

/**
 * Walks every route that Express has, with everyone who could call it. A route that did not come through `serve()`,
 * or that stands in no line below, fails. The bodies are good ones where a good one changes nothing that others of
 * the walk need; else bad ones, which whoever may call is told about (400) and nobody else ever hears of.
 */
type Who = Role | 'admin' | 'stranger' | 'nobody';
type Expected = Readonly<Record<Who, number>>;

const EVERYONE: readonly Who[] = ['designer', 'installer', 'reviewer', 'owner', 'admin', 'stranger', 'nobody'];

/** Who sees the vessel and may not do it hears 403; a stranger 404, as if there were none; nobody 401. */
function only(who: readonly Who[], status: number, others = 403): Expected {
  return Object.fromEntries(
    EVERYONE.map((one) => [
      one,
      who.includes(one) ? status : one === 'nobody' ? 401 : one === 'stranger' ? 404 : others,
    ]),
  ) as Expected;
}

function all(status: number, of: Partial<Expected> = {}): Expected {
  return { ...(Object.fromEntries(EVERYONE.map((one) => [one, status])) as Expected), ...of };
}

const DESIGNERS: readonly Who[] = ['designer', 'admin'];
const TRADE: readonly Who[] = ['designer', 'installer', 'reviewer', 'admin'];
const ABOARD: readonly Who[] = [...TRADE, 'owner'];

const BAD = { bad: true };

const WALK: Readonly<
  Record<string, { readonly expected: Expected; readonly body?: unknown; readonly query?: string }>
> = {
  'GET /api/me': { expected: all(200, { nobody: 401 }) },
  'GET /api/server': { expected: all(200) },
  'GET /api/mailbox': { expected: all(404) },
  'GET /api/schemas/ampwright-design.json': { expected: all(200) },
  'GET /api/vessels': { expected: all(200, { nobody: 401 }) },
  // The shop that the body names: members of the shop only, and here nothing else is right with the body.
  'POST /api/vessels': {
    expected: { ...only(['designer', 'installer', 'admin'], 400, 404), nobody: 401 },
    body: { shopId: ':shopId', ...BAD },
  },
  'POST /api/vessels/import': {
    expected: { ...only(['designer', 'installer', 'admin'], 400, 404), nobody: 401 },
    body: { shopId: ':shopId', file: '{}' },
  },
  'GET /api/vessels/:vesselId': { expected: only(ABOARD, 200) },
  'PATCH /api/vessels/:vesselId': { expected: only(DESIGNERS, 400), body: BAD },
  'DELETE /api/vessels/:vesselId': { expected: only(DESIGNERS, 400), body: BAD },
  'POST /api/vessels/:vesselId/duplicate': { expected: only(DESIGNERS, 400), body: BAD },
  'POST /api/vessels/:vesselId/archive': { expected: only(DESIGNERS, 400), body: BAD },
  'POST /api/vessels/:vesselId/unarchive': { expected: only(DESIGNERS, 200) },
  'POST /api/vessels/:vesselId/restore': { expected: only(DESIGNERS, 200) },
  'GET /api/vessels/:vesselId/design': { expected: only(TRADE, 200, 404) },
  'GET /api/vessels/:vesselId/design/file': { expected: only(TRADE, 200, 404) },
  'GET /api/vessels/:vesselId/parts.csv': { expected: only(TRADE, 200, 404) },
  'POST /api/vessels/:vesselId/changes': { expected: only(DESIGNERS, 400), body: BAD },
  'GET /api/vessels/:vesselId/changes': { expected: only(TRADE, 200, 404), query: '?since=0' },
  'GET /api/vessels/:vesselId/news': { expected: only(TRADE, 200, 404) },
  'GET /api/vessels/:vesselId/revisions': { expected: only(ABOARD, 200) },
  'POST /api/vessels/:vesselId/revisions': { expected: only(DESIGNERS, 400), body: BAD },
  // None is issued: whoever may see revisions is told so, alike with whoever may not.
  'GET /api/vessels/:vesselId/revisions/:letter': { expected: all(404, { nobody: 401 }) },
  'GET /api/vessels/:vesselId/people': { expected: only(TRADE, 200, 404) },
  'POST /api/vessels/:vesselId/invitations': { expected: only(['admin'], 400), body: BAD },
  'DELETE /api/vessels/:vesselId/invitations/:invitationId': { expected: only(['admin'], 404) },
  'PATCH /api/vessels/:vesselId/people/:personId': { expected: only(['admin'], 400), body: BAD },
  'DELETE /api/vessels/:vesselId/people/:personId': { expected: only(['admin'], 404) },
  // The token is the right; this one opens nothing.
  'GET /api/invitations/:token': { expected: all(404) },
  'POST /api/invitations/:token/accept': { expected: all(404, { nobody: 401 }) },
  'POST /api/invitations/:token/join': { expected: all(404), body: { name: 'Cass', password: 'seven brass cleats' } },
};

/** Of the process, not of anyone's data: they answer without asking who calls. */
const OF_THE_PROCESS = ['GET /healthz', 'GET /readyz', 'GET /{*any}'];

interface Found {
  readonly route: string;
  readonly handlers: readonly unknown[];
}

let house: TestHouse;
let vessel: TestVessel;
let people: Readonly<Record<Who, TestPerson>>;

beforeAll(async () => {
  house = await openHouse();
  vessel = await aVessel(house, { design: aSmallDesign() });
  people = {
    designer: await aMember(house, vessel, 'designer'),
    installer: await aMember(house, vessel, 'installer'),
    reviewer: await aMember(house, vessel, 'reviewer'),
    owner: await aMember(house, vessel, 'owner'),
    admin: vessel.admin,
    stranger: await aPerson(house, { name: 'Sten Ruddock' }),
    nobody: nobody(house),
  };
});

describe('every route that Express has', () => {
  const routes = findRoutes();

  it('came through the one door, but for the named few', () => {
    const elsewhere = routes.filter(({ handlers }) => !handlers.some((handler) => servedBy(handler) !== undefined));
    expect(elsewhere.map(({ route }) => route).sort()).toEqual([...OF_THE_PROCESS, 'ALL /api/auth/{*any}'].sort());
  });

  it('stands in the walk, and the walk has no other', () => {
    const served = routes.filter(({ handlers }) => handlers.some((handler) => servedBy(handler) !== undefined));
    expect(served.map(({ route }) => route).sort()).toEqual(Object.keys(WALK).sort());
  });

  it.each(Object.entries(WALK))('%s answers each as it may', async (route, { expected, body, query = '' }) => {
    const answers: Record<string, number> = {};
    for (const who of EVERYONE) answers[who] = (await ask(people[who], route, vessel.vesselId, body, query)).status;
    expect(answers).toEqual(expected);
  });

  const onVessel = Object.entries(WALK).filter(([route]) => route.includes(':vesselId'));
  it.each(onVessel)('%s tells a stranger of a vessel what it tells of none', async (route, { body, query = '' }) => {
    const there = await ask(people.stranger, route, vessel.vesselId, body, query);
    const absent = await ask(people.stranger, route, newId(), body, query);
    const nonsense = await ask(people.stranger, route, 'no-id-at-all', body, query);
    expect(there).toEqual(absent);
    expect(nonsense).toEqual(absent);
    expect(there.status).toBe(404);
  });
});

describe('the addresses of the sign-in package', () => {
  const OTHERS = [
    ['GET', 'list-sessions'],
    ['GET', 'get-session'],
    ['POST', 'update-user'],
    ['POST', 'change-email'],
    ['POST', 'delete-user'],
    ['POST', 'change-password'],
    ['POST', 'revoke-sessions'],
    ['GET', 'list-accounts'],
    ['GET', 'ok'],
    ['GET', 'error'],
    ['POST', 'sign-in/social'],
    ['GET', 'sign-in/email'],
    ['GET', 'reset-password/abc'],
    ['POST', 'sign-up/email/'],
    ['POST', 'nothing-at-all'],
  ] as const;

  it.each(SIGN_IN_ADDRESSES)('$method $path is there', async ({ method, path }) => {
    const answer = await fetch(`${house.address}${path}`, {
      method,
      headers: { 'content-type': 'application/json', origin: house.publicUrl },
      body: method === 'POST' ? '{}' : undefined,
    });
    expect(answer.status).not.toBe(404);
    expect(answer.status).toBeLessThan(500);
  });

  it.each(OTHERS)('%s %s is not', async (method, path) => {
    const answer = await fetch(`${house.address}/api/auth/${path}`, {
      method,
      headers: { 'content-type': 'application/json', origin: house.publicUrl, cookie: people.admin.cookie },
      body: method === 'POST' ? '{}' : undefined,
    });
    expect(answer.status).toBe(404);
  });
});

async function ask(
  who: TestPerson,
  route: string,
  vesselId: string,
  body: unknown,
  query: string,
): Promise<{ status: number; said: unknown }> {
  const [method, path] = route.split(' ') as [string, string];
  const filled = path
    .replace(':vesselId', vesselId)
    .replace(':letter', 'A')
    .replace(':token', 'x'.repeat(40))
    .replace(/:(personId|invitationId)/, '01900000-0000-7000-8000-000000000000');
  const leave = new AbortController();
  const response = await fetch(`${house.address}${filled}${query}`, {
    method,
    headers: {
      ...(who.cookie === '' ? {} : { cookie: who.cookie }),
      origin: house.publicUrl,
      ...(body === undefined ? {} : { 'content-type': 'application/json' }),
    },
    body: body === undefined ? undefined : JSON.stringify(body).replace(':shopId', vessel.shopId),
    signal: leave.signal,
  });
  const { status } = response;
  const said: unknown = status >= 400 ? await response.json() : undefined;
  leave.abort();
  return { status, said };
}

interface Layer {
  readonly name: string;
  readonly handle: unknown;
  readonly route?: {
    readonly path: string;
    readonly methods: Readonly<Record<string, boolean>>;
    readonly stack: readonly { readonly method?: string; readonly handle: unknown }[];
  };
}

/** As Express itself keeps them, routers within routers. */
function findRoutes(): Found[] {
  const app = createApp({
    configuration: { publicUrl: 'http://ampwright.test', mode: 'test', trustProxy: 0 },
  } as House);
  return within((app as unknown as { router: { stack: readonly Layer[] } }).router.stack);
}

function within(stack: readonly Layer[]): Found[] {
  return stack.flatMap(({ route, handle }) => {
    if (route !== undefined) {
      const methods = route.methods['_all'] ? ['all'] : Object.keys(route.methods);
      return methods.map((method) => ({
        route: `${method.toUpperCase()} ${route.path}`,
        handlers: route.stack.map((one) => one.handle),
      }));
    }
    const nested = (handle as { stack?: readonly Layer[] }).stack;
    return nested === undefined ? [] : within(nested);
  });
}
