import { existsSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

import { ROOT, runOrStop } from './run.mjs';

/** Installs the packages of the lock where `node_modules` is missing, incomplete or of an older lock. */
export async function installPackages(say) {
  if (packagesMatchLock(ROOT)) return;

  say('Installing packages (npm ci) ...');
  const npm = process.env.npm_execpath;
  const [command, before] = npm?.endsWith('.js') ? [process.execPath, [npm]] : ['npm', []];
  await runOrStop('npm ci did not go through.', command, [
    ...before,
    'ci',
    '--include=dev', // also under NODE_ENV=production: the client is built here
    '--no-audit',
    '--no-fund',
  ]);
}

/**
 * Whether every package of the lock is there in its version. npm writes its own list as the last thing of an
 * install, so one that was interrupted has none.
 */
export function packagesMatchLock(root) {
  const installed = join(root, 'node_modules/.package-lock.json');
  if (!existsSync(installed)) return false;
  const wanted = packagesOf(join(root, 'package-lock.json'));
  const there = packagesOf(installed);
  return Object.entries(wanted).every(
    ([path, entry]) =>
      path === '' || (there[path] === undefined ? entry.optional : there[path].version === entry.version),
  );
}

function packagesOf(file) {
  return JSON.parse(readFileSync(file, 'utf8')).packages;
}
