import { index, int, json, mysqlTable, primaryKey, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';

import { person } from './accounts.ts';
import { entityKey, exactText, instant, uuid } from './columns.ts';
import { vessel } from './vessels.ts';

/** A vessel has one design. This row is its lock and its counter, and holds what it has one of. */
export const design = mysqlTable('design', {
  vesselId: uuid('vessel_id')
    .primaryKey()
    .references(() => vessel.id, { onDelete: 'cascade' }),
  seq: int('seq').notNull(),
  vessel: json('vessel'),
  basis: json('basis').notNull(),
});

/** A row an entity, a table a family: a save costs what changed, not the size of the design. */
export const sheet = familyTable('sheet');
export const zone = familyTable('zone');
export const device = familyTable('device');
export const run = familyTable('run');
export const mode = familyTable('mode');
export const note = familyTable('note');
export const cable = familyTable('cable');

/** Keyed by finding, which may be longer than an entity's key and hold any text. */
export const accepted = mysqlTable(
  'accepted',
  {
    vesselId: designKey(),
    id: exactText('id').notNull(),
    seq: int('seq').notNull(),
    body: json('body').notNull(),
  },
  (table) => [primaryKey({ columns: [table.vesselId, table.id] })],
);

/** Which entity names which: what may not be deleted while something hangs on it is found without reading all rows. */
export const designReference = mysqlTable(
  'design_reference',
  {
    vesselId: designKey(),
    family: varchar('family', { length: 16 }).notNull(),
    entityId: entityKey('entity_id').notNull(),
    toFamily: varchar('to_family', { length: 16 }).notNull(),
    toId: entityKey('to_id').notNull(),
  },
  (table) => [
    primaryKey({
      name: 'design_reference_key',
      columns: [table.vesselId, table.family, table.entityId, table.toFamily, table.toId],
    }),
    index('design_reference_to').on(table.vesselId, table.toFamily, table.toId),
  ],
);

/** Every change as it was acknowledged. Its own id makes sending it twice harmless. */
export const changeLog = mysqlTable(
  'change_log',
  {
    vesselId: designKey(),
    seq: int('seq').notNull(),
    changeId: uuid('change_id').notNull(),
    label: varchar('label', { length: 200 }).notNull(),
    patches: json('patches').notNull(),
    personId: uuid('person_id')
      .notNull()
      .references(() => person.id),
    at: instant('at').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.vesselId, table.seq] }),
    uniqueIndex('change_log_change').on(table.vesselId, table.changeId),
  ],
);

/** A frozen, lettered issue: the whole document as it was. */
export const revision = mysqlTable(
  'revision',
  {
    id: uuid('id').primaryKey(),
    vesselId: designKey(),
    number: int('number').notNull(),
    letter: varchar('letter', { length: 2 }).notNull(),
    note: varchar('note', { length: 500 }),
    issuedBy: uuid('issued_by')
      .notNull()
      .references(() => person.id),
    issuedAt: instant('issued_at').notNull(),
    seq: int('seq').notNull(),
    design: json('design').notNull(),
  },
  (table) => [uniqueIndex('revision_number').on(table.vesselId, table.number)],
);

export type FamilyTable = typeof device;

function familyTable(name: string) {
  return mysqlTable(
    name,
    {
      vesselId: designKey(),
      id: entityKey('id').notNull(),
      seq: int('seq').notNull(),
      body: json('body').notNull(),
    },
    (table) => [primaryKey({ columns: [table.vesselId, table.id] })],
  );
}

function designKey() {
  return uuid('vessel_id')
    .notNull()
    .references(() => design.vesselId, { onDelete: 'cascade' });
}
