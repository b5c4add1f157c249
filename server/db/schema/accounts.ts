import { bigint, boolean, index, int, mysqlTable, text, varchar } from 'drizzle-orm/mysql-core';

import { exactText, instant, uuid } from './columns.ts';

/** The tables of the sign-in package, by our words. The property names are the package's and may not change. */
export const person = mysqlTable('person', {
  id: uuid('id').primaryKey(),
  name: varchar('name', { length: 255 }).notNull(),
  email: exactText('email').notNull().unique('person_email'),
  emailVerified: boolean('email_verified').notNull().default(false),
  image: text('image'),
  createdAt: instant('created_at').notNull(),
  updatedAt: instant('updated_at').notNull(),
});

export const session = mysqlTable(
  'session',
  {
    id: uuid('id').primaryKey(),
    expiresAt: instant('expires_at').notNull(),
    token: exactText('token').notNull().unique('session_token'),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
    ipAddress: text('ip_address'),
    userAgent: text('user_agent'),
    userId: uuid('person_id')
      .notNull()
      .references(() => person.id, { onDelete: 'cascade' }),
  },
  (table) => [index('session_person').on(table.userId)],
);

/** How a person proves who they are: here, a password's hash. */
export const credential = mysqlTable(
  'credential',
  {
    id: uuid('id').primaryKey(),
    accountId: varchar('account_id', { length: 255 }).notNull(),
    providerId: varchar('provider_id', { length: 255 }).notNull(),
    userId: uuid('person_id')
      .notNull()
      .references(() => person.id, { onDelete: 'cascade' }),
    accessToken: text('access_token'),
    refreshToken: text('refresh_token'),
    idToken: text('id_token'),
    accessTokenExpiresAt: instant('access_token_expires_at'),
    refreshTokenExpiresAt: instant('refresh_token_expires_at'),
    scope: text('scope'),
    password: text('password'),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
  },
  (table) => [index('credential_person').on(table.userId)],
);

export const verification = mysqlTable(
  'verification',
  {
    id: uuid('id').primaryKey(),
    identifier: exactText('identifier').notNull(),
    value: text('value').notNull(),
    expiresAt: instant('expires_at').notNull(),
    createdAt: instant('created_at').notNull(),
    updatedAt: instant('updated_at').notNull(),
  },
  (table) => [index('verification_identifier').on(table.identifier)],
);

export const rateLimit = mysqlTable('rate_limit', {
  id: uuid('id').primaryKey(),
  key: exactText('key').notNull().unique('rate_limit_key'),
  count: int('count').notNull(),
  lastRequest: bigint('last_request', { mode: 'number' }).notNull(),
});
