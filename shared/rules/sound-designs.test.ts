import { describe, expect, it } from 'vitest';

import type { Design } from '#shared/model/design.ts';
import { aDesign, fusedRun, type DesignBuilder } from '#shared/testing/build-design.ts';
import { mustFix } from '#shared/testing/test-rule.ts';

const onG1 = { mountedOn: { device: 'g1', terminal: 'pos' } };
const sheath = { enclosed: 'sheath' } as const;

/** Battery, main fuse, switch, two busbars; branches are added to X1 and X2. */
function mains(design: DesignBuilder = aDesign()): DesignBuilder {
  return design
    .battery('G1', { capacityAh: 200, ccaA: 900 })
    .fuse('F1', 150, { family: 'class T' }, onG1)
    .device('Q1', 'switch', { continuousA: 300, role: 'battery' })
    .busbar('X1', 'dc+')
    .busbar('X2', 'dc-')
    .run('W1', 'F1.b', 'Q1.a', 0.5, '1 AWG')
    .run('W2', 'Q1.b', 'X1.1', 1, '1 AWG')
    .run('W3', 'X2.1', 'G1.neg', 1.5, '1 AWG');
}

/** What an experienced fitter would leave as it is. */
const SOUND: readonly [string, Design][] = [
  ['a lamp on its own fuse', fusedRun(10, { loadA: 2, size: '14 AWG', lengthM: 3 })],
  ['the same in millimetres', fusedRun(10, { loadA: 2, size: '2.5 mm²', lengthM: 3, basis: { profile: 'iso-13297' } })],
  [
    'a bilge pump in a hot bilge',
    fusedRun(15, { loadA: 8, size: '12 AWG', lengthM: 1.5, engineSpace: true, load: { duty: 'bilge' } }),
  ],
  [
    'a main fuse 6 ft from the battery in conduit',
    aDesign()
      .battery()
      .fuse('F1', 100)
      .load('E1', 20)
      .run('W1', 'G1.pos', 'F1.a', 1.8, '4 AWG', { enclosed: 'conduit' })
      .run('W2', 'F1.b', 'E1.pos', 2, '4 AWG')
      .run('W3', 'E1.neg', 'G1.neg', 2, '4 AWG')
      .build(),
  ],
  [
    'mains with a fused branch from the busbar',
    mains()
      .fuse('F2', 10, { family: 'blade' })
      .load('E1', 4)
      .run('W4', 'X1.2', 'F2.a', 0, '14 AWG', { link: true })
      .run('W5', 'F2.b', 'E1.pos', 3, '14 AWG')
      .run('W6', 'E1.neg', 'X2.2', 3, '14 AWG')
      .build(),
  ],
  [
    'a six-way fuse panel 3 ft from the busbar in a sheath',
    [1, 2, 3, 4, 5, 6]
      .reduce(
        (design, n) =>
          design
            .fuse(`F${n + 2}`, 10, { family: 'blade' })
            .load(`E${n}`, 3)
            .run(`W${n}0`, `X3.${n + 1}`, `F${n + 2}.a`, 0, '10 AWG', { link: true })
            .run(`W${n}1`, `F${n + 2}.b`, `E${n}.pos`, 3, '14 AWG')
            .run(`W${n}2`, `E${n}.neg`, `X2.${n + 2}`, 3, '14 AWG'),
        mains()
          .fuse('F2', 40)
          .busbar('X3', 'dc+')
          .run('W4', 'X1.2', 'F2.a', 0.9, '8 AWG', sheath)
          .run('W5', 'F2.b', 'X3.1', 2, '8 AWG'),
      )
      .build(),
  ],
  [
    'a start battery and its starter',
    aDesign()
      .battery('G1', { ccaA: 800 })
      .device('Q1', 'switch', { continuousA: 300, role: 'battery' })
      .device('M1', 'starter', { crankA: 200 })
      .run('W1', 'G1.pos', 'Q1.a', 0.5, '2 AWG')
      .run('W2', 'Q1.b', 'M1.pos', 1, '2 AWG')
      .run('W3', 'M1.neg', 'G1.neg', 1.5, '2 AWG')
      .build(),
  ],
  [
    'two batteries on a selector to one starter',
    aDesign()
      .battery('G1')
      .battery('G2')
      .device('Q1', 'selector', { continuousA: 300, normal: 'both' })
      .device('M1', 'starter', { crankA: 200 })
      .run('W1', 'G1.pos', 'Q1.1', 0.5, '2 AWG')
      .run('W2', 'G2.pos', 'Q1.2', 0.5, '2 AWG')
      .run('W3', 'Q1.common', 'M1.pos', 1, '2 AWG')
      .run('W4', 'M1.neg', 'G1.neg', 1.5, '2 AWG')
      .run('W5', 'G1.neg', 'G2.neg', 0.5, '2 AWG')
      .build(),
  ],
  [
    'an alternator fused at the busbar only',
    mains()
      .device('G2', 'alternator', { maxA: 110, regulatedV: 14.4 })
      .fuse('F2', 150, { family: 'class T' })
      .run('W4', 'X1.3', 'F2.a', 0.1, '1 AWG')
      .run('W5', 'F2.b', 'G2.pos', 2, '1 AWG')
      .run('W6', 'G2.neg', 'X2.3', 2, '1 AWG')
      .build(),
  ],
  [
    'a windlass of 80 A for three minutes',
    mains()
      .fuse('F2', 80)
      .load('M1', 80, { demand: 'momentary', onMinutes: 3 })
      .run('W4', 'X1.3', 'F2.a', 0.1, '4 AWG')
      .run('W5', 'F2.b', 'M1.pos', 4, '4 AWG')
      .run('W6', 'M1.neg', 'X2.3', 4, '4 AWG')
      .build(),
  ],
  [
    'a bank of two in parallel, taken off crosswise',
    aDesign()
      .battery('G1')
      .battery('G2')
      .fuse('F1', 100, {}, onG1)
      .load('E1', 30)
      .run('W1', 'G1.pos', 'G2.pos', 0.3, '2 AWG')
      .run('W2', 'G1.neg', 'G2.neg', 0.3, '2 AWG')
      .run('W3', 'F1.b', 'E1.pos', 2, '4 AWG')
      .run('W4', 'E1.neg', 'G2.neg', 2, '4 AWG')
      .build(),
  ],
  [
    'two 12 V batteries in series for 24 V',
    aDesign()
      .battery('G1')
      .battery('G2')
      .fuse('F1', 50, {}, onG1)
      .load('E1', 20, { nominalV: 24 })
      .run('W1', 'G1.neg', 'G2.pos', 0.3, '2 AWG')
      .run('W3', 'F1.b', 'E1.pos', 3, '8 AWG')
      .run('W4', 'E1.neg', 'G2.neg', 3, '8 AWG')
      .build(),
  ],
  ['two runs side by side that share the load', fusedRun(50, { loadA: 40, size: '10 AWG', parallel: 2, lengthM: 1 })],
  [
    'a refit: what exists stays with an unknown rating',
    fusedRun(10, { fuse: { maxV: undefined }, fuseIs: { work: 'existing' } }),
  ],
  [
    'an emergency parallel switch between fused banks',
    aDesign()
      .battery('G1')
      .battery('G2')
      .fuse('F1', 175, { family: 'class T' }, onG1)
      .fuse('F2', 175, { family: 'class T' }, { mountedOn: { device: 'g2', terminal: 'pos' } })
      .device('Q1', 'switch', { continuousA: 300, role: 'emergencyParallel', normal: 'open' })
      .run('W1', 'F1.b', 'Q1.a', 1, '2 AWG')
      .run('W2', 'Q1.b', 'F2.b', 1, '2 AWG')
      .run('W3', 'G1.neg', 'G2.neg', 1, '2 AWG')
      .build(),
  ],
];

describe('sound practice is left in peace', () => {
  it.each(SOUND)('%s', (_, design) => expect(mustFix(design)).toEqual([]));
});
