import { and, eq, isNull, lte } from 'drizzle-orm';
import type { Logger } from 'pino';

import type { Database, OpenDatabase } from '#server/db/connect.ts';
import { newId } from '#server/db/ids.ts';
import { outbox } from '#server/db/schema/records.ts';
import { inTransaction } from '#server/db/transaction.ts';

import type { Letter } from './letters.ts';
import type { Mailer } from './mailer.ts';

/** Puts a mail where the worker finds it: in the transaction of what it tells of, so that neither is without the other. */
export async function queueMail(db: Database, letter: Letter): Promise<void> {
  const now = new Date();
  await db.insert(outbox).values({
    id: newId(),
    recipient: letter.to,
    subject: letter.subject,
    text: letter.text,
    madeAt: now,
    nextTryAt: now,
  });
}

/** Sends what is due until stopped. Several processes may each have one: a mail is held by whoever sends it. */
export function startMailWorker(db: OpenDatabase, mailer: Mailer, log: Logger): { stop(): Promise<void> } {
  let stopping = false;
  let wake: () => void = () => {};
  const work = async () => {
    while (!stopping) {
      const sent = await sendOne(db, mailer, log).catch((error: unknown) => {
        log.warn({ err: error }, 'the outbox can not be read');
        return false;
      });
      if (sent || stopping) continue;
      await new Promise<void>((resolve) => {
        const timer = setTimeout(resolve, PAUSE_MS);
        wake = () => {
          clearTimeout(timer);
          resolve();
        };
      });
    }
  };
  const working = work();
  return {
    async stop() {
      stopping = true;
      wake();
      await working;
      mailer.close();
    },
  };
}

/** One mail that is due, sent or put off. False when none is. */
export function sendOne(db: OpenDatabase, mailer: Mailer, log: Logger): Promise<boolean> {
  return inTransaction(db, async (tx) => {
    const now = new Date();
    const [mail] = await tx
      .select()
      .from(outbox)
      .where(and(isNull(outbox.sentAt), lte(outbox.nextTryAt, now)))
      .orderBy(outbox.nextTryAt)
      .limit(1)
      .for('update', { skipLocked: true });
    if (mail === undefined) return false;
    try {
      await mailer.send({ messageId: mail.id, to: mail.recipient, subject: mail.subject, text: mail.text });
      await tx.update(outbox).set({ sentAt: new Date(), nextTryAt: null, text: '' }).where(eq(outbox.id, mail.id));
    } catch (error) {
      const attempts = mail.attempts + 1;
      const reason = error instanceof Error ? error.message : String(error);
      log.warn({ mail: mail.id, attempts, reason }, 'a mail could not be sent');
      await tx
        .update(outbox)
        .set({ attempts, lastError: reason.slice(0, 255), nextTryAt: nextTry(attempts, now) })
        .where(eq(outbox.id, mail.id));
    }
    return true;
  });
}

const PAUSE_MS = 400;
const MOST_ATTEMPTS = 12;

/** Five seconds, then twice as long each time up to six hours; after twelve tries it is given up. */
function nextTry(attempts: number, now: Date): Date | null {
  if (attempts >= MOST_ATTEMPTS) return null;
  const waitS = Math.min(5 * 2 ** (attempts - 1), 6 * 60 * 60);
  return new Date(now.getTime() + waitS * 1000);
}
