import { createHash } from 'node:crypto';
import { existsSync, mkdirSync, readdirSync, readFileSync, renameSync, rmSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

import { ROOT, runOrStop } from './run.mjs';

const MADE_FROM = ['src', 'shared', 'symbols', 'public', 'index.html', 'vite.config.ts', 'package-lock.json'];

/** Builds the client into `dist/` where what it is made from has changed since it was built. */
export async function buildClient(say) {
  const wanted = fingerprint();
  const stamp = join(ROOT, 'dist/.made-from');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === wanted) return;

  say('Building the client (vite build) ...');
  // Beside, then put in place: a build that is interrupted or fails leaves the old one as it is.
  const beside = join(ROOT, 'node_modules/.cache/ampwright-dist');
  rmSync(beside, { recursive: true, force: true });
  mkdirSync(beside, { recursive: true });
  await runOrStop(
    'The client did not build.',
    process.execPath,
    [join(ROOT, 'node_modules/vite/bin/vite.js'), 'build', '--outDir', beside, '--emptyOutDir', '--logLevel', 'warn'],
    { env: { ...process.env, NODE_ENV: 'production', NO_COLOR: '1', FORCE_COLOR: undefined } },
  );
  writeFileSync(join(beside, '.made-from'), wanted);
  rmSync(join(ROOT, 'dist'), { recursive: true, force: true });
  renameSync(beside, join(ROOT, 'dist'));
}

/** Of contents, not of times: a fresh clone with the same sources is not stale. */
function fingerprint() {
  const hash = createHash('sha256');
  for (const file of MADE_FROM.flatMap(filesUnder)) {
    hash
      .update(`${file}\0`)
      .update(readFileSync(join(ROOT, file)))
      .update('\0');
  }
  return hash.digest('hex');
}

function filesUnder(path) {
  if (!existsSync(join(ROOT, path))) return [];
  if (path.includes('.')) return [path];
  return readdirSync(join(ROOT, path), { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && !/\.test\.tsx?$/.test(entry.name))
    .map((entry) => join(entry.parentPath, entry.name).slice(ROOT.length + 1))
    .sort();
}
