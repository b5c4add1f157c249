/** `npm run dev`: as `npm start`, with the client changed in the open page and the server started again on a change. */
import { spawn } from 'node:child_process';
import { join } from 'node:path';

import { waitUntilAnswers } from './local-server.mjs';
import { ROOT } from './run.mjs';
import { setUp } from './set-up.mjs';
import { readStartSettings } from './settings.mjs';
import { collectStops } from './stop-signals.mjs';
import { endWith, Stopped } from './stopped.mjs';
import { printWelcome } from './welcome.mjs';

const stops = collectStops();

try {
  const settings = readStartSettings();
  const { env, database, dataFolder, demoFolder } = await setUp({ settings, say: console.log, stops });
  const child = spawn(
    process.execPath,
    [join(ROOT, 'node_modules/tsx/dist/cli.mjs'), 'watch', '--clear-screen=false', 'server/index.ts'],
    // A group of its own: Ctrl-C reaches this command, which ends the whole group and then the database.
    { cwd: ROOT, env: { ...env, NODE_ENV: 'development' }, detached: true, stdio: ['ignore', 'inherit', 'inherit'] },
  );
  const ended = new Promise((done) => child.once('exit', (code, signal) => done(code ?? signal)));
  stops.add(async () => {
    process.kill(-child.pid, 'SIGTERM');
    const patience = setTimeout(() => process.kill(-child.pid, 'SIGKILL'), 10_000);
    await ended;
    clearTimeout(patience);
  });
  stops.expectToBeEnded();
  const isReady = waitUntilAnswers({ ended, host: settings.host, port: settings.port });
  if (await isReady) printWelcome({ settings, database, dataFolder, demoFolder });
  const code = await ended;
  if (!stops.isStopping()) throw new Stopped(`The server ended by itself (${code}).`);
} catch (error) {
  if (!stops.isStopping()) {
    await stops.stopAll().catch(console.error);
    endWith(error);
  }
}
