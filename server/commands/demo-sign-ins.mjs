import { join } from 'node:path';

import { readKept } from './own-folder.mjs';

/** The demo people with their passwords, as they were kept when they were put in; nobody where there is no demo. */
export function readDemoSignIns(folder) {
  return readKept(join(folder, 'sign-ins.json')) ?? [];
}
