import { hash, verify } from '@node-rs/argon2';
import { betterAuth } from 'better-auth/minimal';
import { drizzleAdapter } from 'better-auth/adapters/drizzle';
import { APIError, createAuthMiddleware } from 'better-auth/api';
import { fromNodeHeaders } from 'better-auth/node';
import type { Request as ExpressRequest, Response as ExpressResponse } from 'express';
import type { Logger } from 'pino';

import type { OpenDatabase } from '#server/db/connect.ts';
import { newId } from '#server/db/ids.ts';
import { credential, person, rateLimit, session, verification } from '#server/db/schema/accounts.ts';
import { queueMail } from '#server/mail/outbox.ts';
import { alreadyKnownMail, confirmMail, resetMail } from '#server/mail/letters.ts';
import { isLockedOut, noteFailedSignIn } from '#server/services/failed-sign-ins.ts';
import { makeOwnShop } from '#server/services/make-own-shop.ts';

import type { Configuration } from './configuration.ts';

export interface Caller {
  readonly personId: string;
  readonly name: string;
  readonly email: string;
  /** Of the session, so that a long answer can ask again whether it still holds. */
  readonly sessionId: string;
}

export interface SignIn {
  /** Answers a request to one of the sign-in package's own addresses. */
  handle(request: Request): Promise<Response>;
  /** A session in use is made to last longer; the cookie that says so goes with the response. */
  readCaller(request: ExpressRequest, response: ExpressResponse): Promise<Caller | undefined>;
  /** The cookies of a new session, for someone who has just set this password. */
  signInAgain(request: ExpressRequest, email: string, password: string): Promise<string[]>;
}

export const LEAST_PASSWORD = 12;
export const MOST_PASSWORD = 256;
/** Set by this server on each request, whatever came from outside. */
export const ADDRESS_HEADER = 'x-caller-address';

/** argon2id with what OWASP names as least: 19 MiB, two passes. */
export function hashPassword(password: string): Promise<string> {
  return hash(password.normalize('NFKC'), { memoryCost: 19_456, timeCost: 2, parallelism: 1 });
}

export function openSignIn(db: OpenDatabase, configuration: Configuration, log: Logger): SignIn {
  const auth = makeAuth(db, configuration, log);
  return {
    handle: (request) => auth.handler(request),
    async readCaller(request, response) {
      if (request.headers.cookie === undefined) return undefined;
      const { response: found, headers } = await auth.api.getSession({
        headers: fromNodeHeaders(request.headers),
        returnHeaders: true,
      });
      for (const cookie of headers.getSetCookie()) response.append('Set-Cookie', cookie);
      if (found === null) return undefined;
      return {
        personId: found.user.id,
        name: found.user.name,
        email: found.user.email,
        sessionId: found.session.id,
      };
    },
    async signInAgain(request, email, password) {
      const headers = new Headers({
        [ADDRESS_HEADER]: request.ip ?? '',
        'user-agent': request.get('user-agent') ?? '',
      });
      const answer = await auth.api.signInEmail({ body: { email, password }, headers, asResponse: true });
      return answer.headers.getSetCookie();
    },
  };
}

function makeAuth(db: OpenDatabase, configuration: Configuration, log: Logger) {
  const { publicUrl } = configuration;
  const { protocol, hostname, port } = new URL(publicUrl);
  return betterAuth({
    appName: 'Ampwright',
    baseURL: publicUrl,
    basePath: '/api/auth',
    secret: configuration.authSecret,
    trustedOrigins: [new URL(publicUrl).origin],
    database: drizzleAdapter(db, {
      provider: 'mysql',
      schema: { user: person, session, account: credential, verification, rateLimit },
    }),
    emailAndPassword: {
      enabled: true,
      requireEmailVerification: true,
      minPasswordLength: LEAST_PASSWORD,
      maxPasswordLength: MOST_PASSWORD,
      revokeSessionsOnPasswordReset: true,
      resetPasswordTokenExpiresIn: 60 * 60,
      password: {
        hash: hashPassword,
        verify: ({ hash: kept, password }) => verify(kept, password.normalize('NFKC')),
      },
      sendResetPassword: ({ user, token }) => queueMail(db, resetMail(publicUrl, user, token)),
      // Whoever has an account already is told by mail; the answer on screen is the same for all.
      onExistingUserSignUp: ({ user }) => queueMail(db, alreadyKnownMail(publicUrl, user)),
    },
    emailVerification: {
      sendOnSignUp: true,
      sendOnSignIn: true,
      autoSignInAfterVerification: true,
      expiresIn: 24 * 60 * 60,
      sendVerificationEmail: ({ user, token }) => queueMail(db, confirmMail(publicUrl, user, token)),
      afterEmailVerification: async (user) => {
        await makeOwnShop(db, { personId: user.id, name: user.name });
      },
    },
    verification: { storeIdentifier: 'hashed' },
    session: { expiresIn: 30 * 24 * 60 * 60, updateAge: 24 * 60 * 60 },
    rateLimit: {
      enabled: true,
      storage: 'database',
      window: 60,
      max: 300,
      customRules: {
        '/sign-in/email': { window: 60, max: 60 },
        '/sign-up/email': { window: 60, max: 20 },
        '/request-password-reset': { window: 60, max: 10 },
        '/send-verification-email': { window: 60, max: 10 },
        '/reset-password': { window: 60, max: 20 },
      },
    },
    advanced: {
      database: { generateId: newId },
      // Cookies of one host are shared between its ports: each instance on a machine has its own name for them.
      cookiePrefix: port === '' ? 'ampwright' : `ampwright-${port}`,
      useSecureCookies: protocol === 'https:',
      defaultCookieAttributes: { httpOnly: true, sameSite: 'lax', path: '/' },
      ipAddress: { ipAddressHeaders: [ADDRESS_HEADER] },
    },
    hooks: {
      before: createAuthMiddleware(async (context) => {
        if (context.path === '/sign-up/email') checkName(context.body as { name?: unknown });
        if (context.path === '/sign-in/email') await refuseLockedOut(db, context.body as { email?: unknown });
      }),
      after: createAuthMiddleware(async (context) => {
        if (context.path !== '/sign-in/email') return;
        const { returned } = context.context;
        const { email } = context.body as { email?: unknown };
        if (returned instanceof APIError && returned.statusCode === 401 && typeof email === 'string') {
          await noteFailedSignIn(db, email);
        }
      }),
    },
    telemetry: { enabled: false },
    logger: {
      disabled: configuration.logLevel === 'silent',
      level: 'warn',
      log: (level, message) => log[level === 'warn' ? 'debug' : level]({ host: hostname }, `sign-in: ${message}`),
    },
  });
}

function checkName(body: { name?: unknown }): void {
  if (typeof body.name === 'string' && body.name.trim().length >= 1 && body.name.length <= 100) return;
  throw new APIError('BAD_REQUEST', { code: 'INVALID_NAME', message: 'A name has 1 to 100 characters.' });
}

async function refuseLockedOut(db: OpenDatabase, body: { email?: unknown }): Promise<void> {
  if (typeof body.email !== 'string' || !(await isLockedOut(db, body.email))) return;
  throw new APIError('TOO_MANY_REQUESTS', { code: 'TOO_MANY_TRIES', message: 'Too many wrong tries.' });
}
