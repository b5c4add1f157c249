import { spawn } from 'node:child_process';
import { closeSync, existsSync, openSync, readFileSync, renameSync } from 'node:fs';
import { join } from 'node:path';

import { pause } from './own-folder.mjs';
import { ROOT } from './run.mjs';
import { Stopped } from './stopped.mjs';

const READY_MS = 60_000;
const STOP_MS = 10_000;

/** Starts the server as a child; `ready` once it answers. Its log goes to `server.log` of the data folder. */
export function startServer({ env, port, host, dataFolder, nodeArgs = ['--import', 'tsx'] }) {
  const log = join(dataFolder, 'server.log');
  if (existsSync(log)) renameSync(log, `${log}.1`);
  const out = openSync(log, 'a', 0o600);
  const child = spawn(
    process.execPath,
    [...nodeArgs, '--import', join(import.meta.dirname, 'with-parent.mjs'), join(ROOT, 'server/index.ts')],
    // Away from the terminal: Ctrl-C reaches the command, which stops server and database in this order.
    { cwd: ROOT, env, detached: true, stdio: ['ignore', out, out, 'ipc'] },
  );
  closeSync(out);
  const ended = new Promise((done) => {
    child.once('error', () => done(-1));
    child.once('exit', (code, signal) => done(code ?? signal));
  });
  return {
    pid: child.pid,
    ended,
    log,
    ready: waitUntilReady({ child, ended, host, port, log }),
    stop: () => stop(child, ended),
  };
}

async function waitUntilReady({ child, ended, host, port, log }) {
  if (await waitUntilAnswers({ ended, host, port })) return;
  const hasEnded = child.exitCode !== null || child.signalCode !== null || child.pid === undefined;
  child.kill('SIGKILL');
  const what = hasEnded ? 'The server did not start.' : `The server did not answer within ${READY_MS / 1000} s.`;
  throw new Stopped(`${what}\n${lastLines(log)}`);
}

/** True once the server answers, false if it ends before or takes too long. */
export async function waitUntilAnswers({ ended, host, port }) {
  let hasEnded = false;
  void ended.then(() => (hasEnded = true));
  const asked = { '0.0.0.0': '127.0.0.1', '::': '[::1]' }[host] ?? host;
  for (const deadline = Date.now() + READY_MS; !hasEnded && Date.now() < deadline; await pause(40)) {
    if (await answers(`http://${asked}:${port}/api/server`)) return !hasEnded;
  }
  return false;
}

async function stop(child, ended) {
  child.kill('SIGTERM');
  const patience = setTimeout(() => child.kill('SIGKILL'), STOP_MS);
  await ended;
  clearTimeout(patience);
}

async function answers(url) {
  try {
    const reply = await fetch(url, { signal: AbortSignal.timeout(2000) });
    return reply.ok;
  } catch {
    return false;
  }
}

export function lastLines(file, count = 12) {
  return existsSync(file) ? readFileSync(file, 'utf8').trim().split('\n').slice(-count).join('\n') : '';
}
