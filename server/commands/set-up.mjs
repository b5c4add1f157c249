import { join } from 'node:path';

import { installDebian, MARIADB } from './debian.mjs';
import { startDatabase } from './database.mjs';
import { keepSecrets, openFolder, tryListen, whileAlone } from './own-folder.mjs';
import { requireOutsideDatabase } from './outside-database.mjs';
import { installPackages } from './packages.mjs';
import { ROOT, runTypeScript } from './run.mjs';
import { Stopped } from './stopped.mjs';

/**
 * Everything a server of this checkout needs before it can start: packages, a database that is up to date, secrets,
 * and whatever `alsoWhileAlone` adds. Answers the environment for the server, and the database if it is our own.
 *
 * Demo people and vessels go into no database but the empty one that was made here. One that was interrupted while
 * it was being filled has served nobody yet, so it is emptied and filled anew.
 */
export async function setUp({ settings, say, stops, alsoWhileAlone = async () => {} }) {
  await requireFreePort(settings);
  const dataFolder = openFolder(settings.dataFolder);
  const sayWaiting = () => say('Waiting for another command of Ampwright to finish its set-up ...');
  return whileAlone(
    ROOT,
    async () => {
      await installPackages(say);
      const secrets = keepSecrets(dataFolder);
      const { database, url } = await openDatabase(settings, dataFolder, say, stops);
      const env = serverEnvironment({ settings, dataFolder, secrets, url, isOurs: database !== undefined });

      const demoFolder = join(dataFolder, 'demo');
      if (database?.fresh) {
        await emptyDatabase(database);
        say('Putting in the demo people and vessels ...');
        await runTypeScript('The demo could not be put in.', 'server/commands/seed.ts', [], {
          ...env,
          DEMO: demoFolder,
        });
        database.markUsed();
      }
      await alsoWhileAlone();
      return { env, database, dataFolder, demoFolder };
    },
    sayWaiting,
  );
}

async function openDatabase(settings, dataFolder, say, stops) {
  if (settings.outsideDatabase !== undefined) {
    await requireOutsideDatabase(settings.outsideDatabase);
    return { database: undefined, url: settings.outsideDatabase };
  }
  await installDebian([MARIADB], say);
  const starting = startDatabase({ folder: join(dataFolder, 'mariadb'), say });
  stops.add(() =>
    starting.then(
      (started) => started.stop(),
      () => {},
    ),
  ); // also when told to end half-way
  const database = await starting;
  return { database, url: database.url };
}

function serverEnvironment({ settings, dataFolder, secrets, url, isOurs }) {
  return {
    ...process.env,
    NODE_ENV: process.env.NODE_ENV || 'production',
    DATABASE_URL: url,
    HOST: settings.host,
    PORT: String(settings.port),
    PUBLIC_URL: settings.address,
    AMPWRIGHT_DATA: dataFolder,
    AUTH_SECRET: process.env.AUTH_SECRET || secrets.authSecret,
    DEMO: undefined, // the server itself never puts the demo in here; see above
    // A mailbox that anyone on this machine can read stands in for the post only beside a database of our own.
    ...(isOurs && !process.env.SMTP_URL ? { MAILBOX: join(dataFolder, 'mail') } : {}),
  };
}

async function emptyDatabase(database) {
  const { createConnection } = await import('mysql2/promise');
  const connection = await createConnection({ uri: database.url });
  // Nobody may still be filling it: what a killed start left behind can outlive it by a moment.
  const [others] = await connection.query(
    'SELECT id FROM information_schema.processlist WHERE user = SUBSTRING_INDEX(USER(), "@", 1) AND id <> CONNECTION_ID()',
  );
  for (const { id } of others) await connection.query(`KILL ${id}`).catch(() => {}); // gone by itself meanwhile
  const [[{ name }]] = await connection.query('SELECT DATABASE() AS name');
  await connection.query(`DROP DATABASE \`${name}\``);
  await connection.query(`CREATE DATABASE \`${name}\` CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci`);
  await connection.end();
}

/** Asked first, so that a port in use is said before minutes of installing. */
async function requireFreePort({ host, port }) {
  let server;
  try {
    server = await tryListen({ host, port });
  } catch (error) {
    throw new Stopped(
      `The server can not listen on ${host}, port ${port} (${error.code}). Set HOST and PORT to what it may use.`,
    );
  }
  if (server === undefined) {
    throw new Stopped(
      `Port ${port} on ${host} is taken by another program. Choose another one:  PORT=${port + 1} npm start`,
    );
  }
  await new Promise((done) => server.close(done));
}
