import type { Request, RequestHandler } from 'express';
import { rateLimit } from 'express-rate-limit';
import helmet from 'helmet';

import { Forbidden, Invalid, TooManyRequests } from '#server/refusals.ts';

import type { Configuration } from './configuration.ts';
import { ADDRESS_HEADER } from './sign-in.ts';

/** Headers that keep a browser from running or showing what is not ours. Off for scripts in development, where Vite writes inline ones. */
export function guardBrowser(configuration: Configuration): RequestHandler {
  const isHttps = configuration.publicUrl.startsWith('https:');
  return helmet({
    contentSecurityPolicy:
      configuration.mode === 'development'
        ? false
        : {
            useDefaults: false,
            directives: {
              defaultSrc: ["'self'"],
              baseUri: ["'none'"],
              scriptSrc: ["'self'", "'wasm-unsafe-eval'"],
              styleSrc: ["'self'", "'unsafe-inline'"],
              imgSrc: ["'self'", 'data:', 'blob:'],
              fontSrc: ["'self'", 'data:'],
              connectSrc: ["'self'", 'data:', 'blob:'],
              workerSrc: ["'self'", 'blob:'],
              objectSrc: ["'none'"],
              frameAncestors: ["'none'"],
              formAction: ["'self'"],
              ...(isHttps ? { upgradeInsecureRequests: [] } : {}),
            },
          },
    strictTransportSecurity: isHttps ? { maxAge: 31_536_000, includeSubDomains: true } : false,
    referrerPolicy: { policy: 'same-origin' },
    // Asks for a secure context; on plain http it only warns in the console.
    crossOriginOpenerPolicy: isHttps ? { policy: 'same-origin' } : false,
    originAgentCluster: isHttps,
  });
}

/**
 * A write comes from our own pages or from no browser at all. Browsers say where a request comes from by
 * `Sec-Fetch-Site` and `Origin`; both must say here.
 */
export function guardWrites(configuration: Configuration): RequestHandler {
  const home = new URL(configuration.publicUrl);
  const origins = new Set([home.origin]);
  if (isLoopbackName(home.hostname)) {
    for (const name of ['localhost', '127.0.0.1', '[::1]']) origins.add(`${home.protocol}//${name}:${home.port}`);
  }
  return (request, _response, next) => {
    if (request.method === 'GET' || request.method === 'HEAD' || request.method === 'OPTIONS') {
      next();
      return;
    }
    const site = request.get('Sec-Fetch-Site');
    const origin = request.get('Origin');
    const isForeign = site !== undefined && site !== 'same-origin' && site !== 'none';
    if (isForeign || (origin !== undefined && !origins.has(origin))) {
      throw new Forbidden('This came from another site and was refused.');
    }
    next();
  };
}

/** Who calls by address, as this server sees it: what a caller writes of itself is overwritten. */
export const noteAddress: RequestHandler = (request, _response, next) => {
  request.headers[ADDRESS_HEADER] = request.ip ?? '';
  next();
};

/** Far above what a person does; it stops a script that runs away. */
export function limitRequests(): RequestHandler {
  return rateLimit({
    windowMs: 60_000,
    limit: 3_000,
    standardHeaders: 'draft-8',
    legacyHeaders: false,
    keyGenerator: (request) => request.ip ?? '',
    validate: false,
    handler: (_request, _response, next) => next(new TooManyRequests()),
  });
}

/** JSON nested deeper than anything of ours is refused before a recursive reader meets it. */
export const limitDepth: RequestHandler = (request, _response, next) => {
  if (isDeeperThan(request.body, MOST_DEPTH)) throw new Invalid(`That is nested more than ${MOST_DEPTH} deep.`);
  next();
};

const MOST_DEPTH = 40;

function isDeeperThan(value: unknown, most: number): boolean {
  let level: unknown[] = [value];
  for (let depth = 0; depth <= most; depth++) {
    level = level.flatMap((at) => (typeof at === 'object' && at !== null ? Object.values(at) : []));
    if (level.length === 0) return false;
  }
  return true;
}

/** From this machine itself: the connection, the name asked for, and nothing passed on by a proxy. */
export function isFromLoopback(request: Request): boolean {
  const address = request.socket.remoteAddress ?? '';
  const isLocal = address === '127.0.0.1' || address === '::1' || address === '::ffff:127.0.0.1';
  const isPassedOn = ['x-forwarded-for', 'forwarded', 'x-real-ip', 'via'].some(
    (name) => request.headers[name] !== undefined,
  );
  return isLocal && !isPassedOn && isLoopbackName(request.hostname);
}

function isLoopbackName(name: string): boolean {
  return name === 'localhost' || name === '127.0.0.1' || name === '::1' || name === '[::1]';
}
