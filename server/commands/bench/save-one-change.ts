import { readFileSync } from 'node:fs';

import { getDesign, makeChange } from '#shared/api/design.ts';
import { importVessel } from '#shared/api/vessels.ts';

import { sample, type Bench } from './bench.ts';
import { MINNOW_FILE } from './minnow.ts';

export const saveOneChange: Bench = {
  name: 'save/one-change',
  what: 'one length changed over HTTP, acknowledged after commit to disk',
  async measure(place) {
    const { designer } = await place.application();
    const file = readFileSync(MINNOW_FILE, 'utf8');
    const { vesselId } = await designer.call(importVessel, { body: { shopId: designer.shopId!, file } });
    const { seq, design } = await designer.call(getDesign, { params: { vesselId } });
    const run = Object.keys(design.runs)[0]!;
    let base = seq;
    let lengthM = 1;
    async function save(): Promise<void> {
      lengthM += 0.01;
      const patches = [{ op: 'set' as const, path: ['runs', run, 'lengthM'], value: lengthM }];
      const body = { id: crypto.randomUUID(), base, label: 'Change a length', patches };
      base = (await designer.call(makeChange, { params: { vesselId }, body })).seq;
    }
    for (let warm = 0; warm < 20; warm += 1) await save();
    return sample(200, save);
  },
};
