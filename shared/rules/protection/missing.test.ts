import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { missing } from './missing.ts';

const iso = { profile: 'iso-13297' } as const;
const onStud = { mountedOn: { device: 'g1', terminal: 'pos' } };
const says = (source: string, run: string, size: string) =>
  `No fuse or breaker stands between ${source} and ${run}; its ${size} would burn on a short circuit.`;

/** Two banks, each with its own load side, joined by W2 with the fuses that are given. */
function twoBanks(fuses: readonly string[]) {
  const design = aDesign().battery('G1').battery('G2').run('W9', 'G1.neg', 'G2.neg', 1, '2 AWG');
  const near = fuses.includes('F1') ? 'F1.b' : 'G1.pos';
  const far = fuses.includes('F2') ? 'F2.b' : 'G2.pos';
  if (fuses.includes('F1')) design.fuse('F1', 200, {}, onStud);
  if (fuses.includes('F2')) design.fuse('F2', 200, {}, { mountedOn: { device: 'g2', terminal: 'pos' } });
  return design
    .device('Q1', 'switch', { continuousA: 300, role: 'emergencyParallel', normal: 'open' })
    .run('W1', near, 'Q1.a', 2, '2/0 AWG')
    .run('W2', 'Q1.b', far, 2, '2/0 AWG')
    .build();
}

testRule(missing, {
  right: [
    { name: 'a fuse on the battery', given: fusedRun(15) },
    { name: 'a fuse on the battery in the ISO profile', given: fusedRun(15, { size: '4 mm²', basis: iso }) },
    {
      name: 'a starter on its own cables',
      given: aDesign()
        .battery()
        .device('M1', 'starter', { crankA: 300 })
        .device('Q1', 'switch', { continuousA: 300, role: 'battery' })
        .run('W1', 'G1.pos', 'Q1.a', 1, '2 AWG')
        .run('W2', 'Q1.b', 'M1.pos', 1, '2 AWG')
        .run('W3', 'M1.neg', 'G1.neg', 1, '2 AWG')
        .build(),
    },
    {
      name: 'a jumper inside a bank of two, fused at its take-off',
      given: aDesign()
        .battery('G1')
        .battery('G2')
        .fuse('F1', 15, {}, onStud)
        .load('E1', 5)
        .run('W1', 'G1.pos', 'G2.pos', 0.3, '2 AWG')
        .run('W2', 'G1.neg', 'G2.neg', 0.3, '2 AWG')
        .run('W3', 'F1.b', 'E1.pos', 1, '10 AWG')
        .run('W4', 'E1.neg', 'G2.neg', 1, '10 AWG')
        .build(),
    },
    {
      name: 'the series link of two 6 V batteries',
      given: aDesign()
        .battery('G1', { nominalV: 6, emfV: 6.4 })
        .battery('G2', { nominalV: 6, emfV: 6.4 })
        .fuse('F1', 15, {}, onStud)
        .load('E1', 5)
        .run('W1', 'G1.neg', 'G2.pos', 0.3, '2 AWG')
        .run('W3', 'F1.b', 'E1.pos', 1, '10 AWG')
        .run('W4', 'E1.neg', 'G2.neg', 1, '10 AWG')
        .build(),
    },
    {
      name: 'an alternator that limits itself, fused at the battery',
      given: aDesign()
        .battery()
        .device('G2', 'alternator', { maxA: 60, regulatedV: 14.4 })
        .fuse('F1', 70, {}, onStud)
        .run('W1', 'F1.b', 'G2.pos', 1, '8 AWG')
        .run('W2', 'G2.neg', 'G1.neg', 1, '8 AWG')
        .build(),
    },
    { name: 'a run between two banks with a fuse at each', given: twoBanks(['F1', 'F2']) },
    { name: 'a return, which is grounded', given: fusedRun(15, { lengthM: 8 }) },
  ],
  wrong: [
    {
      name: 'a load straight on the battery',
      given: fusedRun(0, { protectedBy: null }),
      says: [says('G1', 'W1', '10 AWG')],
      remedies: ['Put a fuse of 10 A on G1'],
    },
    {
      name: 'a load straight on the battery in the ISO profile',
      given: fusedRun(0, { size: '4 mm²', protectedBy: null, basis: iso }),
      says: [says('G1', 'W1', '4 mm²')],
      remedies: ['Put a fuse of 10 A on G1'],
    },
    {
      name: 'two runs over a switch: one finding, on the one at the battery',
      given: aDesign()
        .battery()
        .device('Q1', 'switch', { continuousA: 20 })
        .load('E1', 5)
        .run('W1', 'G1.pos', 'Q1.a', 1, '10 AWG')
        .run('W2', 'Q1.b', 'E1.pos', 1, '14 AWG')
        .run('W3', 'E1.neg', 'G1.neg', 1, '14 AWG')
        .build(),
      says: [says('G1', 'W1', '10 AWG')],
      remedies: ['Put a fuse of 10 A on G1'],
    },
    {
      name: 'a branch that leaves the way to the fuse before it',
      given: aDesign()
        .battery()
        .busbar('X1', 'dc+')
        .fuse('F1', 15)
        .load('E1', 5)
        .load('E2', 5)
        .run('W1', 'G1.pos', 'X1.1', 0.05, '10 AWG')
        .run('W2', 'X1.2', 'F1.a', 0.05, '10 AWG')
        .run('W3', 'F1.b', 'E1.pos', 1, '14 AWG')
        .run('W4', 'X1.3', 'E2.pos', 1, '14 AWG')
        .run('W5', 'E1.neg', 'G1.neg', 1, '14 AWG')
        .run('W6', 'E2.neg', 'G1.neg', 1, '14 AWG')
        .build(),
      says: [says('G1', 'W4', '14 AWG')],
    },
    {
      name: 'what leaves the path of the starter',
      given: aDesign()
        .battery()
        .device('M1', 'starter', { crankA: 300 })
        .load('E1', 5)
        .run('W1', 'G1.pos', 'M1.pos', 1, '2 AWG')
        .run('W2', 'M1.neg', 'G1.neg', 1, '2 AWG')
        .run('W3', 'M1.pos', 'E1.pos', 1, '14 AWG')
        .run('W4', 'E1.neg', 'G1.neg', 1, '14 AWG')
        .build(),
      says: [says('G1', 'W3', '14 AWG')],
    },
    {
      name: 'an alternator that says it does not limit itself',
      given: aDesign()
        .battery()
        .device('G2', 'alternator', { maxA: 60, regulatedV: 14.4, selfLimiting: false })
        .load('E1', 5)
        .run('W1', 'G2.pos', 'E1.pos', 1, '10 AWG')
        .run('W2', 'E1.neg', 'G2.neg', 1, '10 AWG')
        .build(),
      says: [says('G2', 'W1', '10 AWG')],
    },
    {
      name: 'both poles of an ungrounded system with a fuse in one',
      given: fusedRun(15, { basis: { dcSystem: 'ungrounded' } }),
      says: [says('G1', 'W2', '10 AWG')],
    },
  ],
});
