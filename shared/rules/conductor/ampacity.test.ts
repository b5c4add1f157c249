import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { ampacity } from './ampacity.ts';

const iso = { profile: 'iso-13297' } as const;

testRule(ampacity, {
  right: [
    // 33 CFR 183.425 Table 5: 16 AWG, 105 °C carries 25 A; in an engine space 21.25 A.
    { name: '25 A on 16 AWG', given: fusedRun(25, { size: '16 AWG', loadA: 25 }) },
    {
      name: '21.25 A on 16 AWG in the engine space',
      given: fusedRun(25, { size: '16 AWG', loadA: 21.25, engineSpace: true }),
    },
    { name: '35 A on 2.5 mm² in the ISO profile', given: fusedRun(40, { size: '2.5 mm²', loadA: 35, basis: iso }) },
    { name: '42 A on 10 AWG, three bundled', given: fusedRun(45, { loadA: 42, bundled: 3 }) },
    {
      name: '60 A on 10 AWG, three bundled, where DC is left out',
      given: fusedRun(60, { loadA: 60, bundled: 3, basis: { bundling: 'ac-only' } }),
    },
    { name: '50 A over two 16 AWG side by side', given: fusedRun(50, { size: '16 AWG', loadA: 50, parallel: 2 }) },
    {
      name: 'a starter of 800 A on a battery cable',
      given: aDesign()
        .battery()
        .device('M1', 'starter', { crankA: 800 })
        .run('W1', 'G1.pos', 'M1.pos', 1, '2 AWG')
        .run('W2', 'M1.neg', 'G1.neg', 1, '2 AWG')
        .mode('start', { m1: { on: true } })
        .build(),
    },
    {
      name: 'a windlass of 100 A for two minutes on 6 AWG in a mode of its own',
      given: aDesign()
        .battery('G1', { capacityAh: 400 })
        .fuse('F1', 150, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .load('M1', 150, { demand: 'momentary', onMinutes: 2 })
        .run('W1', 'F1.b', 'M1.pos', 1, '6 AWG')
        .run('W2', 'M1.neg', 'G1.neg', 1, '6 AWG')
        .mode('anchoring', { m1: { on: true } })
        .build(),
    },
  ],
  wrong: [
    {
      name: '25.1 A on 16 AWG',
      given: fusedRun(25, { size: '16 AWG', loadA: 25.1 }),
      says: [
        'W1 has to carry 25.1 A; 16 AWG carries 25 A there.',
        'W2 has to carry 25.1 A; 16 AWG carries 25 A there.',
      ],
      remedies: ['Use 14 AWG for W1', 'Use 14 AWG for W2'],
      figures: { designCurrentA: 25.1, allowedA: 25, baseA: 25 },
    },
    {
      name: 'a hundredth of an ampere too much: the two figures do not read the same',
      given: fusedRun(30, { size: '16 AWG', loadA: 25.01 }),
      says: [
        'W1 has to carry 25.01 A; 16 AWG carries 25 A there.',
        'W2 has to carry 25.01 A; 16 AWG carries 25 A there.',
      ],
    },
    {
      name: 'a run to a pump by the open switch beside the one that is closed',
      given: aDesign()
        .battery()
        .fuse('F1', 25, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .device('S1', 'switch', { continuousA: 40, role: 'float' })
        .device('S2', 'switch', { continuousA: 40, role: 'branch', normal: 'open' })
        .load('M1', 22)
        .run('W1', 'F1.b', 'S1.a', 1, '10 AWG')
        .run('W2', 'S1.b', 'M1.pos', 1, '10 AWG')
        .run('W3', 'F1.b', 'S2.a', 0.5, '18 AWG', { enclosed: 'enclosure' })
        .run('W4', 'S2.b', 'M1.pos', 1, '10 AWG')
        .run('W5', 'M1.neg', 'G1.neg', 1, '10 AWG')
        .build(),
      says: ['W3 has to carry 22 A; 18 AWG carries 20 A there.'],
      remedies: ['Use 16 AWG for W3'],
    },
    {
      name: '22 A on 16 AWG in the engine space',
      given: fusedRun(25, { size: '16 AWG', loadA: 22, engineSpace: true }),
      says: [
        'W1 has to carry 22 A; 16 AWG carries 21.3 A there.',
        'W2 has to carry 22 A; 16 AWG carries 21.3 A there.',
      ],
      remedies: ['Use 14 AWG for W1', 'Use 14 AWG for W2'],
      figures: { allowedA: 21.25, ambientC: 50 },
    },
    {
      name: '36 A on 2.5 mm² in the ISO profile',
      given: fusedRun(40, { size: '2.5 mm²', loadA: 36, basis: iso }),
      says: ['W1 has to carry 36 A; 2.5 mm² carries 35 A there.', 'W2 has to carry 36 A; 2.5 mm² carries 35 A there.'],
      remedies: ['Use 4 mm² for W1', 'Use 4 mm² for W2'],
    },
    {
      name: 'insulation of 60 °C in an engine space of the ISO profile',
      given: fusedRun(10, { size: '2.5 mm²', insulationC: 60, engineSpace: true, basis: iso }),
      says: [
        'W1 passes a place of 50 °C, where insulation for 60 °C may not be used.',
        'W2 passes a place of 50 °C, where insulation for 60 °C may not be used.',
      ],
      remedies: ['Use 105 °C insulation for W1', 'Use 105 °C insulation for W2'],
    },
    {
      // 60 W at the low cut-out of 10.5 V is 5.714 A for each 60 W: 315 W are 30 A, though 25 A at 12.6 V.
      name: 'a load of constant power, counted at its low cut-out',
      given: fusedRun(30, { size: '16 AWG', load: { ratedA: undefined, ratedW: 315, model: 'power' } }),
      says: ['W1 has to carry 30 A; 16 AWG carries 25 A there.', 'W2 has to carry 30 A; 16 AWG carries 25 A there.'],
    },
    {
      name: 'a horn behind a button that nobody presses in any mode',
      given: aDesign()
        .battery()
        .fuse('F1', 30, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .device('S1', 'switch', { continuousA: 40, normal: 'open', role: 'push' })
        .load('P1', 28, { demand: 'intermittent' })
        .run('W1', 'F1.b', 'S1.a', 1, '10 AWG')
        .run('W2', 'S1.b', 'P1.pos', 1, '16 AWG')
        .run('W3', 'P1.neg', 'G1.neg', 1, '10 AWG')
        .build(),
      says: ['W2 has to carry 28 A; 16 AWG carries 25 A there.'],
    },
    {
      // E-11's load worksheet: 20 A continuous and the greater of 18 A and a tenth of 18 + 10 A.
      name: 'a feed of one continuous and two intermittent loads',
      given: aDesign()
        .battery()
        .fuse('F1', 40, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .busbar('X1', 'dc+')
        .busbar('X2', 'dc-')
        .load('E1', 20)
        .load('E2', 18, { demand: 'intermittent' })
        .load('E3', 10, { demand: 'intermittent' })
        .run('W1', 'F1.b', 'X1.1', 1, '14 AWG')
        .run('W2', 'X1.2', 'E1.pos', 1, '10 AWG')
        .run('W3', 'X1.3', 'E2.pos', 1, '10 AWG')
        .run('W4', 'X1.4', 'E3.pos', 1, '10 AWG')
        .run('W5', 'E1.neg', 'X2.1', 1, '10 AWG')
        .run('W6', 'E2.neg', 'X2.2', 1, '10 AWG')
        .run('W7', 'E3.neg', 'X2.3', 1, '10 AWG')
        .run('W8', 'X2.4', 'G1.neg', 1, '10 AWG')
        .build(),
      says: ['W1 has to carry 38 A; 14 AWG carries 35 A there.'],
      remedies: ['Use 12 AWG for W1'],
    },
    {
      name: 'an alternator of 60 A behind a run that no load fills',
      given: aDesign()
        .battery()
        .device('G2', 'alternator', { maxA: 60, regulatedV: 14.4 })
        .fuse('F1', 60, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .run('W1', 'F1.b', 'G2.pos', 1, '12 AWG')
        .run('W2', 'G2.neg', 'G1.neg', 1, '10 AWG')
        .build(),
      says: ['W1 has to carry 60 A; 12 AWG carries 45 A there.'],
      remedies: ['Use 10 AWG for W1'],
    },
  ],
});
