import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { voltageDrop } from './voltage-drop.ts';

const FOOT = 0.3048;
const noDrop = { coldMilliohm: 0 };

/** The published example of a bilge pump: 12 V, 10 A, 11 ft out and 10 ft back. */
function bilgePump(size: string, criticalLimit?: number) {
  return aDesign(criticalLimit === undefined ? {} : { dropLimits: { critical: criticalLimit } })
    .battery()
    .fuse('F1', 15, noDrop, { mountedOn: { device: 'g1', terminal: 'pos' } })
    .load('M1', 10, { duty: 'bilge' })
    .run('W1', 'F1.b', 'M1.pos', 11 * FOOT, size)
    .run('W2', 'M1.neg', 'G1.neg', 10 * FOOT, size)
    .build();
}

/** A panel of two fused branches, 30 A and 20 A, on 8 AWG. */
function panelFedBy(lengthM: number) {
  return aDesign()
    .battery()
    .fuse('F1', 80, noDrop, { mountedOn: { device: 'g1', terminal: 'pos' } })
    .busbar('X1', 'dc+')
    .busbar('X2', 'dc-')
    .fuse('F2', 40, noDrop, { mountedOn: { device: 'x1', terminal: '2' } })
    .fuse('F3', 40, noDrop, { mountedOn: { device: 'x1', terminal: '3' } })
    .load('E1', 30)
    .load('E2', 20)
    .run('W1', 'F1.b', 'X1.1', lengthM, '8 AWG')
    .run('W2', 'X2.1', 'G1.neg', lengthM, '8 AWG')
    .run('W3', 'F2.b', 'E1.pos', 0.5, '8 AWG')
    .run('W4', 'E1.neg', 'X2.2', 0.5, '8 AWG')
    .run('W5', 'F3.b', 'E2.pos', 0.5, '8 AWG')
    .run('W6', 'E2.neg', 'X2.3', 0.5, '8 AWG')
    .build();
}

