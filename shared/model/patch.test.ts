import fc from 'fast-check';
import { describe, expect, test } from 'vitest';

import { applyPatches, invertPatches, pathsOverlap, type Patch } from './patch.ts';

const boat = { runs: { w1: { lengthM: 2, bends: [1, 2] }, w2: { lengthM: 3 } }, basis: { hull: 'wood' } };

describe('a change applied', () => {
  test('sets and removes what it names and leaves all else the same object', () => {
    const changed = applyPatches(boat, [
      { op: 'set', path: ['runs', 'w1', 'lengthM'], value: 5 },
      { op: 'remove', path: ['basis', 'hull'] },
    ]);
    expect(changed).toEqual({ runs: { w1: { lengthM: 5, bends: [1, 2] }, w2: { lengthM: 3 } }, basis: {} });
    expect(changed.runs.w2).toBe(boat.runs.w2);
    expect(boat.runs.w1.lengthM).toBe(2);
  });

  test('that removes what is not there changes nothing', () => {
    expect(applyPatches(boat, [{ op: 'remove', path: ['runs', 'w9', 'lengthM'] }])).toBe(boat);
    expect(applyPatches(boat, [{ op: 'remove', path: ['runs', 'w9'] }])).toBe(boat);
  });

  test('makes the way to what it sets', () => {
    expect(applyPatches({}, [{ op: 'set', path: ['a', 'b'], value: 1 }])).toEqual({ a: { b: 1 } });
  });

  test('cannot reach the prototype of anything', () => {
    applyPatches({}, [{ op: 'set', path: ['__proto__', 'polluted'], value: true }]);
    applyPatches({}, [{ op: 'set', path: ['constructor', 'prototype', 'polluted'], value: true }]);
    expect(({} as Record<string, unknown>).polluted).toBeUndefined();
  });
});

describe('undo', () => {
  test('puts back what was there, and leaves nothing where nothing was', () => {
    const patches: Patch[] = [
      { op: 'set', path: ['runs', 'w1', 'lengthM'], value: 9 },
      { op: 'set', path: ['cables', 'c1', 'type'], value: '10/3' },
      { op: 'remove', path: ['runs', 'w2'] },
      { op: 'set', path: ['runs', 'w1', 'lengthM'], value: 10 },
    ];
    expect(applyPatches(applyPatches(boat, patches), invertPatches(boat, patches))).toEqual(boat);
  });

  test('takes back any change of any document', () => {
    const key = fc.constantFrom('a', 'b', 'c');
    const leaf = fc.oneof(fc.integer(), fc.string(), fc.array(fc.integer()), fc.constant(null));
    const document = fc.dictionary(key, fc.oneof(leaf, fc.dictionary(key, fc.oneof(leaf, fc.dictionary(key, leaf)))));
    const patch = fc.oneof(
      fc.record({ op: fc.constant('set' as const), path: fc.array(key, { minLength: 1, maxLength: 3 }), value: leaf }),
      fc.record({ op: fc.constant('remove' as const), path: fc.array(key, { minLength: 1, maxLength: 3 }) }),
    );
    fc.assert(
      fc.property(document, fc.array(patch, { maxLength: 8 }), (before, patches) => {
        const after = applyPatches(before, patches);
        expect(applyPatches(after, invertPatches(before, patches))).toEqual(before);
      }),
      { seed: 14, numRuns: 1000 },
    );
  });
});

test('two changes touch the same thing where one path lies on or below the other', () => {
  expect(pathsOverlap(['runs', 'w1'], ['runs', 'w1', 'lengthM'])).toBe(true);
  expect(pathsOverlap(['runs', 'w1', 'lengthM'], ['runs', 'w1', 'colour'])).toBe(false);
  expect(pathsOverlap(['runs', 'w1'], ['runs', 'w12'])).toBe(false);
});
