import { mkdirSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';

import { startDatabase, type RunningDatabase } from './database.mjs';
import { startServer, type StartedServer } from './local-server.mjs';
import { runTypeScript } from './run.mjs';

/** A whole application in a folder of its own, with its own database, that can be killed and started again. */
export interface LocalAmpwright {
  readonly address: string;
  readonly folder: string;
  /** Kills with SIGKILL. */
  kill(victims: 'server' | 'database' | 'both'): Promise<void>;
  /** Starts whatever is not running. */
  startAgain(): Promise<void>;
  /** Resolves as soon as all of it runs. */
  whenUp(): Promise<void>;
  stop(): Promise<void>;
}

export async function startLocalAmpwright(
  folder: string,
  options: { readonly demo?: boolean } = {},
): Promise<LocalAmpwright> {
  const port = await freePort();
  const address = `http://127.0.0.1:${port}`;
  const dataFolder = join(folder, 'data');
  mkdirSync(dataFolder, { recursive: true });
  const databases: RunningDatabase[] = [];
  let server: StartedServer | undefined;
  let isDatabaseDown = true;
  let up = later();

  async function startAgain(): Promise<void> {
    if (isDatabaseDown) databases.push(await startDatabase({ folder: join(folder, 'mariadb') }));
    isDatabaseDown = false;
    if (server === undefined) {
      server = startServer({ env: environment(), port, host: '127.0.0.1', dataFolder });
      await server.ready;
    }
    up.resolve();
  }
  function environment(): NodeJS.ProcessEnv {
    return {
      ...process.env,
      NODE_ENV: 'production',
      DATABASE_URL: databases.at(-1)!.url,
      HOST: '127.0.0.1',
      PORT: String(port),
      PUBLIC_URL: address,
      AMPWRIGHT_DATA: dataFolder,
      AUTH_SECRET: 'trial-of-the-whole-0123456789-abcdefghij',
      MAILBOX: join(dataFolder, 'mail'),
    };
  }

  databases.push(await startDatabase({ folder: join(folder, 'mariadb') }));
  isDatabaseDown = false;
  if (options.demo) {
    await runTypeScript('The demo could not be put in.', 'server/commands/seed.ts', [], {
      ...environment(),
      DEMO: join(dataFolder, 'demo'),
    });
  }
  await startAgain();

  return {
    address,
    folder,
    async kill(victims) {
      up = later();
      if (victims !== 'database' && server !== undefined) {
        process.kill(server.pid, 'SIGKILL');
        await server.ended;
        server = undefined;
      }
      if (victims !== 'server') {
        process.kill(databases.at(-1)!.pid, 'SIGKILL');
        isDatabaseDown = true;
      }
    },
    startAgain,
    whenUp: () => up.promise,
    async stop() {
      await server?.stop();
      for (const database of databases) await database.stop();
    },
  };
}

function later(): { readonly promise: Promise<void>; readonly resolve: () => void } {
  let resolve: () => void = () => {};
  const promise = new Promise<void>((done) => (resolve = done));
  return { promise, resolve };
}

function freePort(): Promise<number> {
  return new Promise((done, refuse) => {
    const server = createServer();
    server.once('error', refuse);
    server.listen(0, '127.0.0.1', () => {
      const address = server.address();
      server.close(() => done(typeof address === 'object' && address !== null ? address.port : 0));
    });
  });
}
