import type { z } from 'zod';

import type { Endpoint } from '#shared/api/endpoint.ts';
import { listMail } from '#shared/api/mailbox.ts';
import { getMe } from '#shared/api/me.ts';

type Part<Name extends string, Value> =
  Record<string, never> extends Value
    ? { readonly [key in Name]?: Value }
    : undefined extends Value
      ? { readonly [key in Name]?: Value }
      : { readonly [key in Name]: Value };

export type CallInput<Called extends Endpoint> = Part<'params', z.input<Called['params']>> &
  Part<'query', z.input<Called['query']>> &
  Part<'body', z.input<Called['body']>>;

/** Somebody who is signed in and talks to a running server from outside, as a browser would. */
export interface Person {
  readonly name: string;
  readonly email: string;
  readonly personId: string;
  /** The first shop of which this person is a member. */
  readonly shopId: string | undefined;
  readonly cookie: string;
  call<Called extends Endpoint>(contract: Called, input: CallInput<Called>): Promise<z.output<Called['reply']>>;
  /** Undefined where no answer came, or one that the server or its database is not up to it. */
  tryCall<Called extends Endpoint>(
    contract: Called,
    input: CallInput<Called>,
  ): Promise<z.output<Called['reply']> | undefined>;
}

export interface Credentials {
  readonly email: string;
  readonly password: string;
}

export async function signIn(address: string, { email, password }: Credentials): Promise<Person> {
  return personOf(address, await post(address, '/api/auth/sign-in/email', { email, password }));
}

/** Signs up, reads the mail in the local mailbox, and confirms the address: there is a shop of one's own then. */
export async function signUp(address: string, who: Credentials & { readonly name: string }): Promise<Person> {
  await post(address, '/api/auth/sign-up/email', { ...who });
  const link = await readLink(address, who.email, '/confirm');
  const token = new URL(link).searchParams.get('token') ?? '';
  const reply = await fetch(`${address}/api/auth/verify-email?token=${encodeURIComponent(token)}`, {
    redirect: 'manual',
    headers: { origin: address },
  });
  if (reply.status >= 400) throw new Error(`confirming ${who.email}: ${reply.status} ${await reply.text()}`);
  return signIn(address, who);
}

/**
 * The link of the newest mail to an address that leads to a page; waits for the mail to come. `about` tells one mail
 * from another to the same address: the vessel's name, say.
 */
export async function readLink(address: string, email: string, page: string, about = ''): Promise<string> {
  for (const deadline = Date.now() + 20_000; Date.now() < deadline;) {
    const reply = await fetch(`${address}${listMail.path}`);
    const { rows } = listMail.reply.parse(await reply.json());
    const link = rows
      .filter((mail) => mail.to.includes(email) && `${mail.subject}\n${mail.text}`.includes(about))
      .flatMap((mail) => mail.links)
      .find((candidate) => new URL(candidate).pathname.startsWith(page));
    if (link !== undefined) return link;
    await new Promise((done) => setTimeout(done, 50));
  }
  throw new Error(`no mail with a link to ${page} has come for ${email}`);
}

async function post(address: string, path: string, body: object): Promise<Response> {
  const reply = await fetch(`${address}${path}`, {
    method: 'POST',
    headers: { 'content-type': 'application/json', origin: address },
    body: JSON.stringify(body),
  });
  if (!reply.ok) throw new Error(`${path}: ${reply.status} ${await reply.text()}`);
  return reply;
}

async function personOf(address: string, reply: Response): Promise<Person> {
  const cookie = reply.headers
    .getSetCookie()
    .map((line) => line.split(';')[0])
    .join('; ');
  const me = await ask(address, cookie, getMe, {});
  return {
    name: me.name,
    email: me.email,
    personId: me.personId,
    shopId: me.shops[0]?.shopId,
    cookie,
    call: (contract, input) => ask(address, cookie, contract, input),
    async tryCall(contract, input) {
      try {
        return await ask(address, cookie, contract, input);
      } catch (error) {
        if (error instanceof Refused && error.status < 500) throw error;
        return undefined;
      }
    },
  };
}

/** An answer that is no success. */
export class Refused extends Error {
  readonly status: number;
  constructor(status: number, said: string) {
    super(`${status} ${said}`);
    this.status = status;
  }
}

async function ask<Called extends Endpoint>(
  address: string,
  cookie: string,
  contract: Called,
  input: CallInput<Called>,
): Promise<z.output<Called['reply']>> {
  const {
    params = {},
    query = {},
    body,
  } = input as {
    params?: Record<string, string>;
    query?: Record<string, string | number | undefined>;
    body?: unknown;
  };
  const path = contract.path.replaceAll(/:(\w+)/g, (_all, name: string) => encodeURIComponent(params[name] ?? ''));
  const search = new URLSearchParams();
  for (const [name, value] of Object.entries(query)) if (value !== undefined) search.set(name, String(value));
  const reply = await fetch(`${address}${path}${search.size > 0 ? `?${search}` : ''}`, {
    method: contract.method,
    headers: {
      cookie,
      origin: address,
      accept: 'application/json',
      ...(body === undefined ? {} : { 'content-type': 'application/json' }),
      ...(contract.method === 'GET' ? {} : { 'idempotency-key': crypto.randomUUID() }),
    },
    body: body === undefined ? undefined : JSON.stringify(body),
    signal: AbortSignal.timeout(30_000),
  });
  const said = await reply.text();
  if (!reply.ok) throw new Refused(reply.status, `${contract.method} ${path}: ${said}`);
  const value: unknown = reply.headers.get('content-type')?.includes('json') ? JSON.parse(said) : said;
  return contract.reply.parse(value) as z.output<Called['reply']>;
}
