import type { AddressInfo } from 'node:net';

import mysql from 'mysql2/promise';
import { pino } from 'pino';
import { afterAll, inject } from 'vitest';

import type { OpenDatabase } from '#server/db/connect.ts';
import type { Configuration } from '#server/http/configuration.ts';
import { startHouse } from '#server/start-house.ts';

import { withDatabase } from './database-setup.ts';

export interface TestHouse {
  /** Where it listens. */
  readonly address: string;
  /** What its people call it; several processes behind one name share it. */
  readonly publicUrl: string;
  readonly databaseUrl: string;
  readonly db: OpenDatabase;
  /** A second process' worth of server over the same database. */
  openAnother(): Promise<TestHouse>;
  stop(): Promise<void>;
}

export const PUBLIC_URL = 'http://ampwright.test';

let made = 0;

/** The application on an empty database of its own; both go when the file's tests are done. */
export async function openHouse(options: Partial<Configuration> = {}): Promise<TestHouse> {
  const databaseUrl = await makeDatabase();
  return openOn(databaseUrl, options);
}

/** An empty database with the tables in it. */
export async function makeDatabase(): Promise<string> {
  const { url, prefix, tables } = inject('testDatabase');
  made += 1;
  const name = `${prefix}_${Date.now().toString(36)}_${made}`;
  const connection = await mysql.createConnection({ uri: url });
  await connection.query(`CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  await connection.query(`USE \`${name}\``);
  await connection.query('SET FOREIGN_KEY_CHECKS = 0');
  for (const table of tables) await connection.query(table);
  await connection.end();
  afterAll(async () => {
    const last = await mysql.createConnection({ uri: url });
    await last.query(`DROP DATABASE \`${name}\``);
    await last.end();
  });
  return withDatabase(url, name);
}

async function openOn(databaseUrl: string, options: Partial<Configuration>): Promise<TestHouse> {
  const running = await startHouse(
    {
      databaseUrl,
      authSecret: 'a-secret-of-tests-only-0123456789abcdef',
      host: '127.0.0.1',
      port: 0,
      publicUrl: PUBLIC_URL,
      smtpUrl: undefined,
      mailFrom: 'Ampwright <post@ampwright.test>',
      mailbox: undefined,
      demo: undefined,
      trustProxy: 0,
      logLevel: 'silent',
      mode: 'test',
      ...options,
    },
    { log: pino({ level: process.env['TEST_LOG_LEVEL'] ?? 'silent' }) },
  );
  await new Promise<void>((resolve) => running.server.listen(0, '127.0.0.1', resolve));
  const { port } = running.server.address() as AddressInfo;
  let isStopped = false;
  const stop = async () => {
    if (!isStopped) await running.stop();
    isStopped = true;
  };
  afterAll(stop);
  return {
    address: `http://127.0.0.1:${port}`,
    publicUrl: options.publicUrl ?? PUBLIC_URL,
    databaseUrl,
    db: running.house.db,
    openAnother: () => openOn(databaseUrl, options),
    stop,
  };
}
