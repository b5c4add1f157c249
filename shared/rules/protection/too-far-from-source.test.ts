import type { Run } from '#shared/model/design.ts';
import { aDesign } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { tooFarFromSource } from './too-far-from-source.ts';

const INCH = 0.0254;
const iso = { profile: 'iso-13297' } as const;

/** A fuse at the end of a run of its own from the battery. */
function fuseAt(lengthM: number, runIs: Partial<Run> = {}, more: { iso?: true; stud?: true } = {}) {
  const size = more.iso ? '6 mm²' : '10 AWG';
  return aDesign(more.iso ? iso : {})
    .battery()
    .fuse('F1', 30, {}, more.stud ? { symbol: 'stud' } : {})
    .load('E1', 5)
    .run('W1', 'G1.pos', 'F1.a', lengthM, size, { conductor: {}, ...runIs } as object)
    .run('W2', 'F1.b', 'E1.pos', 1, size)
    .run('W3', 'E1.neg', 'G1.neg', 1, size)
    .build();
}

/** A main fuse on the battery, a busbar, and a fuse of a smaller conductor some way from it. */
function tapAt(lengthM: number, runIs: Partial<Run> = {}) {
  return aDesign()
    .battery()
    .fuse('F1', 200, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
    .busbar('X1', 'dc+')
    .fuse('F2', 10)
    .load('E1', 5)
    .run('W1', 'F1.b', 'X1.1', 1, '2/0 AWG')
    .run('W2', 'X1.2', 'F2.a', lengthM, '14 AWG', runIs as object)
    .run('W3', 'F2.b', 'E1.pos', 1, '14 AWG')
    .run('W4', 'E1.neg', 'G1.neg', 1, '14 AWG')
    .build();
}

/** A fuse at the end of a run from the switch on the way to a starter, 1 m of cable from the battery. */
function crankingTapAt(lengthM: number, runIs: Partial<Run>, from: 'Q1.b' | 'G1.pos' = 'Q1.b') {
  return aDesign()
    .battery()
    .device('Q1', 'switch', { continuousA: 300, role: 'battery' })
    .device('M1', 'starter', { crankA: 200 })
    .fuse('F1', 30)
    .load('E1', 5)
    .run('W1', 'G1.pos', 'Q1.a', 1, '2 AWG', bare)
    .run('W2', 'Q1.b', 'M1.pos', 1, '2 AWG', bare)
    .run('W3', 'M1.neg', 'G1.neg', 1, '2 AWG')
    .run('W4', from, 'F1.a', lengthM, '10 AWG', runIs as object)
    .run('W5', 'F1.b', 'E1.pos', 1, '10 AWG')
    .run('W6', 'E1.neg', 'G1.neg', 1, '10 AWG')
    .build();
}

const sheath = { enclosed: 'sheath' } as const;
const bare = { enclosed: 'none' } as const;

testRule(tooFarFromSource, {
  right: [
    { name: '6.9 in bare', given: fuseAt(6.9 * INCH, bare) },
    { name: '7 in bare', given: fuseAt(7 * INCH, bare) },
    { name: '72 in from a battery in a sheath', given: fuseAt(72 * INCH, sheath) },
    { name: '40 in from a busbar in a sheath', given: tapAt(40 * INCH, sheath) },
    { name: '7 in bare from a stud on the way to a starter', given: crankingTapAt(7 * INCH, bare) },
    { name: '40 in in a sheath from a stud on the way to a starter', given: crankingTapAt(40 * INCH, sheath) },
    {
      name: '72 in in a sheath from the battery that a starter hangs on',
      given: crankingTapAt(72 * INCH, sheath, 'G1.pos'),
    },
    { name: '200 mm bare in the ISO profile', given: fuseAt(0.2, bare, { iso: true }) },
    { name: '1.8 m in a sheath in the ISO profile', given: fuseAt(1.8, sheath, { iso: true }) },
    { name: 'a length that nobody has told', given: fuseAt(0, { lengthM: undefined }) },
    {
      name: 'a bare jumper inside a bank whose fuse sits on one of its studs',
      given: aDesign()
        .battery('G1')
        .battery('G2')
        .fuse('F1', 30, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .load('E1', 5)
        .run('W1', 'G1.pos', 'G2.pos', 0.3, '2 AWG', bare)
        .run('W2', 'G1.neg', 'G2.neg', 0.3, '2 AWG', bare)
        .run('W3', 'F1.b', 'E1.pos', 1, '10 AWG')
        .run('W4', 'E1.neg', 'G2.neg', 1, '10 AWG')
        .build(),
    },
  ],
  wrong: [
    {
      name: '7.1 in bare',
      given: fuseAt(7.1 * INCH, bare),
      says: ['F1 stands 7.1 in from G1 along W1; 7 in is the most for a bare run.'],
      remedies: ['Sheathe W1'],
    },
    {
      name: '7.1 in and not told',
      given: fuseAt(7.1 * INCH, {}, { stud: true }),
      severity: 'should',
      says: [
        'F1 stands 7.1 in from G1 along W1. Bare, 7 in is the most; up to 6 ft it must be in a sheath or enclosure, which nobody has told.',
      ],
      remedies: ['Sheathe W1', 'Put F1 on the stud of G1'],
    },
    {
      name: '73 in from a battery in a sheath',
      given: fuseAt(73 * INCH, sheath, { stud: true }),
      says: ['F1 stands 6 ft 1 in from G1 along W1; 6 ft is the most in a sheath or enclosure.'],
      remedies: ['Put F1 on the stud of G1'],
    },
    {
      name: '71 in unsheathed from a battery, which the law but not ABYC allows',
      given: fuseAt(71 * INCH, bare),
      says: ['F1 stands 5 ft 11 in from G1 along W1; 7 in is the most for a bare run.'],
    },
    {
      name: 'a tap whose fuse is 41 in off in a sheath',
      given: tapAt(41 * INCH, sheath),
      says: ['F2 stands 3 ft 5 in from F1 along W2; 3 ft 4 in is the most in a sheath or enclosure.'],
      remedies: [],
    },
    {
      name: '7.1 in bare from a stud on the way to a starter, measured from that stud',
      given: crankingTapAt(7.1 * INCH, bare),
      says: ['F1 stands 7.1 in from Q1 along W4; 7 in is the most for a bare run.'],
      remedies: ['Sheathe W4'],
    },
    {
      name: '41 in in a sheath from a stud on the way to a starter',
      given: crankingTapAt(41 * INCH, sheath),
      says: ['F1 stands 3 ft 5 in from Q1 along W4; 3 ft 4 in is the most in a sheath or enclosure.'],
      remedies: [],
    },
    {
      name: '201 mm bare in the ISO profile, a hair past 200 mm: the two figures do not read the same',
      given: fuseAt(0.201, bare, { iso: true }),
      says: ['F1 stands 7.91 in from G1 along W1; 7.87 in is the most for a bare run.'],
      remedies: ['Sheathe W1'],
    },
    {
      name: '0.21 m bare in the ISO profile',
      given: fuseAt(0.21, bare, { iso: true }),
      says: ['F1 stands 8.3 in from G1 along W1; 7.9 in is the most for a bare run.'],
      remedies: ['Sheathe W1'],
    },
    {
      name: 'a way over a switch: one finding, on the run at the battery',
      given: aDesign({ units: 'metric' })
        .battery()
        .device('Q1', 'switch', { continuousA: 100 })
        .fuse('F1', 30)
        .load('E1', 5)
        .run('W1', 'G1.pos', 'Q1.a', 0.5, '10 AWG', sheath)
        .run('W2', 'Q1.b', 'F1.a', 0.5, '10 AWG', bare)
        .run('W3', 'F1.b', 'E1.pos', 1, '10 AWG')
        .run('W4', 'E1.neg', 'G1.neg', 1, '10 AWG')
        .build(),
      says: ['F1 stands 1 m from G1 along W1 and W2; 0.178 m is the most for a bare run.'],
      remedies: ['Sheathe W2'],
    },
    {
      name: 'a second battery without a fuse: one finding, on its own run, whatever hangs beyond',
      given: aDesign()
        .battery('G1')
        .battery('G2')
        .fuse('F1', 30, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .device('Q1', 'selector', { continuousA: 200 })
        .fuse('F3', 30)
        .load('E1', 5)
        .run('W1', 'F1.b', 'Q1.1', 1, '10 AWG', sheath)
        .run('W2', 'G2.pos', 'Q1.2', 2, '10 AWG', sheath)
        .run('W3', 'Q1.common', 'F3.a', 1, '10 AWG', sheath)
        .run('W4', 'F3.b', 'E1.pos', 1, '10 AWG')
        .run('W5', 'E1.neg', 'G1.neg', 1, '10 AWG')
        .run('W6', 'G1.neg', 'G2.neg', 1, '10 AWG')
        .build(),
      says: ['F1 stands 9 ft 10 in from G2 along W2 and W1; 6 ft is the most in a sheath or enclosure.'],
    },
  ],
});
