import { z } from 'zod';

/** A contract read by both sides: the server's `serve()` and the client's `call()`. */
export interface Endpoint<
  Params extends z.ZodType = z.ZodType,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Reply extends z.ZodType = z.ZodType,
> {
  readonly method: 'GET' | 'POST' | 'PATCH' | 'DELETE';
  /** With Express's `:name` for each key of `params`. */
  readonly path: string;
  readonly params: Params;
  readonly query: Query;
  readonly body: Body;
  readonly reply: Reply;
}

export const Nothing = z.undefined();

export function endpoint<
  Params extends z.ZodType = typeof NoParams,
  Query extends z.ZodType = typeof NoParams,
  Body extends z.ZodType = typeof Nothing,
  Reply extends z.ZodType = typeof Nothing,
>(contract: {
  method: Endpoint['method'];
  path: string;
  params?: Params;
  query?: Query;
  body?: Body;
  reply?: Reply;
}): Endpoint<Params, Query, Body, Reply> {
  return {
    method: contract.method,
    path: contract.path,
    params: contract.params ?? (NoParams as unknown as Params),
    query: contract.query ?? (NoParams as unknown as Query),
    body: contract.body ?? (Nothing as unknown as Body),
    reply: contract.reply ?? (Nothing as unknown as Reply),
  };
}

const NoParams = z.strictObject({});

export const Instant = z.iso.datetime({ offset: false });
export const VesselParams = z.strictObject({ vesselId: z.uuid() });

/** Lists are paged: a cursor of the last row seen. */
export const PageQuery = z.strictObject({
  after: z.string().max(200).optional(),
  limit: z.coerce.number().int().min(1).max(200).optional(),
});
export function pageOf<Row extends z.ZodType>(row: Row) {
  return z.object({ rows: z.array(row), next: z.string().nullable(), total: z.int() });
}
