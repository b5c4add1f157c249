import { queryOptions, type QueryClient } from '@tanstack/react-query';

import { getMe, getServerFacts, type Me } from '#shared/api/me.ts';

import { call, send } from './call.ts';
import { ProblemError, readProblem, Unreachable } from './problem-error.ts';

/** Who is signed in, or null. Kept until something says otherwise. */
export const meQuery = queryOptions({
  queryKey: ['me'],
  queryFn: async ({ signal }): Promise<Me | null> => {
    try {
      return await call(getMe, { signal });
    } catch (error) {
      if (error instanceof ProblemError && error.code === 'not-signed-in') return null;
      throw error;
    }
  },
  staleTime: 60_000,
});

export const serverFactsQuery = queryOptions({
  queryKey: ['server'],
  queryFn: ({ signal }) => call(getServerFacts, { signal }),
  staleTime: Number.POSITIVE_INFINITY,
});

/** Null when it worked, else the sentence that says why not. */
export type SignInAnswer = string | null;

export async function signIn(email: string, password: string): Promise<SignInAnswer> {
  const answer = await ask('sign-in/email', { email, password });
  if (answer.ok) return null;
  if (answer.code === 'EMAIL_NOT_VERIFIED') {
    return 'This address is not confirmed yet. Open the link in the mail we sent; a new one is on its way.';
  }
  if (answer.status === 401 || answer.status === 400 || answer.status === 403) {
    return 'This e-mail and password do not go together.';
  }
  return answer.says;
}

/** The same answer whether or not the address is known: a mail goes out, and what it says is for its reader only. */
export async function signUp(name: string, email: string, password: string): Promise<SignInAnswer> {
  const answer = await ask('sign-up/email', { name, email, password, callbackURL: '/confirm' });
  return answer.ok ? null : answer.says;
}

export async function sendConfirmation(email: string): Promise<SignInAnswer> {
  const answer = await ask('send-verification-email', { email, callbackURL: '/confirm' });
  return answer.ok ? null : answer.says;
}

export async function askForReset(email: string): Promise<SignInAnswer> {
  const answer = await ask('request-password-reset', { email, redirectTo: '/reset' });
  return answer.ok ? null : answer.says;
}

export async function resetPassword(token: string, newPassword: string): Promise<SignInAnswer> {
  const answer = await ask('reset-password', { token, newPassword });
  if (answer.ok) return null;
  if (answer.code === 'INVALID_TOKEN') return 'This link has been used or is too old. Ask for a new one.';
  return answer.says;
}

/** Confirms an address with the token of its mail. */
export async function confirmEmail(token: string): Promise<SignInAnswer> {
  const response = await send(`/api/auth/verify-email?token=${encodeURIComponent(token)}`, {
    headers: { accept: 'application/json' },
    redirect: 'manual',
  });
  if (response.ok || response.type === 'opaqueredirect') return null;
  return 'This link has been used or is too old. Sign in to get a new one.';
}

/** Ends the session and forgets everything that was read with it. */
export async function signOut(client: QueryClient): Promise<void> {
  await ask('sign-out', {});
  client.clear();
}

interface Asked {
  readonly ok: boolean;
  readonly status: number;
  readonly code: string | null;
  readonly says: string;
}

async function ask(path: string, body: unknown): Promise<Asked> {
  try {
    const response = await send(`/api/auth/${path}`, {
      method: 'POST',
      headers: { 'content-type': 'application/json', accept: 'application/json' },
      body: JSON.stringify(body),
    });
    if (response.ok) return { ok: true, status: response.status, code: null, says: '' };
    const { problem } = await readProblem(response);
    return { ok: false, status: response.status, code: problem.reason ?? null, says: problem.detail };
  } catch (error) {
    if (error instanceof Unreachable) {
      return {
        ok: false,
        status: 0,
        code: null,
        says: 'The server cannot be reached. Try again when there is a signal.',
      };
    }
    throw error;
  }
}
