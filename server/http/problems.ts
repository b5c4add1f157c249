import type { ErrorRequestHandler, Request, RequestHandler, Response } from 'express';

import type { Problem } from '#shared/api/problem.ts';
import { errnoOf } from '#server/db/transaction.ts';
import { Conflict, Invalid, NotFound, Refusal, Unavailable } from '#server/refusals.ts';

import { houseOf } from './house.ts';

/** The one place where what went wrong becomes an answer (RFC 9457). What is not a refusal of ours tells nothing of itself. */
export const answerProblem: ErrorRequestHandler = (error: unknown, request, response, next) => {
  if (response.headersSent) {
    next(error);
    return;
  }
  const refusal = refusalOf(error);
  if (refusal === undefined) {
    request.log?.error({ err: error }, 'a handler failed');
    houseOf(request).log.debug({ err: error }, 'a handler failed');
  }
  sendProblem(response, refusal === undefined ? UNEXPECTED : problemOf(refusal));
};

export const answerNothingHere: RequestHandler = (_request: Request, response: Response) => {
  sendProblem(response, problemOf(new NotFound()));
};

export function sendProblem(response: Response, problem: Problem): void {
  response
    .status(problem.status)
    .type('application/problem+json')
    .set('Cache-Control', 'no-store')
    .send(JSON.stringify(problem));
}

export function problemOf(refusal: Refusal): Problem {
  return {
    type: 'about:blank',
    title: refusal.title,
    status: refusal.status,
    code: refusal.code,
    detail: refusal.message,
    ...(refusal instanceof Invalid && refusal.field !== undefined ? { field: refusal.field } : {}),
    ...(refusal instanceof Conflict && refusal.conflicts !== undefined ? { conflicts: refusal.conflicts } : {}),
    ...(refusal instanceof Conflict && refusal.seq !== undefined ? { seq: refusal.seq } : {}),
  };
}

const UNEXPECTED: Problem = {
  type: 'about:blank',
  title: 'Something went wrong here',
  status: 500,
  code: 'internal',
  detail: 'The server failed at this. Nothing was changed; try again in a moment.',
};

/** Express's and the body parser's own errors carry a status; a database that is away is no fault of the request. */
function refusalOf(error: unknown): Refusal | undefined {
  if (error instanceof Refusal) return error;
  if (UNKEEPABLE.has(errnoOf(error) ?? 0)) return new Invalid('It holds text that can not be kept.');
  if (isDatabaseAway(error)) return new Unavailable('The database does not answer just now. Try again in a moment.');
  const status = error instanceof Error ? (error as Error & { status?: unknown }).status : undefined;
  if (typeof status !== 'number' || status < 400 || status > 499) return undefined;
  if (status === 413) return new Invalid('That is larger than this server takes.', undefined, 413);
  if (status === 404) return new NotFound();
  return new Invalid('The request can not be read.', undefined, status === 415 ? 415 : 400);
}

/** Half a character (4025: JSON that MariaDB finds invalid; 1366) and what is too long for its column (1406). */
const UNKEEPABLE: ReadonlySet<number> = new Set([4025, 1366, 1406]);

const AWAY: ReadonlySet<string> = new Set([
  'ECONNREFUSED',
  'ECONNRESET',
  'ETIMEDOUT',
  'EPIPE',
  'ENOTFOUND',
  'PROTOCOL_CONNECTION_LOST',
  'ER_CON_COUNT_ERROR',
  'ER_SERVER_SHUTDOWN',
]);

function isDatabaseAway(error: unknown): boolean {
  for (let at = error; at instanceof Error; at = at.cause) {
    const code = (at as Error & { code?: unknown }).code;
    if (typeof code === 'string' && AWAY.has(code)) return true;
  }
  return false;
}