testRule(voltageDrop, {
  right: [
    { name: 'the bilge pump on 12 AWG at 3 %', given: bilgePump('12 AWG') },
    { name: 'the same on 16 AWG where 10 % is allowed', given: bilgePump('16 AWG', 0.1) },
    // 0.36 V at 10 A on 10 AWG: 0.36 x 10,380 / (10.75 x 10) = 34.761 ft out and back.
    {
      name: 'a critical load just within 3 %',
      given: fusedRun(15, { loadA: 10, lengthM: 17.38 * FOOT, load: { dropClass: 'critical' }, fuse: noDrop }),
    },
    {
      // 1.2 V at 10 A on 2.5 mm² at 50 °C, 9.178 mΩ/m: 13.074 m out and back.
      name: 'a general load just within 10 % in the ISO profile',
      given: fusedRun(15, {
        size: '2.5 mm²',
        loadA: 10,
        lengthM: 6.537,
        fuse: noDrop,
        basis: { profile: 'iso-13297' },
      }),
    },
    {
      name: 'a path with a run of unknown length',
      given: fusedRun(15, { size: '16 AWG', loadA: 10, lengthM: 30, runIs: { lengthM: undefined }, fuse: noDrop }),
    },
    {
      name: 'a run whose measured resistance is small',
      given: fusedRun(15, { size: '16 AWG', loadA: 10, lengthM: 30, runIs: { milliohm: 5 }, fuse: noDrop }),
    },
    { name: "a panel's feeder just within 3 %", given: panelFedBy(1.685) },
  ],
  wrong: [
    {
      name: 'the bilge pump on 14 AWG',
      given: bilgePump('14 AWG'),
      says: [
        'M1 loses 0.55 V of its 12 V on the way there and back, 4.6 %; 3 % is the limit. W1 has the greatest part, 0.29 V.',
      ],
      // 10.75 x 10 x 21 / 4,110 = 0.5493 V.
      figures: { lostV: 0.5493, fraction: 0.0458, limit: 0.03 },
      remedies: ['Use 12 AWG for W1 and W2'],
    },
    {
      name: 'a critical load just beyond 3 %',
      given: fusedRun(15, { loadA: 10, lengthM: 17.39 * FOOT, load: { dropClass: 'critical' }, fuse: noDrop }),
      says: [
        'E1 loses 0.36 V of its 12 V on the way there and back, 3.002 %; 3 % is the limit. W1 has the greatest part, 0.18 V.',
      ],
      remedies: ['Use 8 AWG for W1'],
    },
    {
      name: 'a general load just beyond 10 % in the ISO profile',
      given: fusedRun(15, {
        size: '2.5 mm²',
        loadA: 10,
        lengthM: 6.545,
        fuse: noDrop,
        basis: { profile: 'iso-13297' },
      }),
      says: [
        'E1 loses 1.2 V of its 12 V on the way there and back, 10.01 %; 10 % is the limit. W1 has the greatest part, 0.6 V.',
      ],
    },
    {
      name: 'a drop that only the fuse brings above the limit',
      given: fusedRun(10, { loadA: 10, lengthM: 17 * FOOT, load: { dropClass: 'critical' } }),
      severity: 'should',
      says: [
        'E1 loses 0.45 V of its 12 V with fuses and contacts counted, 3.8 %; 3 % is the limit. The conductors alone lose 0.35 V.',
      ],
    },
    {
      name: 'a run that is told critical makes its load critical',
      given: fusedRun(15, { loadA: 10, lengthM: 8, size: '12 AWG', runIs: { dropClass: 'critical' }, fuse: noDrop }),
      says: [
        'E1 loses 0.86 V of its 12 V on the way there and back, 7.2 %; 3 % is the limit. W1 has the greatest part, 0.43 V.',
      ],
    },
    {
      name: 'an existing feed and a new return: the new one is made thicker',
      given: aDesign()
        .battery()
        .fuse('F1', 15, noDrop, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .load('M1', 10, { duty: 'bilge' })
        .run('W1', 'F1.b', 'M1.pos', 11 * FOOT, '12 AWG', { work: 'existing' })
        .run('W2', 'M1.neg', 'G1.neg', 10 * FOOT, '14 AWG')
        .build(),
      says: [
        'M1 loses 0.44 V of its 12 V on the way there and back, 3.7 %; 3 % is the limit. W2 has the greatest part, 0.26 V.',
      ],
      remedies: ['Use 12 AWG for W2'],
    },
    {
      name: 'a starter of 300 A at the end of a thin cable',
      given: aDesign()
        .battery()
        .device('M1', 'starter', { crankA: 300 })
        .run('W1', 'G1.pos', 'M1.pos', 6, '2 AWG')
        .run('W2', 'M1.neg', 'G1.neg', 6, '2 AWG')
        .build(),
      severity: 'should',
      says: [
        'M1 loses 1.91 V of its 12 V on the way there and back, 15.9 %; 10 % is the limit. W1 has the greatest part, 0.96 V.',
      ],
    },
    {
      name: 'a light that shares its feed with a windlass: a note, for the light alone is right',
      given: aDesign()
        .battery('G1', { capacityAh: 400 })
        .fuse('F1', 120, noDrop, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .busbar('X1', 'dc+')
        .load('M1', 100, { demand: 'momentary', onMinutes: 2 })
        .load('E1', 2, { duty: 'navLight' })
        .run('W1', 'F1.b', 'X1.1', 8, '2 AWG')
        .run('W2', 'X1.2', 'M1.pos', 0.5, '2 AWG')
        .run('W3', 'M1.neg', 'G1.neg', 4, '2 AWG')
        .run('W4', 'X1.3', 'E1.pos', 2, '2 AWG')
        .run('W5', 'E1.neg', 'G1.neg', 4, '10 AWG')
        .build(),
      severity: 'note',
      says: [
        'E1 loses 0.46 V of its 12 V, 3.9 %, while the short-time loads on its path run; 3 % is the limit for what lasts.',
      ],
    },
    {
      // 10.75 / 0.3048 / 16,510 = 2.1362 mΩ/m of 8 AWG; 7 m there and back at 50 A: 0.7477 V.
      name: "a panel's feeder that all its branches together are too much for",
      given: panelFedBy(3.5),
      says: [
        'The feeder of X1 loses 0.75 V of 12 V there and back with all that its branches ask for, 6.2 %; 3 % is the limit. W1 has the greatest part, 0.37 V.',
      ],
      figures: { lostV: 0.7477, fraction: 0.0623 },
      remedies: ['Use 4 AWG for W1 and W2'],
    },
    {
      // 0.36 V / 50 A / 2.1362 mΩ/m = 3.3704 m there and back.
      name: "a panel's feeder just beyond 3 %",
      given: panelFedBy(1.6855),
      says: [
        'The feeder of X1 loses 0.36 V of 12 V there and back with all that its branches ask for, 3.001 %; 3 % is the limit. W1 has the greatest part, 0.18 V.',
      ],
    },
    {
      name: 'two cores of one cable, which are sized together',
      given: fusedRun(15, { loadA: 10, lengthM: 10, size: '16 AWG', fuse: noDrop, runIs: { cable: 'c1' } }),
      says: [
        'E1 loses 2.73 V of its 12 V on the way there and back, 22.8 %; 10 % is the limit. W1 has the greatest part, 1.37 V.',
      ],
      remedies: ['Use 10 AWG for W1 and W2'],
    },
  ],
});
