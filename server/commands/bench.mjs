/** `npm run bench`: what the product does most, in milliseconds. `-- --only open` picks, `-- --json FILE` keeps. */
import { spawn } from 'node:child_process';

import { buildClient } from './client.mjs';
import { CHROMIUM, FONTS, installDebian, MARIADB, NGSPICE } from './debian.mjs';
import { whileAlone } from './own-folder.mjs';
import { installPackages } from './packages.mjs';
import { ROOT } from './run.mjs';
import { endWith } from './stopped.mjs';

try {
  await whileAlone(ROOT, async () => {
    await installPackages(console.log);
    await installDebian([MARIADB, CHROMIUM, FONTS, NGSPICE], console.log);
    await buildClient(console.log);
  });
  const child = spawn(process.execPath, ['--import', 'tsx', 'server/commands/bench/run.ts', ...process.argv.slice(2)], {
    cwd: ROOT,
    stdio: 'inherit',
  });
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => child.kill(signal));
  child.once('exit', (code) => process.exit(code ?? 1));
} catch (error) {
  endWith(error);
}
