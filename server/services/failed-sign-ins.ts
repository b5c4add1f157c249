import { createHash } from 'node:crypto';

import { eq, sql } from 'drizzle-orm';

import type { Database } from '#server/db/connect.ts';
import { newId } from '#server/db/ids.ts';
import { rateLimit } from '#server/db/schema/accounts.ts';

const MOST_FAILURES = 10;
const WINDOW_MS = 15 * 60 * 1000;

/**
 * Wrong passwords for one address, from wherever they come: after ten in a row the address rests for a quarter of
 * an hour. Counted alike whether there is such an account or not.
 */
export async function isLockedOut(db: Database, email: string): Promise<boolean> {
  const [row] = await db
    .select()
    .from(rateLimit)
    .where(eq(rateLimit.key, keyOf(email)));
  return row !== undefined && row.count >= MOST_FAILURES && Date.now() - row.lastRequest < WINDOW_MS;
}

export async function noteFailedSignIn(db: Database, email: string): Promise<void> {
  const now = Date.now();
  await db
    .insert(rateLimit)
    .values({ id: newId(), key: keyOf(email), count: 1, lastRequest: now })
    .onDuplicateKeyUpdate({
      set: {
        count: sql`if(${rateLimit.lastRequest} < ${now - WINDOW_MS}, 1, ${rateLimit.count} + 1)`,
        lastRequest: now,
      },
    });
}

function keyOf(email: string): string {
  return `failed-sign-in|${createHash('sha256').update(email.trim().toLowerCase()).digest('hex')}`;
}
