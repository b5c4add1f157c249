import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { lengthMissing } from './length-missing.ts';

const iso = { profile: 'iso-13297' } as const;
const without = { lengthM: undefined };
const says = (run: string) =>
  `${run} has no length, so the voltage drop and the distances over it are not proved and it is not in the cut list.`;

testRule(lengthMissing, {
  right: [
    { name: 'runs with a length', given: fusedRun(15) },
    { name: 'runs with a length in the ISO profile', given: fusedRun(15, { size: '4 mm²', basis: iso }) },
    { name: 'the shortest of runs', given: fusedRun(15, { lengthM: 0.001 }) },
    { name: 'a link of no length at all', given: fusedRun(15, { lengthM: 0, runIs: { link: true } }) },
    { name: 'a run that the job removes', given: fusedRun(15, { runIs: { ...without, work: 'remove' } }) },
  ],
  wrong: [
    {
      name: 'new runs',
      given: fusedRun(15, { runIs: without }),
      severity: 'should',
      says: [says('W1'), says('W2')],
      remedies: [],
    },
    {
      name: 'runs in the ISO profile',
      given: fusedRun(15, { size: '4 mm²', runIs: without, basis: iso }),
      says: [says('W1'), says('W2')],
    },
    {
      name: 'runs that exist',
      given: fusedRun(15, { runIs: { ...without, work: 'existing' } }),
      says: [says('W1'), says('W2')],
    },
    {
      name: 'runs of known resistance, which still have to be cut',
      given: fusedRun(15, { runIs: { ...without, milliohm: 3 } }),
      says: ['W1', 'W2'].map(
        (run) => `${run} has no length, so the distances over it are not proved and it is not in the cut list.`,
      ),
    },
    {
      name: 'one run of a path',
      given: aDesign()
        .battery()
        .fuse('F1', 15, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .load('E1', 5)
        .run('W1', 'F1.b', 'E1.pos', undefined, '14 AWG')
        .run('W2', 'E1.neg', 'G1.neg', 1, '14 AWG')
        .build(),
      says: [says('W1')],
    },
  ],
});
