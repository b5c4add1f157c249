import { describe, expect, it } from 'vitest';

import type { Design } from '#shared/model/design.ts';
import { aDesign } from '#shared/testing/build-design.ts';
import { randomFrom } from '#shared/testing/generate-design.ts';
import { aSmallDesign } from '#shared/testing/small-design.ts';

import { analyse } from './analyse.ts';

const SEED = 2026;
const ODD: readonly unknown[] = [
  null,
  undefined,
  NaN,
  Infinity,
  -Infinity,
  0,
  -1,
  1e308,
  1e-308,
  true,
  '',
  'x',
  '12',
  '__proto__',
  [],
  [null],
  {},
];

/** Where the analysis itself says that there may be nothing. */
const MAY_BE_NULL = new Set(['governingMode', 'drop', 'smallestSize', 'recommendedSize', 'autonomyDays']);

/** Two batteries, a selector, a starter, an alternator, a panel and modes: a little of everything. */
function aFullerDesign(): Design {
  return aDesign()
    .zone('engine', { engineSpace: true, ambientC: 50 })
    .battery('G1')
    .battery('G2', { chemistry: 'agm' })
    .fuse('F1', 60, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
    .device('Q1', 'selector', { continuousA: 300 })
    .device('S1', 'switch', { continuousA: 20, role: 'push', normal: 'open' })
    .device('M1', 'starter', { crankA: 200 })
    .device('G3', 'alternator', { maxA: 60, regulatedV: 14.4 })
    .busbar('X1', 'dc+')
    .load('E1', 5, { demand: 'intermittent' })
    .load('E2', 40, { demand: 'momentary', onMinutes: 2, model: 'power', ratedW: 400 })
    .run('W1', 'F1.b', 'Q1.1', 1, '6 AWG', { zoneIds: ['engine'] })
    .run('W2', 'G2.pos', 'Q1.2', 1, '2 AWG')
    .run('W3', 'Q1.common', 'M1.pos', 1, '2 AWG')
    .run('W4', 'Q1.common', 'X1.1', 1, '6 AWG')
    .run('W5', 'X1.2', 'S1.a', 1, '14 AWG', { cable: 'c1' })
    .run('W6', 'S1.b', 'E1.pos', 1, '14 AWG')
    .run('W7', 'X1.3', 'E2.pos', 1, '6 AWG')
    .run('W8', 'G3.pos', 'X1.4', 1, '6 AWG')
    .run('W9', 'E1.neg', 'G1.neg', 1, '14 AWG', { cable: 'c1' })
    .run('W10', 'E2.neg', 'G1.neg', 1, '6 AWG')
    .run('W11', 'M1.neg', 'G1.neg', 1, '2 AWG')
    .run('W12', 'G3.neg', 'G1.neg', 1, '6 AWG')
    .run('W13', 'G2.neg', 'G1.neg', 1, '2 AWG')
    .mode('under-way', { e1: { on: true }, q1: { position: 'both' }, g3: { on: true } })
    .build();
}

describe('a document mangled anyhow', () => {
  it('is worked out without a throw, and with a number wherever one is due', () => {
    const random = randomFrom(SEED);
    const pick = <T>(items: readonly T[]): T => items[Math.floor(random() * items.length)]!;
    const whole = [aSmallDesign(), aFullerDesign()].map((design) => JSON.stringify(design));
    for (let n = 0; n < 200; n++) {
      const design = JSON.parse(pick(whole)) as Design;
      const places: string[] = [];
      for (let times = 1 + Math.floor(random() * 3); times > 0; times--) places.push(mangle(design, pick));
      const tale = `seed ${SEED}, document ${n}: ${places.join(', ')}`;
      let analysis: unknown;
      expect(() => (analysis = analyse(design)), tale).not.toThrow();
      expect(oddFigures(analysis, 'analysis'), tale).toEqual([]);
    }
  });
});

/** Puts something odd at a place of the document, or takes out what is there. */
function mangle(design: object, pick: <T>(items: readonly T[]) => T): string {
  let at = design as Record<string, unknown>;
  let path = '';
  for (;;) {
    const keys = Object.keys(at);
    if (keys.length === 0) return path;
    const key = pick(keys);
    path += `/${key}`;
    const inner = at[key];
    const goesOn = typeof inner === 'object' && inner !== null && pick([true, true, true, false]);
    if (goesOn) {
      at = inner as Record<string, unknown>;
      continue;
    }
    const odd = pick(ODD);
    if (odd === undefined) delete at[key];
    else at[key] = structuredClone(odd);
    return `${path} = ${String(odd)}`;
  }
}

function oddFigures(value: unknown, path: string): string[] {
  if (typeof value === 'number') return Number.isFinite(value) ? [] : [`${path} is ${value}`];
  if (value === null) return MAY_BE_NULL.has(path.split('.').at(-1)!) ? [] : [`${path} is null`];
  if (typeof value === 'string') return /NaN|Infinity|undefined/.test(value) ? [`${path} says ${value}`] : [];
  if (typeof value !== 'object') return [];
  // A remedy's patch hands back what the document has.
  return Object.entries(value).flatMap(([key, inner]) => (key === 'patch' ? [] : oddFigures(inner, `${path}.${key}`)));
}
