import { createHash, randomBytes } from 'node:crypto';
import {
  chmodSync,
  existsSync,
  mkdirSync,
  readFileSync,
  realpathSync,
  renameSync,
  statfsSync,
  writeFileSync,
} from 'node:fs';
import { createServer } from 'node:net';
import { join, resolve } from 'node:path';

import { Stopped } from './stopped.mjs';

const LONGEST_WAIT_MS = 600_000;

/** Makes the folder if need be and answers its real path, readable by its owner only. */
export function openFolder(path) {
  const folder = resolve(path);
  if (!existsSync(folder)) mkdirSync(folder, { recursive: true, mode: 0o700 });
  return realpathSync(folder);
}

/** A small JSON file that is never seen half written, and by its owner only. */
export function writeKept(file, value) {
  const half = `${file}.${process.pid}.half`;
  writeFileSync(half, `${JSON.stringify(value, null, 2)}\n`, { mode: 0o600, flush: true });
  chmodSync(half, 0o600);
  renameSync(half, file);
}

/** What was kept, or undefined where nothing was or what is there can't be read as JSON. */
export function readKept(file) {
  if (!existsSync(file)) return undefined;
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch (error) {
    if (error instanceof SyntaxError) return undefined;
    throw error;
  }
}

/** The secrets of this data folder, made at random the first time and kept in it. */
export function keepSecrets(folder) {
  const file = join(folder, 'secrets.json');
  const kept = readKept(file) ?? {};
  const secrets = { authSecret: kept.authSecret ?? randomBytes(32).toString('base64url') };
  if (kept.authSecret === undefined) writeKept(file, secrets);
  return secrets;
}

export function requireSpace(folder, megabytes) {
  const { bavail, bsize } = statfsSync(folder);
  const freeMegabytes = Math.floor((Number(bavail) * Number(bsize)) / 1e6);
  if (freeMegabytes >= megabytes) return;
  throw new Stopped(
    `The disk is full: ${folder} has ${freeMegabytes} MB left and ${megabytes} MB are needed. Free some space and start again.`,
  );
}

/**
 * Does the work while no other process does work on the same folder. The lock is an abstract socket: the kernel lets
 * go of it when its holder dies, however it dies, so there is never a stale one.
 */
export async function whileAlone(folder, work, sayWaiting = () => {}) {
  const name = `\0ampwright-${createHash('sha256').update(folder).digest('hex').slice(0, 40)}`;
  const lock = await takeLock(name, folder, sayWaiting);
  try {
    return await work();
  } finally {
    await new Promise((done) => lock.close(done));
  }
}

async function takeLock(name, folder, sayWaiting) {
  for (const start = Date.now(); ;) {
    const lock = await tryListen({ path: name });
    if (lock !== undefined) return lock;
    sayWaiting();
    sayWaiting = () => {};
    if (Date.now() - start > LONGEST_WAIT_MS) {
      throw new Stopped(`Another command of Ampwright has been busy with ${folder} for ten minutes. End it first.`);
    }
    await pause(50);
  }
}

/** A listening server, or undefined where the address is taken. */
export function tryListen(address) {
  return new Promise((done, refuse) => {
    const server = createServer((socket) => socket.destroy());
    server.unref();
    server.once('error', (error) => (error.code === 'EADDRINUSE' ? done(undefined) : refuse(error)));
    server.listen(address, () => done(server));
  });
}

export function pause(milliseconds) {
  return new Promise((done) => setTimeout(done, milliseconds));
}
