import type { z } from 'zod';

import type { Endpoint } from '#shared/api/endpoint.ts';

import { readProblem, Unreachable } from './problem-error.ts';

type Part<Name extends string, Value> = undefined extends Value
  ? { readonly [key in Name]?: Value }
  : Record<string, never> extends Value
    ? { readonly [key in Name]?: Value }
    : { readonly [key in Name]: Value };

/** What a call needs: only the parts that its contract asks for. */
export type CallInput<Called extends Endpoint> = Part<'params', z.input<Called['params']>> &
  Part<'query', z.input<Called['query']>> &
  Part<'body', z.input<Called['body']>> & {
    readonly signal?: AbortSignal;
    /** The same key makes a write sent twice count once; made here when left out. */
    readonly idempotencyKey?: string;
  };

/** The one way to the server: the address and the types from the contract, the reply checked against it. */
export async function call<Called extends Endpoint>(
  contract: Called,
  input: CallInput<Called>,
): Promise<z.output<Called['reply']>> {
  const { params, query, body, signal, idempotencyKey } = input as LooseInput;
  const response = await send(addressOf(contract, params, query), {
    method: contract.method,
    signal,
    headers: {
      accept: 'application/json',
      ...(contract.method === 'GET' ? {} : { 'idempotency-key': idempotencyKey ?? crypto.randomUUID() }),
      ...(body === undefined ? {} : { 'content-type': 'application/json' }),
    },
    body: body === undefined ? undefined : JSON.stringify(body),
  });
  if (!response.ok) throw await readProblem(response);
  if (response.status === 204) return undefined as z.output<Called['reply']>;
  const isJson = response.headers.get('content-type')?.includes('json') ?? false;
  const reply: unknown = isJson ? await response.json() : await response.text();
  return contract.reply.parse(reply) as z.output<Called['reply']>;
}

interface LooseInput {
  readonly params?: Readonly<Record<string, string>>;
  readonly query?: Readonly<Record<string, string | number | undefined>>;
  readonly body?: unknown;
  readonly signal?: AbortSignal;
  readonly idempotencyKey?: string;
}

/** The address of a contract, for links and downloads too. */
export function addressOf(
  contract: Pick<Endpoint, 'path'>,
  params: Readonly<Record<string, string>> = {},
  query: Readonly<Record<string, string | number | undefined>> = {},
): string {
  const path = contract.path.replaceAll(/:(\w+)/g, (_all, name: string) => encodeURIComponent(params[name] ?? ''));
  const search = new URLSearchParams();
  for (const [key, value] of Object.entries(query)) if (value !== undefined) search.set(key, String(value));
  const tail = search.toString();
  return tail === '' ? path : `${path}?${tail}`;
}

/** A lost connection is told apart from an answer. */
export async function send(address: string, init: RequestInit): Promise<Response> {
  try {
    return await fetch(address, { credentials: 'same-origin', ...init });
  } catch (error) {
    if (error instanceof DOMException && error.name === 'AbortError') throw error;
    throw new Unreachable();
  }
}
