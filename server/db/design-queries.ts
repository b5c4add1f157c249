import { and, eq, inArray, sql } from 'drizzle-orm';

import { FAMILIES, FORMAT, FORMAT_VERSION, type Design, type Family } from '#shared/model/design.ts';

import type { Database } from './connect.ts';
import {
  accepted,
  cable,
  design,
  designReference,
  device,
  mode,
  note,
  run,
  sheet,
  zone,
  type FamilyTable,
} from './schema/designs.ts';

/** `accepted` differs from the others only in how long its keys may be. */
export const FAMILY_TABLES: Readonly<Record<Family, FamilyTable>> = {
  sheets: sheet,
  zones: zone,
  devices: device,
  runs: run,
  modes: mode,
  notes: note,
  cables: cable,
  accepted: accepted as unknown as FamilyTable,
};

export interface DesignRow {
  readonly seq: number;
  readonly vessel: unknown;
  readonly basis: unknown;
}

/** The design's row, locked until the transaction ends: changes of one design come one after another. */
export async function lockDesign(tx: Database, vesselId: string): Promise<DesignRow | undefined> {
  const [row] = await tx.select().from(design).where(eq(design.vesselId, vesselId)).for('update');
  return row;
}

export async function readDesignRow(tx: Database, vesselId: string): Promise<DesignRow | undefined> {
  const [row] = await tx.select().from(design).where(eq(design.vesselId, vesselId));
  return row;
}

/** The whole document. Call it in a snapshot, so that all of it is of one instant. */
export async function readWholeDesign(
  tx: Database,
  vesselId: string,
): Promise<{ seq: number; design: Design } | undefined> {
  const row = await readDesignRow(tx, vesselId);
  if (row === undefined) return undefined;
  const families: Partial<Record<Family, Record<string, unknown>>> = {};
  for (const family of FAMILIES) {
    const entities = await readFamily(tx, vesselId, family);
    if (entities.size > 0 || !OPTIONAL.has(family)) families[family] = Object.fromEntries(entities);
  }
  const document = {
    format: FORMAT,
    version: FORMAT_VERSION,
    ...(row.vessel === null ? {} : { vessel: row.vessel }),
    basis: row.basis,
    ...families,
  };
  return { seq: row.seq, design: document as unknown as Design };
}

export async function readFamily(tx: Database, vesselId: string, family: Family): Promise<Map<string, unknown>> {
  const table = FAMILY_TABLES[family];
  const rows = await tx
    .select({ id: table.id, body: table.body })
    .from(table)
    .where(eq(table.vesselId, vesselId))
    .orderBy(table.id);
  return new Map(rows.map(({ id, body }) => [id, body]));
}

export async function readEntities(
  tx: Database,
  vesselId: string,
  family: Family,
  ids: Iterable<string>,
): Promise<Map<string, unknown>> {
  const table = FAMILY_TABLES[family];
  const found = new Map<string, unknown>();
  for (const some of chunksOf([...ids])) {
    const rows = await tx
      .select({ id: table.id, body: table.body })
      .from(table)
      .where(and(eq(table.vesselId, vesselId), inArray(table.id, some)));
    for (const { id, body } of rows) found.set(id, body);
  }
  return found;
}

export async function countFamily(tx: Database, vesselId: string, family: Family): Promise<number> {
  const table = FAMILY_TABLES[family];
  const [row] = await tx
    .select({ n: sql<number>`count(*)` })
    .from(table)
    .where(eq(table.vesselId, vesselId));
  return row?.n ?? 0;
}

export async function writeEntities(
  tx: Database,
  vesselId: string,
  family: Family,
  seq: number,
  entities: readonly (readonly [id: string, body: unknown])[],
): Promise<void> {
  const table = FAMILY_TABLES[family];
  for (const some of chunksOf(entities)) {
    await tx
      .insert(table)
      .values(some.map(([id, body]) => ({ vesselId, id, seq, body })))
      .onDuplicateKeyUpdate({ set: { seq, body: sql`values(body)` } });
  }
}

export async function deleteEntities(
  tx: Database,
  vesselId: string,
  family: Family,
  ids: readonly string[],
): Promise<void> {
  const table = FAMILY_TABLES[family];
  for (const some of chunksOf(ids)) {
    await tx.delete(table).where(and(eq(table.vesselId, vesselId), inArray(table.id, some)));
  }
}

export interface ReferenceRow {
  readonly family: string;
  readonly entityId: string;
  readonly toFamily: string;
  readonly toId: string;
}

export async function readReferencesTo(
  tx: Database,
  vesselId: string,
  toFamily: Family,
  ids: Iterable<string>,
): Promise<ReferenceRow[]> {
  const found: ReferenceRow[] = [];
  for (const some of chunksOf([...ids])) {
    const rows = await tx
      .select({
        family: designReference.family,
        entityId: designReference.entityId,
        toFamily: designReference.toFamily,
        toId: designReference.toId,
      })
      .from(designReference)
      .where(
        and(
          eq(designReference.vesselId, vesselId),
          eq(designReference.toFamily, toFamily),
          inArray(designReference.toId, some),
        ),
      );
    found.push(...rows);
  }
  return found;
}

export async function deleteReferencesOf(
  tx: Database,
  vesselId: string,
  family: Family,
  ids: readonly string[],
): Promise<void> {
  for (const some of chunksOf(ids)) {
    await tx
      .delete(designReference)
      .where(
        and(
          eq(designReference.vesselId, vesselId),
          eq(designReference.family, family),
          inArray(designReference.entityId, some),
        ),
      );
  }
}

export async function insertReferences(tx: Database, vesselId: string, rows: readonly ReferenceRow[]): Promise<void> {
  for (const some of chunksOf(rows)) {
    await tx.insert(designReference).values(some.map((row) => ({ vesselId, ...row })));
  }
}

const OPTIONAL: ReadonlySet<Family> = new Set(['cables', 'accepted']);

/** One statement's worth: well under the 65,535 placeholders and the packet size that MariaDB takes. */
function chunksOf<Item>(items: readonly Item[], size = 500): Item[][] {
  return Array.from({ length: Math.ceil(items.length / size) }, (_, i) => items.slice(i * size, (i + 1) * size));
}
