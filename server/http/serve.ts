import type { Request, RequestHandler, Response, Router } from 'express';
import { z } from 'zod';

import type { Endpoint } from '#shared/api/endpoint.ts';
import { may, mayInShop, SHOP_RIGHTS, VESSEL_RIGHTS, type ShopRight, type VesselRight } from '#shared/access/matrix.ts';
import type { OpenDatabase } from '#server/db/connect.ts';
import { newId } from '#server/db/ids.ts';
import { readMembership, readStanding, type Standing } from '#server/db/standing-queries.ts';
import { Forbidden, Invalid, NotFound, NotSignedIn } from '#server/refusals.ts';

import { houseOf, type House } from './house.ts';
import type { Caller } from './sign-in.ts';

/** Who may call: anyone, anyone signed in, or who has a right on the vessel or in the shop that the request names. */
export type Right = 'public' | 'signed-in' | VesselRight | ShopRight;

export interface Asked<Params, Query, Body> {
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  /** Signed in, where the right asks for that. */
  readonly caller: Caller;
  /** Of the caller on the vessel that the path names. */
  readonly standing: Standing;
  readonly db: OpenDatabase;
  readonly house: House;
  /** Sent by the client with a write, or new. It becomes the id of what is made, so that asking twice makes one. */
  readonly key: string;
  readonly request: Request;
  readonly response: Response;
}

export interface ServeOptions {
  /** The vessel may be one that was deleted and can still be brought back. */
  readonly evenDeleted?: true;
}

/**
 * The one door: reads the request by its contract, asks who calls and whether they may, and answers by the contract.
 * What a person may not see is answered as if it did not exist.
 */
export function serve<
  Params extends z.ZodType,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Reply extends z.ZodType,
>(
  router: Router,
  contract: Endpoint<Params, Query, Body, Reply>,
  right: Right,
  handle: (asked: Asked<z.output<Params>, z.output<Query>, z.output<Body>>) => Promise<z.input<Reply>>,
  options: ServeOptions = {},
): void {
  const answer: RequestHandler = async (request, response) => {
    const house = houseOf(request);
    const caller = right === 'public' ? undefined : await house.signIn.readCaller(request, response);
    if (right !== 'public' && caller === undefined) throw new NotSignedIn();
    const params = contract.params.safeParse(request.params);
    if (!params.success) throw new NotFound();
    const standing = await admit(house, right, caller, params.data, request.body, options);
    const asked = {
      params: params.data,
      query: read(contract.query, request.query, 'query'),
      body: read(contract.body, isWithoutBody(request) ? undefined : request.body, 'body'),
      caller,
      standing,
      db: house.db,
      house,
      key: readKey(request),
      request,
      response,
    };
    // `caller` and `standing` are there wherever the right asks for them; a public route has no use for either.
    const reply = await handle(asked as unknown as Parameters<typeof handle>[0]);
    if (!response.headersSent) send(response, contract.reply, reply);
  };
  served.set(answer, { contract, right });
  router[METHODS[contract.method]](contract.path, answer);
}

/** What a route was made from; undefined for one that did not come through the door. */
export function servedBy(handler: unknown): { readonly contract: Endpoint; readonly right: Right } | undefined {
  return served.get(handler as RequestHandler);
}

const served = new WeakMap<RequestHandler, { contract: Endpoint; right: Right }>();
const METHODS = { GET: 'get', POST: 'post', PATCH: 'patch', DELETE: 'delete' } as const;

async function admit(
  house: House,
  right: Right,
  caller: Caller | undefined,
  params: unknown,
  body: unknown,
  options: ServeOptions,
): Promise<Standing | undefined> {
  if (caller === undefined || right === 'public' || right === 'signed-in') return undefined;
  const { vesselId } = params as { vesselId?: string };
  if (vesselId === undefined) {
    await admitToShop(house, right as ShopRight, caller, body);
    return undefined;
  }
  const standing = await readStanding(house.db, vesselId, caller.personId);
  if (standing === undefined || !may(standing.role, 'see-vessel')) throw new NotFound();
  const isGone = standing.deletedAt !== null;
  if (isGone && !(options.evenDeleted && may(standing.role, 'manage-vessel'))) throw new NotFound();
  if (isShopRight(right)) {
    if (!mayInShop(standing.member, right)) throw new Forbidden('Only an admin of the shop may do that.');
    return standing;
  }
  if (may(standing.role, right)) return standing;
  if (right.startsWith('see-')) throw new NotFound();
  throw new Forbidden(`As ${standing.role} of this vessel you may not do that.`);
}

async function admitToShop(house: House, right: ShopRight, caller: Caller, body: unknown): Promise<void> {
  const shopId = z.object({ shopId: z.uuid() }).safeParse(body);
  if (!shopId.success) throw new Invalid('shopId: names no shop', 'shopId');
  const member = await readMembership(house.db, shopId.data.shopId, caller.personId);
  if (member === undefined) throw new NotFound();
  if (!mayInShop(member, right)) throw new Forbidden('Only an admin of the shop may do that.');
}

function isShopRight(right: Right): right is ShopRight {
  return (SHOP_RIGHTS as readonly string[]).includes(right) && !(VESSEL_RIGHTS as readonly string[]).includes(right);
}

function isWithoutBody(request: Request): boolean {
  return request.method === 'GET' || isEmptyObject(request.body);
}

/** A write without a body may come with none or with `{}`. */
function isEmptyObject(body: unknown): boolean {
  return body === undefined || (typeof body === 'object' && body !== null && Object.keys(body).length === 0);
}

function read<Shape extends z.ZodType>(shape: Shape, value: unknown, what: string): z.output<Shape> {
  const whole = shape.safeParse(value);
  if (whole.success) return whole.data;
  const issue = whole.error.issues[0]!;
  const field = issue.path.join('.');
  throw new Invalid(
    field === '' ? `The ${what} is not what is asked for: ${issue.message}` : `${field}: ${issue.message}`,
    field || undefined,
  );
}

function readKey(request: Request): string {
  const given = request.get('Idempotency-Key');
  if (given === undefined) return newId();
  const key = z.uuid().safeParse(given);
  if (!key.success) throw new Invalid('Idempotency-Key must be a UUID.', 'Idempotency-Key');
  return key.data.toLowerCase();
}

/** The reply cut to its contract: what the contract does not name never leaves the house. */
function send(response: Response, shape: z.ZodType, reply: unknown): void {
  const cut: unknown = shape.parse(reply);
  if (!response.hasHeader('Cache-Control')) response.set('Cache-Control', 'no-store');
  if (cut === undefined) response.status(204).end();
  else if (typeof cut === 'string') response.send(cut);
  else response.json(cut);
}
