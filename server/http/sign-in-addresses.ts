import express, { type Request as ExpressRequest, Router } from 'express';

import type { Problem } from '#shared/api/problem.ts';
import { NotFound } from '#server/refusals.ts';

import { houseOf } from './house.ts';
import { problemOf, sendProblem } from './problems.ts';
import { ADDRESS_HEADER } from './sign-in.ts';

/** The sign-in package's own addresses, by name. It has many more, and they answer as if they did not exist. */
export const SIGN_IN_ADDRESSES = [
  { method: 'POST', path: '/api/auth/sign-up/email' },
  { method: 'POST', path: '/api/auth/sign-in/email' },
  { method: 'POST', path: '/api/auth/sign-out' },
  { method: 'POST', path: '/api/auth/request-password-reset' },
  { method: 'POST', path: '/api/auth/reset-password' },
  { method: 'GET', path: '/api/auth/verify-email' },
  { method: 'POST', path: '/api/auth/send-verification-email' },
] as const;

export const signInRoutes = Router();

signInRoutes.all('/api/auth/{*any}', express.json({ limit: '16kb', type: () => true }), async (request, response) => {
  const address = SIGN_IN_ADDRESSES.find(({ method, path }) => method === request.method && path === request.path);
  if (address === undefined) throw new NotFound();
  const answer = await houseOf(request).signIn.handle(toWebRequest(request));
  for (const cookie of answer.headers.getSetCookie()) response.append('Set-Cookie', cookie);
  response.set('Cache-Control', 'no-store');
  if (answer.status >= 400) {
    sendProblem(response, problemFrom(answer.status, await answer.text()));
    return;
  }
  // What the package tells of the session and the account stays here: the cookie and `/api/me` are enough, and
  // signing up answers the same whether there was such an account or not.
  response.json({ done: true });
});

/** Read, limited and checked for its origin already: what goes on carries our own address and nothing else's. */
function toWebRequest(request: ExpressRequest): Request {
  const { publicUrl } = houseOf(request).configuration;
  const headers = new Headers({ origin: new URL(publicUrl).origin, [ADDRESS_HEADER]: request.ip ?? '' });
  for (const name of ['cookie', 'user-agent']) {
    const value = request.get(name);
    if (value !== undefined) headers.set(name, value);
  }
  const url = new URL(request.path, publicUrl);
  // The one thing that comes by address. Where to go afterwards is for our pages to say, never for a link.
  if (typeof request.query['token'] === 'string') url.searchParams.set('token', request.query['token']);
  if (request.method === 'GET') return new Request(url, { headers });
  headers.set('content-type', 'application/json');
  return new Request(url, { method: request.method, headers, body: JSON.stringify(request.body ?? {}) });
}

/** The package's answer as a problem of ours, with its own word as the reason. */
function problemFrom(status: number, text: string): Problem {
  const { code: reason, message } = parse(text);
  if (status === 404) return problemOf(new NotFound());
  const kind =
    status === 401
      ? { code: 'not-signed-in' as const, title: 'Not signed in' }
      : status === 403
        ? { code: 'forbidden' as const, title: 'Not allowed' }
        : status === 429
          ? { code: 'too-many-requests' as const, title: 'Too many requests' }
          : status >= 500
            ? { code: 'internal' as const, title: 'Something went wrong here' }
            : { code: 'invalid' as const, title: 'That can not be done as it was sent' };
  const detail = SENTENCES[reason ?? ''] ?? BY_STATUS[status] ?? message ?? 'The request can not be read.';
  return { type: 'about:blank', status, ...kind, detail, ...(reason === undefined ? {} : { reason }) };
}

const SENTENCES: Readonly<Record<string, string>> = {
  INVALID_EMAIL_OR_PASSWORD: 'E-mail address or password is wrong.',
  EMAIL_NOT_VERIFIED: 'This address is not confirmed yet. A new mail with the link is on its way.',
  INVALID_TOKEN: 'This link is not good, or was used already. Ask for a new one.',
  TOKEN_EXPIRED: 'This link has expired. Ask for a new one.',
  PASSWORD_TOO_SHORT: 'A password has at least 12 characters.',
  PASSWORD_TOO_LONG: 'A password has at most 256 characters.',
  INVALID_EMAIL: 'That is no e-mail address.',
  INVALID_NAME: 'A name has 1 to 100 characters.',
  TOO_MANY_TRIES: 'Too many wrong tries. Wait a quarter of an hour, or set a new password.',
};

const BY_STATUS: Readonly<Record<number, string>> = {
  429: 'That was asked too often. Wait a little and try again.',
  500: 'The server failed at this. Nothing was changed; try again in a moment.',
};

function parse(text: string): { code?: string; message?: string } {
  try {
    const body: unknown = JSON.parse(text);
    return typeof body === 'object' && body !== null ? body : {};
  } catch {
    return {};
  }
}
