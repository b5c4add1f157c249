import { and, asc, desc, eq, gt, inArray, isNotNull, isNull, or, sql, type SQL } from 'drizzle-orm';

import type { Role } from '#shared/access/matrix.ts';
import type { Basis, Vessel } from '#shared/model/design.ts';

import type { Database } from './connect.ts';
import { person } from './schema/accounts.ts';
import { changeLog, design, device, revision, run, sheet } from './schema/designs.ts';
import { shop, shopMember } from './schema/shops.ts';
import { vessel, vesselMember } from './schema/vessels.ts';

export const DAYS_TO_BRING_BACK = 30;

export interface VesselRow {
  readonly vesselId: string;
  readonly shopId: string;
  readonly shopName: string;
  readonly name: string;
  readonly archivedAt: Date | null;
  readonly deletedAt: Date | null;
  readonly role: Role | null;
  readonly admin: boolean | null;
  readonly vessel: Vessel | null;
  readonly basis: Basis;
  readonly seq: number;
}

export type ListedState = 'active' | 'archived' | 'deleted';

/** The vessels a person may see, by name. Deleted ones only whoever could bring them back. */
export async function readVesselPage(
  db: Database,
  asked: { personId: string; state: ListedState; after: string | undefined; limit: number },
): Promise<{ rows: VesselRow[]; total: number; next: string | null }> {
  const theirs = and(isTheirs(), isIn(asked.state));
  const [count] = await db
    .select({ n: sql<number>`count(*)` })
    .from(vessel)
    .leftJoin(vesselMember, ownRole(asked.personId))
    .leftJoin(shopMember, ownMembership(asked.personId))
    .where(theirs);
  const cursor = readCursor(asked.after);
  const found = await selectVessels(db, asked.personId)
    .where(and(theirs, cursor === undefined ? undefined : isAfter(cursor)))
    .orderBy(asc(vessel.name), asc(vessel.id))
    .limit(asked.limit + 1);
  const rows = found.slice(0, asked.limit) as VesselRow[];
  const last = found.length > asked.limit ? rows.at(-1) : undefined;
  return { rows, total: count?.n ?? 0, next: last === undefined ? null : writeCursor(last) };
}

export async function readVesselRow(db: Database, vesselId: string, personId: string): Promise<VesselRow | undefined> {
  const [row] = await selectVessels(db, personId).where(eq(vessel.id, vesselId));
  return row as VesselRow | undefined;
}

export interface VesselFacts {
  readonly drawn: { readonly sheets: number; readonly devices: number; readonly runs: number };
  readonly revision: { readonly letter: string; readonly issuedAt: Date } | undefined;
  readonly lastChange: { readonly at: Date; readonly by: string; readonly label: string } | undefined;
  readonly people: readonly { readonly name: string; readonly role: Role }[];
}

/** What the list tells of each vessel besides its row. */
export async function readVesselFacts(db: Database, vesselIds: readonly string[]): Promise<Map<string, VesselFacts>> {
  if (vesselIds.length === 0) return new Map();
  const ids = [...vesselIds];
  const [sheets, devices, runs] = [
    await countIn(db, sheet, ids),
    await countIn(db, device, ids),
    await countIn(db, run, ids),
  ];
  const issued = await db
    .select({ vesselId: revision.vesselId, letter: revision.letter, issuedAt: revision.issuedAt })
    .from(revision)
    .where(inArray(revision.vesselId, ids))
    .orderBy(desc(revision.number));
  const last = await db
    .select({ vesselId: design.vesselId, at: changeLog.at, by: person.name, label: changeLog.label })
    .from(design)
    .innerJoin(changeLog, and(eq(changeLog.vesselId, design.vesselId), eq(changeLog.seq, design.seq)))
    .innerJoin(person, eq(person.id, changeLog.personId))
    .where(inArray(design.vesselId, ids));
  const members = await db
    .select({ vesselId: vesselMember.vesselId, name: person.name, role: vesselMember.role })
    .from(vesselMember)
    .innerJoin(person, eq(person.id, vesselMember.personId))
    .where(inArray(vesselMember.vesselId, ids))
    .orderBy(asc(vesselMember.joinedAt), asc(person.name));
  return new Map(
    ids.map((id) => [
      id,
      {
        drawn: { sheets: sheets.get(id) ?? 0, devices: devices.get(id) ?? 0, runs: runs.get(id) ?? 0 },
        revision: issued.find((row) => row.vesselId === id),
        lastChange: last.find((row) => row.vesselId === id),
        people: members.filter((row) => row.vesselId === id),
      },
    ]),
  );
}

function selectVessels(db: Database, personId: string) {
  return db
    .select({
      vesselId: vessel.id,
      shopId: vessel.shopId,
      shopName: shop.name,
      name: vessel.name,
      archivedAt: vessel.archivedAt,
      deletedAt: vessel.deletedAt,
      role: vesselMember.role,
      admin: shopMember.admin,
      vessel: design.vessel,
      basis: design.basis,
      seq: design.seq,
    })
    .from(vessel)
    .innerJoin(shop, eq(shop.id, vessel.shopId))
    .innerJoin(design, eq(design.vesselId, vessel.id))
    .leftJoin(vesselMember, ownRole(personId))
    .leftJoin(shopMember, ownMembership(personId))
    .$dynamic();
}

function ownRole(personId: string): SQL | undefined {
  return and(eq(vesselMember.vesselId, vessel.id), eq(vesselMember.personId, personId));
}

function ownMembership(personId: string): SQL | undefined {
  return and(eq(shopMember.shopId, vessel.shopId), eq(shopMember.personId, personId));
}

function isTheirs(): SQL | undefined {
  return or(isNotNull(vesselMember.role), eq(shopMember.admin, true));
}

function isIn(state: ListedState): SQL | undefined {
  if (state === 'active') return and(isNull(vessel.deletedAt), isNull(vessel.archivedAt));
  if (state === 'archived') return and(isNull(vessel.deletedAt), isNotNull(vessel.archivedAt));
  const since = new Date(Date.now() - DAYS_TO_BRING_BACK * 24 * 60 * 60 * 1000);
  return and(gt(vessel.deletedAt, since), or(eq(vesselMember.role, 'designer'), eq(shopMember.admin, true)));
}

function isAfter(cursor: { name: string; vesselId: string }): SQL | undefined {
  return or(gt(vessel.name, cursor.name), and(eq(vessel.name, cursor.name), gt(vessel.id, cursor.vesselId)));
}

function writeCursor(row: VesselRow): string {
  return Buffer.from(JSON.stringify([row.name, row.vesselId])).toString('base64url');
}

/** A cursor that was not ours starts from the beginning. */
function readCursor(text: string | undefined): { name: string; vesselId: string } | undefined {
  if (text === undefined) return undefined;
  try {
    const value: unknown = JSON.parse(Buffer.from(text, 'base64url').toString());
    if (Array.isArray(value) && typeof value[0] === 'string' && typeof value[1] === 'string') {
      return { name: value[0], vesselId: value[1] };
    }
  } catch {
    return undefined;
  }
  return undefined;
}

async function countIn(db: Database, table: typeof device, ids: string[]): Promise<Map<string, number>> {
  const rows = await db
    .select({ vesselId: table.vesselId, n: sql<number>`count(*)` })
    .from(table)
    .where(inArray(table.vesselId, ids))
    .groupBy(table.vesselId);
  return new Map(rows.map((row) => [row.vesselId, row.n]));
}
