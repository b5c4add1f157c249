import { lt } from 'drizzle-orm';
import type { Logger } from 'pino';

import type { OpenDatabase } from '#server/db/connect.ts';
import { vessel } from '#server/db/schema/vessels.ts';
import { DAYS_TO_BRING_BACK } from '#server/db/vessel-queries.ts';

const HOUR_MS = 60 * 60 * 1000;

/** What was deleted and not brought back in its days goes for good, with all that hangs on it. */
export async function clearDeletedVessels(db: OpenDatabase, now = new Date()): Promise<void> {
  const since = new Date(now.getTime() - DAYS_TO_BRING_BACK * 24 * HOUR_MS);
  await db.delete(vessel).where(lt(vessel.deletedAt, since));
}

export function startClearing(db: OpenDatabase, log: Logger): { stop(): void } {
  const clear = () => {
    clearDeletedVessels(db).catch((error: unknown) => log.warn({ err: error }, 'deleted vessels could not be cleared'));
  };
  const timer = setInterval(clear, HOUR_MS);
  timer.unref();
  return { stop: () => clearInterval(timer) };
}
