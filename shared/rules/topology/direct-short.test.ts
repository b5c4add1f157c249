import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { directShort } from './direct-short.ts';

const iso = { profile: 'iso-13297' } as const;

testRule(directShort, {
  right: [
    { name: 'a load between the poles', given: fusedRun(15) },
    { name: 'a load between the poles in the ISO profile', given: fusedRun(15, { size: '4 mm²', basis: iso }) },
    {
      name: 'two batteries in parallel',
      given: aDesign()
        .battery('G1')
        .battery('G2')
        .run('W1', 'G1.pos', 'G2.pos', 1, '2 AWG')
        .run('W2', 'G1.neg', 'G2.neg', 1, '2 AWG')
        .build(),
    },
    {
      name: 'two batteries in series',
      given: aDesign().battery('G1').battery('G2').run('W1', 'G1.neg', 'G2.pos', 1, '2 AWG').build(),
    },
  ],
  wrong: [
    {
      name: 'a run from pole to pole',
      given: aDesign().battery().run('W1', 'G1.pos', 'G1.neg', 1, '2 AWG').build(),
      says: ['From the positive of G1 the way W1 leads to a negative with no load on it.'],
      remedies: ['Take W1 away'],
    },
    {
      name: 'a fuse from pole to pole in the ISO profile',
      given: aDesign(iso)
        .battery()
        .fuse('F1', 100)
        .run('W1', 'G1.pos', 'F1.a', 0.1, '25 mm²')
        .run('W2', 'F1.b', 'G1.neg', 0.1, '25 mm²')
        .build(),
      says: ['From the positive of G1 the way W1 and W2 leads to a negative with no load on it.'],
      remedies: [],
    },
    {
      name: 'an open switch from pole to pole',
      given: aDesign()
        .battery()
        .device('Q1', 'switch', { continuousA: 100, normal: 'open' })
        .run('W1', 'G1.pos', 'Q1.a', 1, '2 AWG')
        .run('W2', 'Q1.b', 'G1.neg', 1, '2 AWG')
        .build(),
      says: ['With Q1 closed, the way W1 and W2 leads from the positive of G1 to a negative with no load on it.'],
    },
    {
      name: 'a battery the wrong way round in a bank',
      given: aDesign()
        .battery('G1')
        .battery('G2')
        .run('W1', 'G1.pos', 'G2.neg', 1, '2 AWG')
        .run('W2', 'G1.neg', 'G2.pos', 1, '2 AWG')
        .build(),
      says: ['From the positive of G1 the way W1 leads to a negative with no load on it.'],
      figures: { roundV: 24 },
    },
    {
      name: 'a bank of two with one wrong wire: one finding',
      given: aDesign()
        .battery('G1')
        .battery('G2')
        .run('W1', 'G1.pos', 'G2.pos', 1, '2 AWG')
        .run('W2', 'G1.neg', 'G2.neg', 1, '2 AWG')
        .run('W3', 'G1.pos', 'G1.neg', 1, '2 AWG')
        .build(),
      says: ['From the positive of G1 the way W3 leads to a negative with no load on it.'],
      remedies: ['Take W3 away'],
    },
  ],
});
