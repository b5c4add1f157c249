import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { terminalOpen } from './terminal-open.ts';

const iso = { profile: 'iso-13297' } as const;
const says = (device: string, terminal: string) => `Nothing is connected to terminal ${terminal} of ${device}.`;

testRule(terminalOpen, {
  right: [
    { name: 'a finished circuit with a fuse on a stud', given: fusedRun(15) },
    { name: 'a finished circuit in the ISO profile', given: fusedRun(15, { size: '4 mm²', basis: iso }) },
    { name: 'a busbar with spare studs', given: aDesign().busbar('X1', 'dc+').build() },
    { name: 'an open device that the job removes', given: aDesign().load('E1', 5, {}, { work: 'remove' }).build() },
  ],
  wrong: [
    {
      name: 'a load with nothing on it',
      given: aDesign().load('E1', 5).build(),
      severity: 'should',
      says: [says('E1', 'neg'), says('E1', 'pos')],
      remedies: [],
    },
    {
      name: 'a battery with one pole connected',
      given: aDesign().battery().load('E1', 5).run('W1', 'G1.pos', 'E1.pos', 1, '10 AWG').build(),
      says: [says('E1', 'neg'), says('G1', 'neg')],
    },
    {
      name: 'the far end of a fuse on a stud',
      given: aDesign()
        .battery()
        .fuse('F1', 10, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .build(),
      says: [says('F1', 'b'), says('G1', 'neg')],
    },
    {
      name: 'both ends of the second pole of a switch',
      given: aDesign(iso).device('Q1', 'switch', { continuousA: 20, poles: 2 }).build(),
      says: [says('Q1', 'a'), says('Q1', 'a2'), says('Q1', 'b'), says('Q1', 'b2')],
    },
    {
      name: 'an end that a removed run leaves open',
      given: fusedRun(15, { runIs: { work: 'remove' } }),
      says: [says('E1', 'neg'), says('E1', 'pos'), says('F1', 'b'), says('G1', 'neg')],
    },
  ],
});
