import { boolean, index, mysqlTable, primaryKey, varchar } from 'drizzle-orm/mysql-core';

import { person } from './accounts.ts';
import { instant, uuid } from './columns.ts';

export const shop = mysqlTable('shop', {
  id: uuid('id').primaryKey(),
  name: varchar('name', { length: 120 }).notNull(),
  createdAt: instant('created_at').notNull(),
});

export const shopMember = mysqlTable(
  'shop_member',
  {
    shopId: uuid('shop_id')
      .notNull()
      .references(() => shop.id, { onDelete: 'cascade' }),
    personId: uuid('person_id')
      .notNull()
      .references(() => person.id, { onDelete: 'cascade' }),
    admin: boolean('admin').notNull().default(false),
    joinedAt: instant('joined_at').notNull(),
  },
  (table) => [primaryKey({ columns: [table.shopId, table.personId] }), index('shop_member_person').on(table.personId)],
);
