import { drizzle, type MySql2Database } from 'drizzle-orm/mysql2';
import mysql from 'mysql2/promise';

/** The pool, or a transaction on one of its connections: queries take either. */
export type Database = Pick<MySql2Database, 'select' | 'selectDistinct' | 'insert' | 'update' | 'delete' | 'execute'>;
export type OpenDatabase = MySql2Database & { readonly pool: mysql.Pool };

/** UTC on both sides, so that what is read is what was written wherever the server stands. */
export function openDatabase(url: string, options: { readonly connections?: number } = {}): OpenDatabase {
  const pool = mysql.createPool({
    uri: url,
    timezone: 'Z',
    charset: 'utf8mb4_unicode_ci',
    connectionLimit: options.connections ?? 10,
    maxIdle: options.connections ?? 10,
    connectTimeout: 10_000,
    enableKeepAlive: true,
  });
  return Object.assign(drizzle(pool), { pool });
}

export async function closeDatabase(db: OpenDatabase): Promise<void> {
  await db.pool.end();
}
