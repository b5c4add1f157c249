import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { ratingAboveAmpacity } from './rating-above-ampacity.ts';

testRule(ratingAboveAmpacity, {
  right: [
    { name: 'a rating equal to the ampacity', given: fusedRun(120, { size: '6 AWG' }) },
    { name: 'a run without protection', given: fusedRun(500, { size: '6 AWG', protectedBy: null }) },
    // 16 AWG of 75 °C in an engine space carries 11.25 A; the next standard rating is 15 A, 133 % of it.
    {
      name: 'the next standard rating, below 150 %',
      given: fusedRun(15, { size: '16 AWG', insulationC: 75, engineSpace: true }),
    },
    { name: '150 % in the ISO profile', given: fusedRun(67, { size: '4 mm²', basis: { profile: 'iso-13297' } }) },
    {
      name: '90 A on 10 AWG where the basis goes to 150 %',
      given: fusedRun(90, { basis: { ratingAbove: '150-percent' } }),
    },
    {
      name: 'the table value in an engine space, where the basis takes the law by its letter',
      given: fusedRun(120, { size: '6 AWG', engineSpace: true, basis: { ratingOf: 'table' } }),
    },
    {
      name: 'a smaller tap whose own fuse stands 7 in off',
      given: aDesign()
        .battery()
        .fuse('F1', 200, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .busbar('X1', 'dc+')
        .run('W1', 'F1.b', 'X1.1', 1, '2/0 AWG')
        .run('W2', 'X1.2', 'F2.a', 0.1778, '16 AWG')
        .fuse('F2', 10)
        .load('E1', 5)
        .run('W3', 'F2.b', 'E1.pos', 1, '16 AWG')
        .run('W4', 'E1.neg', 'G1.neg', 1, '16 AWG')
        .build(),
    },
    {
      name: 'a breaker of 70 A on 10 AWG behind the only main fuse, of 60 A',
      given: aDesign()
        .battery()
        .fuse('F1', 60, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .fuse('F2', 70)
        .load('E1', 20)
        .run('W1', 'F1.b', 'F2.a', 1, '10 AWG')
        .run('W2', 'F2.b', 'E1.pos', 1, '10 AWG')
        .run('W3', 'E1.neg', 'G1.neg', 1, '10 AWG')
        .build(),
    },
  ],
  wrong: [
    {
      name: 'a rating that is right in the cabin but not in the engine space',
      given: fusedRun(125, { size: '6 AWG', engineSpace: true }),
      says: ['F1 is rated 125 A; W1 carries 102 A, so no more than 110 A may stand ahead of it.'],
      remedies: ['Use 110 A for F1', 'Use 4 AWG for W1'],
      figures: { ratedA: 125, allowedA: 102, allowedRatingA: 110 },
    },
    {
      name: 'one standard rating more than the wire allows',
      given: fusedRun(20, { size: '16 AWG', insulationC: 75, engineSpace: true }),
      says: ['F1 is rated 20 A; W1 carries 11.3 A, so no more than 15 A may stand ahead of it.'],
      remedies: ['Use 15 A for F1', 'Use 12 AWG for W1'],
    },
    {
      name: 'more than 150 % in the ISO profile',
      given: fusedRun(68, { size: '4 mm²', basis: { profile: 'iso-13297' } }),
      says: ['F1 is rated 68 A; W1 carries 45 A, so no more than 67.5 A may stand ahead of it.'],
      remedies: ['Use 60 A for F1', 'Use 6 mm² for W1'],
    },
    {
      name: 'an existing fuse ahead of a new wire: the wire is changed first',
      given: fusedRun(125, { size: '6 AWG', engineSpace: true, fuseIs: { work: 'existing' } }),
      says: ['F1 is rated 125 A; W1 carries 102 A, so no more than 110 A may stand ahead of it.'],
      remedies: ['Use 4 AWG for W1', 'Use 110 A for F1'],
    },
    {
      name: 'a locked fuse: only the wire is offered',
      given: fusedRun(125, { size: '6 AWG', engineSpace: true, fuseIs: { locked: true } }),
      says: ['F1 is rated 125 A; W1 carries 102 A, so no more than 110 A may stand ahead of it.'],
      remedies: ['Use 4 AWG for W1'],
    },
    {
      name: 'a smaller tap with no fuse of its own',
      given: aDesign()
        .battery()
        .fuse('F1', 200, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .busbar('X1', 'dc+')
        .run('W1', 'F1.b', 'X1.1', 1, '2/0 AWG')
        .load('E1', 5)
        .run('W3', 'X1.2', 'E1.pos', 1, '16 AWG')
        .run('W4', 'E1.neg', 'G1.neg', 1, '16 AWG')
        .build(),
      says: ['F1 is rated 200 A; W3 carries 25 A, so no more than 25 A may stand ahead of it.'],
      remedies: ['Use 25 A for F1', 'Use 3 AWG for W3'],
    },
    {
      name: 'two fuses side by side, which open only together',
      given: aDesign()
        .battery()
        .fuse('F1', 60, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .fuse('F2', 60, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .busbar('X1', 'dc+')
        .load('E1', 50)
        .run('W1', 'F1.b', 'X1.1', 0, '10 AWG', { link: true })
        .run('W2', 'F2.b', 'X1.2', 0, '10 AWG', { link: true })
        .run('W3', 'X1.3', 'E1.pos', 1, '10 AWG')
        .run('W4', 'E1.neg', 'G1.neg', 1, '10 AWG')
        .build(),
      says: [
        'F1 and F2 side by side pass 120 A before they open; W3 carries 60 A, so no more than 60 A may stand ahead of it.',
      ],
      remedies: ['Use 6 AWG for W3'],
    },
    {
      // 4 AWG carries 160 A; the next standard rating above it is 175 A.
      name: 'a main fuse too large for its own feeder: one finding for the runs in a row, which are no tap',
      given: aDesign()
        .battery()
        .fuse('F1', 250, { family: 'bolt-down' }, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .device('Q1', 'switch', { continuousA: 300, role: 'battery' })
        .busbar('X1', 'dc+')
        .fuse('F11', 10, {}, { mountedOn: { device: 'x1', terminal: '2' } })
        .load('E1', 5)
        .run('W1', 'F1.b', 'Q1.a', 0.5, '4 AWG')
        .run('W2', 'Q1.b', 'X1.1', 3, '4 AWG')
        .run('W3', 'F11.b', 'E1.pos', 1, '10 AWG')
        .run('W4', 'E1.neg', 'G1.neg', 1, '10 AWG')
        .build(),
      says: ['F1 is rated 250 A; W1 carries 160 A, so no more than 175 A may stand ahead of it.'],
      remedies: ['Use 175 A for F1', 'Use 1 AWG for W1 and W2'],
    },
  ],
});
