import { expect, it } from 'vitest';

import type { Design } from '#shared/model/design.ts';
import { applyPatches } from '#shared/model/patch.ts';

import { differenceBetween } from './difference.ts';

const design: Design = {
  format: 'ampwright-design',
  version: 1,
  basis: { profile: 'abyc-e11' },
  sheets: { s1: { id: 's1' } },
  zones: {},
  devices: {},
  runs: {},
  modes: {},
  notes: {
    n1: { id: 'n1', sheetId: 's1', x: 0, y: 0, text: 'one' },
    n2: { id: 'n2', sheetId: 's1', x: 0, y: 0, text: 'two' },
  },
};

it('tells the check of changed, new and removed things and of nothing else', () => {
  const after = applyPatches(design, [
    { op: 'set', path: ['notes', 'n1', 'text'], value: 'changed' },
    { op: 'remove', path: ['notes', 'n2'] },
    { op: 'set', path: ['zones', 'z1'], value: { id: 'z1', name: 'Cabin' } },
    { op: 'set', path: ['basis', 'ambientC'], value: 35 },
  ]);
  const patches = differenceBetween(design, after);
  expect(patches.map((patch) => `${patch.op} ${patch.path.join('.')}`).toSorted()).toEqual([
    'remove notes.n2',
    'set basis',
    'set notes.n1',
    'set zones.z1',
  ]);
  expect(applyPatches(design, patches)).toEqual(after);
});

it('says nothing when nothing changed', () => {
  expect(differenceBetween(design, design)).toEqual([]);
});
