import { and, eq, gt, inArray } from 'drizzle-orm';
import type { Logger } from 'pino';

import type { LoggedChange } from '#shared/api/design.ts';
import type { OpenDatabase } from '#server/db/connect.ts';
import { readChangesSince } from '#server/db/change-log-queries.ts';
import { session } from '#server/db/schema/accounts.ts';
import { design } from '#server/db/schema/designs.ts';

export interface Reader {
  readonly vesselId: string;
  /** The last number this reader has. */
  seq: number;
  /** Asked before each message: false ends the stream. */
  mayStillRead(): Promise<boolean>;
  tell(change: LoggedChange): void;
  end(): void;
}

/**
 * Tells readers of the designs they watch. The database does not notify, so one poller a process asks it for the
 * numbers of all watched designs a few times a second, whoever made the change and through whichever process.
 */
export interface NewsDesk {
  watch(reader: Reader): () => void;
  close(): void;
}

const PAUSE_MS = 250;

export function openNewsDesk(db: OpenDatabase, log: Logger): NewsDesk {
  const readers = new Set<Reader>();
  let isClosed = false;
  let timer: NodeJS.Timeout | undefined;

  const poll = async () => {
    timer = undefined;
    try {
      const numbers = await readNumbers(db, new Set([...readers].map((reader) => reader.vesselId)));
      await Promise.all([...readers].map((reader) => serveReader(db, reader, numbers.get(reader.vesselId))));
    } catch (error) {
      // The database is away for a moment: nobody has missed anything, each reader goes on from its own number.
      log.debug({ err: error }, 'news could not be read');
    }
    schedule();
  };
  const schedule = () => {
    if (!isClosed && readers.size > 0 && timer === undefined) timer = setTimeout(() => void poll(), PAUSE_MS);
  };

  return {
    watch(reader) {
      if (isClosed) reader.end();
      else readers.add(reader);
      schedule();
      return () => readers.delete(reader);
    },
    close() {
      isClosed = true;
      clearTimeout(timer);
      for (const reader of readers) reader.end();
      readers.clear();
    },
  };
}

/** Whether a session is still open: it may be ended from elsewhere while a stream runs. */
export async function isSessionOpen(db: OpenDatabase, sessionId: string): Promise<boolean> {
  const [row] = await db
    .select({ id: session.id })
    .from(session)
    .where(and(eq(session.id, sessionId), gt(session.expiresAt, new Date())));
  return row !== undefined;
}

async function readNumbers(db: OpenDatabase, vesselIds: ReadonlySet<string>): Promise<Map<string, number>> {
  if (vesselIds.size === 0) return new Map();
  const rows = await db
    .select({ vesselId: design.vesselId, seq: design.seq })
    .from(design)
    .where(inArray(design.vesselId, [...vesselIds]));
  return new Map(rows.map((row) => [row.vesselId, row.seq]));
}

async function serveReader(db: OpenDatabase, reader: Reader, now: number | undefined): Promise<void> {
  if (now === undefined) {
    reader.end();
    return;
  }
  if (now <= reader.seq) return;
  const { changes } = await readChangesSince(db, reader.vesselId, reader.seq);
  for (const change of changes) {
    if (!(await reader.mayStillRead())) {
      reader.end();
      return;
    }
    reader.tell(change);
    reader.seq = change.seq;
  }
}
