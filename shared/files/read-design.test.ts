import fc from 'fast-check';
import { describe, expect, test } from 'vitest';

import { aSmallDesign, edited } from '#shared/testing/small-design.ts';

import { readDesign, readDesignValue } from './read-design.ts';
import { fileNameOf, writeDesign } from './write-design.ts';

function said(value: unknown): string {
  const read = readDesignValue(value);
  return read.ok ? 'read' : `${read.path}: ${read.reason}`;
}

describe('a file that is right', () => {
  test('is read as it stands, with nothing added to it', () => {
    expect(readDesign(JSON.stringify(aSmallDesign()))).toEqual({ ok: true, design: aSmallDesign() });
  });

  test('may leave out every key that has a default', () => {
    const bare = { format: 'ampwright-design', version: 1, basis: {}, sheets: { s: { id: 's' } } };
    expect(said({ ...bare, zones: {}, devices: {}, runs: {}, modes: {}, notes: {} })).toBe('read');
  });

  test('may write mm2 for mm²', () => {
    const read = readDesignValue(edited('runs.w1.conductor.size', '70 mm2'));
    expect(read.ok && read.design.runs.w1!.conductor.size).toBe('70 mm²');
  });

  test('may begin with a byte-order mark', () => {
    expect(readDesign(`\uFEFF${JSON.stringify(aSmallDesign())}`).ok).toBe(true);
  });

  test('may hold what a drawing passes through: no length, equal marks, odd ratings, a short', () => {
    expect(said(edited('runs.w1.lengthM', undefined))).toBe('read');
    expect(said(edited('devices.f1.mark', 'G1'))).toBe('read');
    expect(said(edited('devices.f1.ratings.ratedA', -5))).toBe('read');
    expect(said(edited('runs.w1.to', { device: 'g1', terminal: 'neg' }))).toBe('read');
  });

  test('a link may have no length', () => {
    expect(said(edited('runs.w1', { ...aSmallDesign().runs.w1, link: true, lengthM: 0 }))).toBe('read');
  });
});

describe('a file that is wrong is refused whole with its path and the reason', () => {
  test.each([
    ['runs.w1.lengthM', 0, 'runs.w1.lengthM: must be greater than 0'],
    ['runs.w1.lengthM', -2, 'runs.w1.lengthM: must be greater than 0'],
    ['runs.w1.lengthM', '2 m', 'runs.w1.lengthM: must be a number'],
    ['runs.w1.lenghtM', 2, 'runs.w1.lenghtM: is not a key of the format'],
    ['runs.w1.id', 'w2', 'runs.w1.id: must be w1, the key it stands under'],
    ['runs.w1.from.device', 'g9', 'runs.w1.from.device: names device g9, which is not there'],
    ['runs.w1.from.terminal', 'c', 'runs.w1.from.terminal: names terminal c, which g1 does not have'],
    ['runs.w1.zoneIds', ['helm', 'hold'], 'runs.w1.zoneIds.1: names zone hold, which is not there'],
    ['runs.w1.cable', 'c1', 'runs.w1.cable: names cable c1, which is not there'],
    ['runs.w1.colour', 'puce', 'runs.w1.colour: must be a colour, or two joined by /'],
    [
      'runs.w1.conductor.size',
      '5 AWG',
      'runs.w1.conductor.size: must be a size from 20 AWG to 4/0 AWG or from 0.75 mm² to 150 mm²',
    ],
    ['runs.w1.conductor.parallel', 0, 'runs.w1.conductor.parallel: must be a whole number from 1'],
    ['runs.w1.work', 'old', 'runs.w1.work: must be one of new, existing, remove'],
    ['devices.g1.kind', 'flux', 'devices.g1.kind: is not a kind of device that is known'],
    ['devices.g1.ratings.nominalV', undefined, 'devices.g1.ratings.nominalV: is missing'],
    ['devices.g1.ratings.crankA', 5, 'devices.g1.ratings.crankA: is not a key of the format'],
    ['devices.g1.ratings.chemistry', 'nicd', 'devices.g1.ratings.chemistry: must be one of flooded, agm, gel, lifepo4'],
    ['devices.g1.rotation', 45, 'devices.g1.rotation: must be one of 0, 90, 180, 270'],
    ['devices.g1.sheetId', 's2', 'devices.g1.sheetId: names sheet s2, which is not there'],
    ['devices.g1.zoneId', 'hold', 'devices.g1.zoneId: names zone hold, which is not there'],
    ['devices.g1.studs', { top: 'M8' }, 'devices.g1.studs.top: is not a terminal of this device'],
    ['devices.f1.ratings.backedUpBy', 'f9', 'devices.f1.ratings.backedUpBy: names device f9, which is not there'],
    ['devices.f1.parent', 'x9', 'devices.f1.parent: names device x9, which is not there'],
    ['devices.f1.parent', 'f1', 'devices.f1.parent: must not lead back to the device itself'],
    [
      'devices.f1.mountedOn',
      { device: 'g1', terminal: 'top' },
      'devices.f1.mountedOn.terminal: names terminal top, which g1 does not have',
    ],
    ['devices.p1.ratings', { nominalV: 12 }, 'devices.p1.ratings.ratedA: is missing: a load has ratedA or ratedW'],
    ['sheets', {}, 'sheets: must hold at least one sheet'],
    ['sheets.s1.paper', 'A0', 'sheets.s1.paper: must be one of A4, A3, A2, letter, tabloid'],
    [
      'modes',
      { m: { id: 'm', name: 'Anchor', states: { p9: { on: true } } } },
      'modes.m.states.p9: names device p9, which is not there',
    ],
    [
      'modes',
      { 'all-on': { id: 'all-on', name: 'All' } },
      'modes.all-on.id: all-on and all-charging are built in and not free for modes',
    ],
    [
      'notes',
      { n: { id: 'n', sheetId: 's9', x: 0, y: 0, text: '' } },
      'notes.n.sheetId: names sheet s9, which is not there',
    ],
    [
      'devices.my id',
      { ...aSmallDesign().devices.g1, id: 'my id' },
      'devices.my id: must be 1 to 64 of A-Z a-z 0-9 _ -',
    ],
    ['devices', [], 'devices: must be an object'],
    ['basis', undefined, 'basis: is missing'],
    ['basis.cable.insulationC', 106, 'basis.cable.insulationC: must be one of 60, 70, 75, 80, 85, 90, 105, 125, 200'],
    ['version', 2, 'version: must be 1'],
    ['format', undefined, 'format: is missing'],
  ])('%s as %j', (path, value, refusal) => {
    expect(said(edited(path, value))).toBe(refusal);
  });

  test('what is not JSON is said to be so', () => {
    expect(readDesign('{ format: }')).toEqual({ ok: false, path: 'file', reason: 'is not JSON' });
    expect(readDesign('')).toEqual({ ok: false, path: 'file', reason: 'is not JSON' });
    expect(readDesign('[]')).toEqual({ ok: false, path: 'file', reason: 'must be an object' });
    expect(readDesign('null')).toEqual({ ok: false, path: 'file', reason: 'must be an object' });
  });

  test('of several things wrong the first in the file is named', () => {
    const twice = edited('runs.w1.lengthM', 0, edited('devices.f1.x', 'left'));
    expect(said(twice)).toBe('devices.f1.x: must be a number');
  });

  test.each(['__proto__', 'constructor', 'prototype', 'toString'])(
    'a key named %s is refused wherever it stands',
    (key) => {
      const text = JSON.stringify(aSmallDesign());
      expect(readDesign(text.replace('"p1":', `"${key}":{},"p1":`))).toMatchObject({
        ok: false,
        path: `devices.${key}`,
      });
      expect(readDesign(text.replace('"basis":{', `"basis":{"${key}":1,`))).toMatchObject({
        ok: false,
        path: `basis.${key}`,
      });
      expect(({} as Record<string, unknown>).polluted).toBeUndefined();
    },
  );

  test('nesting without end is refused, not followed', () => {
    const deep = `{"basis":${'['.repeat(20_000)}${']'.repeat(20_000)}}`;
    expect(readDesign(deep)).toMatchObject({ ok: false, reason: 'is nested too deeply' });
  });
});

