import { join } from 'node:path';

import { ROOT } from './run.mjs';
import { Stopped } from './stopped.mjs';

/** What the environment says about a local start. The server checks all else itself (server/http/configuration.ts). */
export function readStartSettings(env = process.env) {
  const port = Number(env.PORT || 4310);
  if (!Number.isInteger(port) || port < 1 || port > 65_535) {
    throw new Stopped(`PORT is "${env.PORT}"; it must be a whole number from 1 to 65535.`);
  }
  const host = env.HOST || '127.0.0.1';
  return {
    port,
    host,
    address: env.PUBLIC_URL || `http://${host === '0.0.0.0' || host === '::' ? '127.0.0.1' : host}:${port}`,
    dataFolder: env.AMPWRIGHT_DATA || join(ROOT, '.data'),
    outsideDatabase: env.DATABASE_URL || undefined,
  };
}
