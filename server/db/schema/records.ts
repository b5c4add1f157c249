import { index, int, json, mysqlTable, text, varchar } from 'drizzle-orm/mysql-core';

import { exactText, instant, uuid } from './columns.ts';

/** Mail to be sent. Its text holds links that open doors, so it is blanked once the mail has gone. */
export const outbox = mysqlTable(
  'outbox',
  {
    id: uuid('id').primaryKey(),
    recipient: exactText('recipient').notNull(),
    subject: varchar('subject', { length: 255 }).notNull(),
    text: text('text').notNull(),
    madeAt: instant('made_at').notNull(),
    attempts: int('attempts').notNull().default(0),
    nextTryAt: instant('next_try_at'),
    sentAt: instant('sent_at'),
    lastError: varchar('last_error', { length: 255 }),
  },
  (table) => [index('outbox_due').on(table.nextTryAt)],
);

/** Who did what, and when. Rows outlive what they tell of, so nothing here refers to other tables. */
export const auditLog = mysqlTable(
  'audit_log',
  {
    id: uuid('id').primaryKey(),
    at: instant('at').notNull(),
    personId: uuid('person_id'),
    vesselId: uuid('vessel_id'),
    shopId: uuid('shop_id'),
    deed: varchar('deed', { length: 64 }).notNull(),
    detail: json('detail'),
  },
  (table) => [index('audit_log_vessel').on(table.vesselId, table.at), index('audit_log_person').on(table.personId)],
);
