import { listChanges, makeChange, type Change, type LoggedChange } from '#shared/api/design.ts';
import { call } from '#src/lib/call.ts';
import { ProblemError } from '#src/lib/problem-error.ts';

import type { Sent, ServerDoor } from './server-door.ts';

/** The server's addresses of one vessel, with its answers sorted by what they mean for the queue. */
export function openVesselDoor(vesselId: string): ServerDoor {
  return {
    async send(change: Change): Promise<Sent> {
      try {
        const { seq } = await call(makeChange, { params: { vesselId }, body: change, idempotencyKey: change.id });
        return { said: 'kept', seq };
      } catch (error) {
        return sayWhy(error, change);
      }
    },
    async listSince(seq: number): Promise<readonly LoggedChange[] | null> {
      try {
        const changes: LoggedChange[] = [];
        for (;;) {
          const since = changes.at(-1)?.seq ?? seq;
          const page = await call(listChanges, { params: { vesselId }, query: { since } });
          changes.push(...page.changes);
          if (!page.more || page.changes.length === 0) return changes;
        }
      } catch {
        // Not to be had now: the stream or the next send finds out why, and the log is asked again then.
        return null;
      }
    },
  };
}

function sayWhy(error: unknown, change: Change): Sent {
  if (!(error instanceof ProblemError)) return { said: 'unreachable' };
  const { code, detail, conflicts, seq, status } = error.problem;
  if (code === 'not-signed-in') return { said: 'signed-out' };
  if (code === 'conflict') {
    return { said: 'conflict', seq: seq ?? change.base, conflicts: conflicts ?? [], reason: detail };
  }
  if (code === 'too-many-requests' || code === 'unavailable' || status >= 500) return { said: 'unreachable' };
  return { said: 'refused', reason: detail };
}
