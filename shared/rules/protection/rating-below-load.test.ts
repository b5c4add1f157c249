import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { ratingBelowLoad } from './rating-below-load.ts';

const iso = { profile: 'iso-13297' } as const;

/** A fuse panel's feed: what both loads take flows through F1. */
function twoLoads(ratedA: number) {
  return aDesign()
    .battery()
    .fuse('F1', ratedA, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
    .load('E1', 10)
    .load('E2', 8, { demand: 'intermittent' })
    .run('W1', 'F1.b', 'E1.pos', 1, '10 AWG')
    .run('W2', 'F1.b', 'E2.pos', 1, '10 AWG')
    .run('W3', 'E1.neg', 'G1.neg', 1, '10 AWG')
    .run('W4', 'E2.neg', 'G1.neg', 1, '10 AWG')
    .build();
}

testRule(ratingBelowLoad, {
  right: [
    { name: 'a rating equal to the load', given: fusedRun(10, { loadA: 10 }) },
    {
      name: '125 % of a load that is on for three hours',
      given: fusedRun(12.5, { loadA: 10, load: { hoursPerDay: 3 } }),
    },
    { name: 'a load on for less than three hours', given: fusedRun(10, { loadA: 10, load: { hoursPerDay: 2.9 } }) },
    { name: 'two runs on one fuse that is large enough', given: twoLoads(18) },
    {
      name: 'a rating equal to the load in the ISO profile',
      given: fusedRun(10, { loadA: 10, size: '4 mm²', basis: iso }),
    },
  ],
  wrong: [
    {
      name: 'a rating just below the load',
      given: fusedRun(10, { loadA: 10.1 }),
      says: ['F1 is rated 10 A; 10.1 A flows through it.'],
      remedies: ['Use 15 A for F1'],
    },
    {
      name: 'a fuse too small for a long load, on a wire that allows the next',
      given: fusedRun(10, { loadA: 9, load: { hoursPerDay: 3 } }),
      severity: 'should',
      says: [
        'F1 is rated 10 A; with loads that are on for 3 h or more counted at 125 %, 11.3 A should be its rating at least.',
      ],
      remedies: ['Use 15 A for F1'],
    },
    {
      name: 'a load that the wire cannot carry either: no larger fuse is offered',
      given: fusedRun(50, { loadA: 70 }),
      says: ['F1 is rated 50 A; 70 A flows through it.'],
      remedies: [],
    },
    {
      name: 'two runs on one fuse',
      given: twoLoads(15),
      says: ['F1 is rated 15 A; 18 A flows through it.'],
      remedies: ['Use 20 A for F1'],
    },
    {
      name: 'a windlass that takes more than its fuse for a while',
      given: fusedRun(80, {
        size: '4 AWG',
        loadA: 100,
        load: { demand: 'momentary', onMinutes: 2 },
        battery: { capacityAh: 400 },
      }),
      severity: 'note',
      says: [
        'F1 is rated 80 A; with the short-time loads 100 A flows through it. See that its time-current curve lets that pass.',
      ],
      remedies: [],
    },
    {
      name: 'a rating just below the load in the ISO profile',
      given: fusedRun(10, { loadA: 10.1, size: '4 mm²', basis: iso }),
      says: ['F1 is rated 10 A; 10.1 A flows through it.'],
    },
    {
      name: 'a load that a mode of four hours a day holds',
      given: {
        ...fusedRun(10, { loadA: 9 }),
        modes: { anchor: { id: 'anchor', name: 'At anchor', hoursPerDay: 4, states: {} } },
      },
      severity: 'should',
      says: [
        'F1 is rated 10 A; with loads that are on for 3 h or more counted at 125 %, 11.3 A should be its rating at least.',
      ],
    },
  ],
});
