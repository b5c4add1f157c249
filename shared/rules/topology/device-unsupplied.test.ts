import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { deviceUnsupplied } from './device-unsupplied.ts';

const iso = { profile: 'iso-13297' } as const;

/** A panel whose busbar the feed never reaches; the battery feeds something else. */
function deadPanel(loads: readonly string[]) {
  const design = aDesign()
    .battery()
    .busbar('X1', 'dc+')
    .busbar('X2', 'dc-')
    .load('E99', 1)
    .run('W1', 'X2.1', 'G1.neg', 1, '10 AWG')
    .run('W98', 'G1.pos', 'E99.pos', 1, '10 AWG')
    .run('W99', 'E99.neg', 'G1.neg', 1, '10 AWG');
  loads.forEach((load, i) => {
    design
      .load(load, 1)
      .run(`W${2 * i + 2}`, `X1.${i + 1}`, `${load}.pos`, 1, '10 AWG')
      .run(`W${2 * i + 3}`, `${load}.neg`, `X2.${i + 2}`, 1, '10 AWG');
  });
  return design;
}

testRule(deviceUnsupplied, {
  right: [
    { name: 'a load on a battery', given: fusedRun(15) },
    { name: 'a load on a battery in the ISO profile', given: fusedRun(15, { size: '4 mm²', basis: iso }) },
    {
      name: 'a horn behind a button',
      given: aDesign()
        .battery()
        .fuse('F1', 10, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .device('S1', 'switch', { continuousA: 10, normal: 'open', role: 'push' })
        .load('P1', 5)
        .run('W1', 'F1.b', 'S1.a', 1, '10 AWG')
        .run('W2', 'S1.b', 'P1.pos', 1, '10 AWG')
        .run('W3', 'P1.neg', 'G1.neg', 1, '10 AWG')
        .build(),
    },
    {
      name: 'loads on the only battery, whose negative is open, which another rule says',
      given: aDesign()
        .battery()
        .fuse('F1', 10, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .load('E1', 5)
        .load('E2', 5)
        .run('W1', 'F1.b', 'E1.pos', 1, '10 AWG')
        .run('W2', 'E1.pos', 'E2.pos', 1, '10 AWG')
        .run('W3', 'E1.neg', 'E2.neg', 1, '10 AWG')
        .build(),
    },
    { name: 'a load with an open terminal, which another rule says', given: aDesign().battery().load('E1', 5).build() },
  ],
  wrong: [
    {
      name: 'a load on a busbar without a feed',
      given: deadPanel(['E1']).build(),
      severity: 'should',
      says: ['E1 is connected, but no source reaches it and leads back.'],
      remedies: [],
    },
    {
      name: 'three loads that one missing feed leaves dead: one finding',
      given: deadPanel(['E2', 'E10', 'E1']).build(),
      says: ['E1 and 2 more are connected, but no source reaches them and leads back.'],
    },
    {
      name: 'a load with both ends on the positive busbar',
      given: aDesign(iso)
        .battery()
        .load('E1', 5)
        .run('W1', 'G1.pos', 'E1.pos', 1, '4 mm²')
        .run('W2', 'G1.pos', 'E1.neg', 1, '4 mm²')
        .build(),
      says: ['E1 is connected, but no source reaches it and leads back.'],
    },
    {
      name: 'a load between two systems that share nothing',
      given: aDesign()
        .battery('G1')
        .battery('G2')
        .load('E1', 5)
        .run('W1', 'G1.pos', 'E1.pos', 1, '10 AWG')
        .run('W2', 'E1.neg', 'G2.neg', 1, '10 AWG')
        .build(),
      says: ['E1 is connected, but no source reaches it and leads back.'],
    },
  ],
});
