import { fileURLToPath } from 'node:url';

import { drizzle } from 'drizzle-orm/mysql2';
import { migrate } from 'drizzle-orm/mysql2/migrator';
import mysql, { type RowDataPacket } from 'mysql2/promise';

/**
 * Brings the tables up to date, under a lock: of several processes that start at once one does it and the others
 * find it done. MariaDB commits each table as it is made, so nothing else may run beside it.
 */
export async function migrateDatabase(url: string): Promise<void> {
  const connection = await mysql.createConnection({ uri: url, timezone: 'Z', connectTimeout: 10_000 });
  try {
    const [rows] = await connection.query<RowDataPacket[]>(
      "SELECT GET_LOCK(CONCAT('migrate-', DATABASE()), 120) AS got",
    );
    if (rows[0]?.['got'] !== 1) throw new Error('another process has been changing the tables for two minutes');
    await migrate(drizzle(connection), { migrationsFolder: MIGRATIONS });
  } finally {
    await connection.end();
  }
}

const MIGRATIONS = fileURLToPath(new URL('../../drizzle', import.meta.url));
