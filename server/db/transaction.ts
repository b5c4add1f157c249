import type { Database, OpenDatabase } from './connect.ts';

/**
 * Runs `work` in one transaction, and all of it again where the database asks for that: two writers met
 * (1020, 1213), or one waited too long for the other (1205).
 */
export async function inTransaction<Result>(
  db: OpenDatabase,
  work: (tx: Database) => Promise<Result>,
): Promise<Result> {
  for (let attempt = 1; ; attempt++) {
    try {
      return await db.transaction(work);
    } catch (error) {
      if (attempt === MOST_ATTEMPTS || !ASKS_FOR_RETRY.has(errnoOf(error) ?? 0)) throw error;
      await new Promise((resolve) => setTimeout(resolve, Math.random() * 20 * 2 ** attempt));
    }
  }
}

/** A view of many tables at one instant, without locks. */
export function inSnapshot<Result>(db: OpenDatabase, read: (tx: Database) => Promise<Result>): Promise<Result> {
  return db.transaction(read, { isolationLevel: 'repeatable read', accessMode: 'read only' });
}

/** MariaDB's error number, through the wrapper that Drizzle puts around it. */
export function errnoOf(error: unknown): number | undefined {
  for (let at = error; at instanceof Error; at = at.cause) {
    const errno = (at as Error & { errno?: unknown }).errno;
    if (typeof errno === 'number' && errno > 0) return errno;
  }
  return undefined;
}

export function isDuplicate(error: unknown): boolean {
  return errnoOf(error) === 1062;
}

const MOST_ATTEMPTS = 5;
const ASKS_FOR_RETRY: ReadonlySet<number> = new Set([1020, 1205, 1213]);
