import { join } from 'node:path';

import mysql, { type RowDataPacket } from 'mysql2/promise';
import type { TestProject } from 'vitest/node';

import { startDatabase } from '#server/commands/database.mjs';
import { migrateDatabase } from '#server/db/migrate.ts';

declare module 'vitest' {
  export interface ProvidedContext {
    readonly testDatabase: { readonly url: string; readonly prefix: string; readonly tables: readonly string[] };
  }
}

/**
 * A real MariaDB with the tables as the migrations make them, once a run. Each test file makes itself a database
 * of its own from them (open-house.ts), so that no file sees what another did.
 */
export async function setup(project: TestProject): Promise<void> {
  const own = process.env['TEST_DATABASE_URL'];
  const started =
    own === undefined || own === ''
      ? await startDatabase({ folder: join(project.config.root, '.data/test/mariadb'), durable: false })
      : undefined;
  const url = started?.url ?? own!;
  const prefix = `ampwright_test_${process.pid}`;
  const admin = await mysql.createConnection({ uri: url });
  await dropDatabasesOfTheDead(admin);
  await admin.query(`DROP DATABASE IF EXISTS \`${prefix}_template\``);
  await admin.query(`CREATE DATABASE \`${prefix}_template\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  await migrateDatabase(withDatabase(url, `${prefix}_template`));
  project.provide('testDatabase', { url, prefix, tables: await readTables(admin, `${prefix}_template`) });
  endSetup = async () => {
    for (const name of await databasesOf(admin, `${prefix}\\_%`)) await admin.query(`DROP DATABASE \`${name}\``);
    await admin.end();
    await started?.stop();
  };
}

/** Vitest's counterpart of `setup`. */
export async function teardown(): Promise<void> {
  await endSetup();
}

let endSetup: () => Promise<void> = () => Promise.resolve();

export function withDatabase(url: string, name: string): string {
  const other = new URL(url);
  other.pathname = `/${name}`;
  return other.toString();
}

async function readTables(admin: mysql.Connection, database: string): Promise<string[]> {
  await admin.query(`USE \`${database}\``);
  const [tables] = await admin.query<RowDataPacket[]>('SHOW TABLES');
  const statements: string[] = [];
  for (const table of tables) {
    const name = String(Object.values(table)[0]);
    const [rows] = await admin.query<RowDataPacket[]>(`SHOW CREATE TABLE \`${name}\``);
    statements.push(String(rows[0]!['Create Table']));
  }
  return statements;
}

/** A run that was killed could not clear up after itself. */
async function dropDatabasesOfTheDead(admin: mysql.Connection): Promise<void> {
  for (const name of await databasesOf(admin, 'ampwright\\_test\\_%')) {
    const pid = Number(/^ampwright_test_(\d+)_/.exec(name)?.[1]);
    if (Number.isInteger(pid) && !isAlive(pid)) await admin.query(`DROP DATABASE \`${name}\``);
  }
}

async function databasesOf(admin: mysql.Connection, like: string): Promise<string[]> {
  const [rows] = await admin.query<RowDataPacket[]>(`SHOW DATABASES LIKE '${like}'`);
  return rows.map((row) => String(Object.values(row)[0]));
}

function isAlive(pid: number): boolean {
  try {
    process.kill(pid, 0);
    return true;
  } catch {
    return false;
  }
}
