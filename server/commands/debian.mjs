import { accessSync, constants } from 'node:fs';
import { delimiter, join } from 'node:path';

import { runOrStop, runQuietly } from './run.mjs';
import { Stopped } from './stopped.mjs';

/** What is needed of Debian: the package, and a program or file that shows that it is there. */
export const MARIADB = { package: 'mariadb-server', shows: ['mariadbd', 'mariadb-install-db'] };
export const CHROMIUM = { package: 'chromium', shows: ['chromium'] };
export const NGSPICE = { package: 'ngspice', shows: ['ngspice'] };
export const POPPLER = { package: 'poppler-utils', shows: ['pdftotext', 'pdffonts', 'pdfimages', 'pdfinfo'] };
export const FONTS = { package: 'fonts-dejavu-core', shows: ['/usr/share/fonts/truetype/dejavu/DejaVuSans.ttf'] };

/** Installs what is missing, as root or through `sudo -n`; with neither says exactly what to install. */
export async function installDebian(needs, say) {
  const missing = needs.filter((need) => !need.shows.every(isThere)).map((need) => need.package);
  if (missing.length === 0) return;

  const command = `apt-get install -y --no-install-recommends ${missing.join(' ')}`;
  const asRoot = await findWayToRoot(missing, command);
  say(`Installing ${missing.join(', ')} (apt-get) ...`);
  const env = { ...process.env, DEBIAN_FRONTEND: 'noninteractive' };
  const apt = [...asRoot, 'apt-get', '-o', 'DPkg::Lock::Timeout=300'];
  await runQuietly(apt[0], [...apt.slice(1), 'update'], { env }); // a mirror out of reach shows at the install
  await runOrStop(
    `apt-get could not install ${missing.join(', ')}.`,
    apt[0],
    [...apt.slice(1), 'install', '-y', '--no-install-recommends', ...missing],
    { env },
  );
}

async function findWayToRoot(missing, command) {
  const names = missing.join(', ');
  if (!isThere('apt-get')) {
    throw new Stopped(
      `Not installed: ${names}. There is no apt-get here; install ${missing.length > 1 ? 'them' : 'it'} and try again.`,
    );
  }
  if (process.getuid() === 0) return [];
  const { code } = await runQuietly('sudo', ['-n', 'true']);
  if (code === 0) return ['sudo', '-n', 'env', 'DEBIAN_FRONTEND=noninteractive'];
  throw new Stopped(`Not installed: ${names}. As root run:  ${command}  and try again.`);
}

/** The full path of a program, looked for as a shell would, and where Debian keeps servers. */
export function findProgram(name) {
  const folders = [...(process.env.PATH ?? '').split(delimiter), '/usr/bin', '/usr/sbin', '/usr/local/sbin'];
  return folders.map((folder) => join(folder, name)).find(isRunnable);
}

function isThere(name) {
  return name.startsWith('/') ? isReadable(name) : findProgram(name) !== undefined;
}

function isRunnable(path) {
  return canAccess(path, constants.X_OK);
}

function isReadable(path) {
  return canAccess(path, constants.R_OK);
}

function canAccess(path, how) {
  try {
    accessSync(path, how);
    return true;
  } catch {
    return false;
  }
}
