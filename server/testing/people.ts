import { eq } from 'drizzle-orm';
import type { z } from 'zod';

import type { Role } from '#shared/access/matrix.ts';
import type { Endpoint } from '#shared/api/endpoint.ts';
import { newDesign } from '#shared/edits/new-design.ts';
import type { Design } from '#shared/model/design.ts';
import { newId } from '#server/db/ids.ts';
import { credential, person } from '#server/db/schema/accounts.ts';
import { shop, shopMember } from '#server/db/schema/shops.ts';
import { vesselMember } from '#server/db/schema/vessels.ts';
import { hashPassword } from '#server/http/sign-in.ts';
import { addVessel } from '#server/services/add-vessel.ts';
import { settleMembership } from '#server/services/shop-membership.ts';

import type { TestHouse } from './open-house.ts';

export const PASSWORD = 'seven brass cleats';

export interface Answer<Reply> {
  readonly status: number;
  readonly headers: Headers;
  /** By the contract where it went well, else the problem. */
  readonly body: Reply;
  readonly problem: { readonly code?: string; readonly detail?: string; readonly field?: string } & Record<
    string,
    unknown
  >;
}

export interface Asking {
  readonly params?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string | number>>;
  readonly body?: unknown;
  readonly headers?: Readonly<Record<string, string>>;
}

export interface TestPerson {
  readonly personId: string;
  readonly name: string;
  readonly email: string;
  readonly cookie: string;
  ask<Called extends Endpoint>(contract: Called, asking?: Asking): Promise<Answer<z.output<Called['reply']>>>;
  /** The same person at another process. */
  at(other: TestHouse): TestPerson;
}

export interface TestVessel {
  readonly vesselId: string;
  readonly shopId: string;
  /** Who made it: admin of its shop. */
  readonly admin: TestPerson;
}

/** Somebody without a session. */
export function nobody(house: TestHouse): TestPerson {
  return personWith(house, { personId: '', name: 'nobody', email: '', cookie: '' });
}

/** Somebody with a confirmed account, signed in, who belongs to no shop. */
export async function aPerson(house: TestHouse, { name = 'Cass Lindqvist' } = {}): Promise<TestPerson> {
  const personId = newId();
  const email = `${personId}@people.example`;
  const now = new Date();
  await house.db
    .insert(person)
    .values({ id: personId, name, email, emailVerified: true, createdAt: now, updatedAt: now });
  await house.db.insert(credential).values({
    id: newId(),
    accountId: personId,
    providerId: 'credential',
    userId: personId,
    password: await (passwordHash ??= hashPassword(PASSWORD)),
    createdAt: now,
    updatedAt: now,
  });
  const cookie = await signIn(house, email, PASSWORD);
  return personWith(house, { personId, name, email, cookie });
}

export async function aShopAdmin(
  house: TestHouse,
  { name = 'Ada Winslow' } = {},
): Promise<TestPerson & { shopId: string }> {
  const admin = await aPerson(house, { name });
  const shopId = newId();
  await house.db.insert(shop).values({ id: shopId, name: 'Heron Slip Electrics', createdAt: new Date() });
  await house.db.insert(shopMember).values({ shopId, personId: admin.personId, admin: true, joinedAt: new Date() });
  return { ...admin, shopId };
}

/** A vessel with an empty sheet, or with the design given, in a shop of its own. */
export async function aVessel(
  house: TestHouse,
  { name = 'Sandpiper', design }: { name?: string; design?: Design } = {},
): Promise<TestVessel> {
  const admin = await aShopAdmin(house);
  const vesselId = newId();
  await addVessel(house.db, {
    vesselId,
    shopId: admin.shopId,
    personId: admin.personId,
    design: design ?? newDesign({ name }, newId),
    deed: 'vessel-created',
  });
  return { vesselId, shopId: admin.shopId, admin };
}

/** Somebody with a role on a vessel, who is no admin of its shop. */
export async function aMember(house: TestHouse, vessel: TestVessel, role: Role): Promise<TestPerson> {
  const member = await aPerson(house, { name: NAMES[role] });
  const { personId } = member;
  await house.db.insert(vesselMember).values({ vesselId: vessel.vesselId, personId, role, joinedAt: new Date() });
  await settleMembership(house.db, vessel.shopId, personId);
  return member;
}

export async function isVerified(house: TestHouse, email: string): Promise<boolean> {
  const [row] = await house.db.select().from(person).where(eq(person.email, email));
  return row?.emailVerified ?? false;
}

/** The cookie of a new session, got as a browser would. */
export async function signIn(house: TestHouse, email: string, password: string): Promise<string> {
  const response = await askSignIn(house, 'sign-in/email', { email, password });
  if (!response.ok) throw new Error(`${email} could not sign in: ${response.status} ${await response.text()}`);
  return cookiesOf(response);
}

export function askSignIn(
  house: TestHouse,
  path: string,
  body: unknown,
  headers: Readonly<Record<string, string>> = {},
): Promise<Response> {
  return fetch(`${house.address}/api/auth/${path}`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', origin: house.publicUrl, ...headers },
    body: JSON.stringify(body),
  });
}

export function cookiesOf(response: Response): string {
  return response.headers
    .getSetCookie()
    .map((line) => line.split(';')[0])
    .join('; ');
}

const NAMES: Readonly<Record<Role, string>> = {
  designer: 'Dora Quill',
  installer: 'Ike Farrow',
  reviewer: 'Rhea Castle',
  owner: 'Otto Vane',
};

let passwordHash: Promise<string> | undefined;

function personWith(house: TestHouse, who: Pick<TestPerson, 'personId' | 'name' | 'email' | 'cookie'>): TestPerson {
  return {
    ...who,
    at: (other) => personWith(other, who),
    async ask(contract, { params = {}, query = {}, body, headers = {} } = {}) {
      const path = contract.path.replaceAll(/:(\w+)/g, (_all, key: string) => encodeURIComponent(params[key] ?? ''));
      const search = new URLSearchParams(Object.entries(query).map(([key, value]) => [key, String(value)]));
      const response = await fetch(`${house.address}${path}${search.size > 0 ? `?${search}` : ''}`, {
        method: contract.method,
        headers: {
          ...(who.cookie === '' ? {} : { cookie: who.cookie }),
          ...(contract.method === 'GET' ? {} : { origin: house.publicUrl }),
          ...(body === undefined ? {} : { 'content-type': 'application/json' }),
          ...headers,
        },
        body: body === undefined ? undefined : typeof body === 'string' ? body : JSON.stringify(body),
      });
      const text = await response.text();
      const value: unknown = response.headers.get('content-type')?.includes('json') ? JSON.parse(text) : text;
      return {
        status: response.status,
        headers: response.headers,
        body: (response.ok ? contract.reply.parse(value === '' ? undefined : value) : undefined) as never,
        problem: response.ok ? {} : (value as Answer<unknown>['problem']),
      };
    },
  };
}
