import { aDesign } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { collapse } from './collapse.ts';

/** 12 V behind 0.1 Ω of battery can give E² / 4R = 360 W and no more. */
function powerOf(ratedW: number, more: { iso?: true; mode?: number } = {}) {
  const design = aDesign(more.iso ? { profile: 'iso-13297' } : {})
    .battery('G1', { emfV: 12, internalMilliohm: 100 })
    .fuse('F1', 100, { coldMilliohm: 0 }, { mountedOn: { device: 'g1', terminal: 'pos' } })
    .load('E1', 0, { ratedA: undefined, ratedW, model: 'power' })
    .run('W1', 'F1.b', 'E1.pos', 1, '2 AWG', { milliohm: 0 })
    .run('W2', 'E1.neg', 'G1.neg', 1, '2 AWG', { milliohm: 0 });
  if (more.mode !== undefined) design.mode('cooking', { e1: { on: true, fraction: more.mode } });
  return design.build();
}

const says = (mode: string, share: string) =>
  `In the mode ${mode} the sources and their wires hold no more than ${share} of the load; the voltage collapses.`;

testRule(collapse, {
  right: [
    { name: '300 W, which the battery holds at 8.45 V', given: powerOf(300) },
    { name: '356 W, just below the most there is', given: powerOf(356) },
    { name: '356 W in the ISO profile', given: powerOf(356, { iso: true }) },
    { name: 'a mode of its own at half of the load', given: powerOf(350, { mode: 0.5 }) },
    {
      name: 'a battery that is shorted, which another rule says',
      given: aDesign().battery().run('W1', 'G1.pos', 'G1.neg', 1, '2 AWG').build(),
    },
  ],
  wrong: [
    {
      name: '361 W, just above the most there is',
      given: powerOf(361),
      says: [says('all on', '99.7 %')],
      remedies: [],
    },
    {
      name: '720 W, twice the most there is',
      given: powerOf(720),
      says: [says('all on', '50 %')],
      figures: { heldFraction: 0.5 },
    },
    { name: '450 W in the ISO profile', given: powerOf(450, { iso: true }), says: [says('all on', '80 %')] },
    {
      name: 'a mode that asks for more than all on',
      given: powerOf(350, { mode: 1.5 }),
      says: [says('cooking', '68.6 %')],
    },
  ],
});
