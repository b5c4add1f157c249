import { index, mysqlEnum, mysqlTable, primaryKey, uniqueIndex, varchar } from 'drizzle-orm/mysql-core';

import { person } from './accounts.ts';
import { exactText, instant, uuid } from './columns.ts';
import { shop } from './shops.ts';

const roles = ['designer', 'installer', 'reviewer', 'owner'] as const;

/** `name` follows the name in the vessel's design, which is the one truth, so that the list can sort by it. */
export const vessel = mysqlTable(
  'vessel',
  {
    id: uuid('id').primaryKey(),
    shopId: uuid('shop_id')
      .notNull()
      .references(() => shop.id),
    name: varchar('name', { length: 100 }).notNull(),
    createdBy: uuid('created_by')
      .notNull()
      .references(() => person.id),
    createdAt: instant('created_at').notNull(),
    archivedAt: instant('archived_at'),
    deletedAt: instant('deleted_at'),
  },
  (table) => [index('vessel_shop').on(table.shopId), index('vessel_deleted').on(table.deletedAt)],
);

export const vesselMember = mysqlTable(
  'vessel_member',
  {
    vesselId: uuid('vessel_id')
      .notNull()
      .references(() => vessel.id, { onDelete: 'cascade' }),
    personId: uuid('person_id')
      .notNull()
      .references(() => person.id, { onDelete: 'cascade' }),
    role: mysqlEnum('role', roles).notNull(),
    joinedAt: instant('joined_at').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.vesselId, table.personId] }),
    index('vessel_member_person').on(table.personId),
  ],
);

/** Of the token in the mail only its hash is kept. */
export const invitation = mysqlTable(
  'invitation',
  {
    id: uuid('id').primaryKey(),
    vesselId: uuid('vessel_id')
      .notNull()
      .references(() => vessel.id, { onDelete: 'cascade' }),
    email: exactText('email').notNull(),
    role: mysqlEnum('role', roles).notNull(),
    tokenHash: hashText('token_hash').notNull(),
    invitedBy: uuid('invited_by')
      .notNull()
      .references(() => person.id),
    invitedAt: instant('invited_at').notNull(),
    expiresAt: instant('expires_at').notNull(),
    acceptedAt: instant('accepted_at'),
    withdrawnAt: instant('withdrawn_at'),
  },
  (table) => [
    uniqueIndex('invitation_token').on(table.tokenHash),
    index('invitation_vessel').on(table.vesselId),
    index('invitation_by').on(table.invitedBy, table.invitedAt),
  ],
);

function hashText(name: string) {
  return varchar(name, { length: 64 });
}
