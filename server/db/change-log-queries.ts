import { and, eq, gt } from 'drizzle-orm';

import type { LoggedChange } from '#shared/api/design.ts';
import type { Patch } from '#shared/model/patch.ts';

import type { Database } from './connect.ts';
import { person } from './schema/accounts.ts';
import { changeLog } from './schema/designs.ts';

const MOST_AT_ONCE = 500;

export async function readChangesSince(
  db: Database,
  vesselId: string,
  since: number,
): Promise<{ changes: LoggedChange[]; more: boolean }> {
  const rows = await db
    .select({ log: changeLog, name: person.name })
    .from(changeLog)
    .innerJoin(person, eq(person.id, changeLog.personId))
    .where(and(eq(changeLog.vesselId, vesselId), gt(changeLog.seq, since)))
    .orderBy(changeLog.seq)
    .limit(MOST_AT_ONCE + 1);
  const changes = rows.slice(0, MOST_AT_ONCE).map(({ log, name }) => ({
    id: log.changeId,
    seq: log.seq,
    label: log.label,
    patches: log.patches as Patch[] as LoggedChange['patches'],
    by: { personId: log.personId, name },
    at: log.at.toISOString(),
  }));
  return { changes, more: rows.length > MOST_AT_ONCE };
}
