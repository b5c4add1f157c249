import { readFileSync } from 'node:fs';

import { readDesign } from '#shared/files/read-design.ts';
import type { Design } from '#shared/model/design.ts';

export const MINNOW_FILE = new URL('../../demo/minnow.ampwright.json', import.meta.url);

export function readMinnow(): Design {
  const read = readDesign(readFileSync(MINNOW_FILE, 'utf8'));
  if (!read.ok) throw new Error(`Minnow can not be read: ${read.path}: ${read.reason}`);
  return read.design;
}
