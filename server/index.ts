import { closeDatabase, openDatabase } from './db/connect.ts';
import { migrateDatabase } from './db/migrate.ts';
import { errnoOf } from './db/transaction.ts';
import { seedDemo } from './demo/seed-demo.ts';
import { serveClientSources } from './http/client-files.ts';
import { readConfiguration, type Configuration } from './http/configuration.ts';
import { startHouse } from './start-house.ts';

await main();

async function main(): Promise<void> {
  const read = readConfiguration(process.env);
  if ('report' in read) fail(read.report);
  else await run(read.configuration).catch((error: unknown) => fail(sentenceOf(error, read.configuration)));
}

async function run(configuration: Configuration): Promise<void> {
  await migrateDatabase(configuration.databaseUrl);
  if (configuration.demo !== undefined) await seed(configuration.databaseUrl, configuration.demo);
  const sources = configuration.mode === 'development' ? serveClientSources() : undefined;
  const running = await startHouse(configuration, { client: sources?.middleware });
  await sources?.open(running.server);

  let stopping = false;
  const stop = () => {
    if (stopping) return;
    stopping = true;
    // Nothing may keep the process: what was acknowledged is committed already.
    setTimeout(() => process.exit(1), 8_000).unref();
    // Sources first: the server can not close while a page still listens for changes of them.
    void Promise.resolve(sources?.close())
      .then(() => running.stop())
      .finally(() => process.exit(0));
  };
  process.on('SIGTERM', stop);
  process.on('SIGINT', stop);

  await new Promise<void>((resolve, reject) => {
    running.server.once('error', reject);
    running.server.listen(configuration.port, configuration.host, resolve);
  });
  running.house.log.info({ address: configuration.publicUrl }, 'listening');
  process.send?.('listening');
}

async function seed(databaseUrl: string, folder: string): Promise<void> {
  const db = openDatabase(databaseUrl, { connections: 2 });
  try {
    await seedDemo(db, { folder });
  } finally {
    await closeDatabase(db);
  }
}

function fail(report: string): void {
  process.stderr.write(`${report}\n`);
  process.exitCode = 1;
  setImmediate(() => process.exit(1));
}

function sentenceOf(error: unknown, { host, port }: Configuration): string {
  const code = (error as { code?: unknown }).code;
  if (code === 'EADDRINUSE') return `Port ${port} on ${host} is taken. Set PORT to a free one.`;
  if (code === 'EACCES') return `Port ${port} on ${host} may not be used. Set PORT to one above 1023.`;
  if (code === 'ECONNREFUSED') return 'The database does not answer: nothing listens at the address in DATABASE_URL.';
  if (code === 'ENOSPC') return 'The disk is full.';
  const errno = errnoOf(error);
  if (errno === 1045 || errno === 1698) return 'The database refuses the user or password in DATABASE_URL.';
  if (errno === 1044 || errno === 1142) return 'The user in DATABASE_URL may not use or change that database.';
  if (errno === 1049) return 'The database named in DATABASE_URL does not exist.';
  if (errno === 1021 || errno === 1114) return 'The disk of the database is full.';
  return `The server could not start: ${error instanceof Error ? (error.stack ?? error.message) : String(error)}`;
}