describe('reading never throws', () => {
  test('at any JSON', () => {
    fc.assert(
      fc.property(fc.jsonValue(), (value) => {
        expect(readDesignValue(value).ok).toBe(false);
      }),
      { seed: 11, numRuns: 300 },
    );
  });

  test('at a design with any one value replaced by any other', () => {
    const paths = pathsOf(aSmallDesign());
    fc.assert(
      fc.property(fc.constantFrom(...paths), fc.jsonValue({ maxDepth: 2 }), (path, value) => {
        const read = readDesignValue(edited(path, value));
        if (!read.ok) expect(read.reason).not.toBe('');
        else expect(readDesign(writeDesign(read.design)).ok).toBe(true);
      }),
      { seed: 12, numRuns: 500 },
    );
  });

  test('at any text', () => {
    fc.assert(
      fc.property(fc.string(), (text) => {
        expect(typeof readDesign(text).ok).toBe('boolean');
      }),
      { seed: 13, numRuns: 300 },
    );
  });
});

describe('writing', () => {
  test('a design written and read is the same design', () => {
    expect(readDesign(writeDesign(aSmallDesign()))).toEqual({ ok: true, design: aSmallDesign() });
  });

  test('the same design gives the same text, whatever the order of its keys was', () => {
    const backwards = reversed(aSmallDesign()) as ReturnType<typeof aSmallDesign>;
    expect(writeDesign(backwards)).toBe(writeDesign(aSmallDesign()));
    expect(writeDesign(backwards).startsWith('{\n  "format": "ampwright-design",\n  "version": 1,')).toBe(true);
  });

  test.each([
    ['Minnow', 'minnow.ampwright.json'],
    ['Été à l’Île 2', 'ete-a-l-ile-2.ampwright.json'],
    ['../..', 'design.ampwright.json'],
  ])('the file of %s is named %s', (name, file) => {
    expect(fileNameOf({ ...aSmallDesign(), vessel: { name } })).toBe(file);
  });
});

function pathsOf(value: unknown, path = ''): string[] {
  if (typeof value !== 'object' || value === null) return [path];
  const below = Object.entries(value).flatMap(([key, entry]) => pathsOf(entry, path === '' ? key : `${path}.${key}`));
  return path === '' ? below : [path, ...below];
}

function reversed(value: unknown): unknown {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value;
  return Object.fromEntries(
    Object.entries(value)
      .reverse()
      .map(([key, entry]) => [key, reversed(entry)]),
  );
}
