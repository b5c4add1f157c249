import { fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { ratingUnknown } from './rating-unknown.ts';

const iso = { profile: 'iso-13297' } as const;
/** 12.8 V behind 4 mΩ and 0.3 mΩ: 2,976.7 A through the fuse. */
const known = { battery: { internalMilliohm: 4 } };
const fuse = (ratings: Record<string, unknown>) => ({ coldMilliohm: 0.3, ...ratings });

testRule(ratingUnknown, {
  right: [
    { name: 'a fuse that tells both', given: fusedRun(15, known) },
    { name: 'a fuse that tells both in the ISO profile', given: fusedRun(15, { ...known, size: '4 mm²', basis: iso }) },
    {
      name: 'a fuse that the job removes',
      given: fusedRun(15, { ...known, fuse: fuse({ maxV: undefined }), fuseIs: { work: 'remove' } }),
    },
    { name: 'a run with no fuse at all', given: fusedRun(0, { protectedBy: null }) },
  ],
  wrong: [
    {
      name: 'a new fuse that does not tell what it can interrupt',
      given: fusedRun(15, { ...known, fuse: fuse({ interruptA: undefined }) }),
      severity: 'must',
      says: ['F1 does not say what it can interrupt (it has to be 2,977 A or more).'],
      remedies: [],
    },
    {
      name: 'a new fuse that does not tell its voltage',
      given: fusedRun(15, { ...known, fuse: fuse({ maxV: undefined }) }),
      says: ['F1 does not say up to what voltage (it has to be 14.4 V or more).'],
      figures: { maxV: 14.4 },
    },
    {
      name: 'a new fuse on a battery that is equalised at 15.5 V',
      given: fusedRun(15, { battery: { internalMilliohm: 4, equaliseV: 15.5 }, fuse: fuse({ maxV: undefined }) }),
      says: ['F1 does not say up to what voltage (it has to be 15.5 V or more).'],
    },
    {
      name: 'an existing fuse that tells neither',
      given: fusedRun(15, {
        ...known,
        fuse: fuse({ interruptA: undefined, maxV: undefined }),
        fuseIs: { work: 'existing' },
      }),
      severity: 'should',
      says: [
        'F1 does not say what it can interrupt (it has to be 2,977 A or more) and up to what voltage (it has to be 14.4 V or more).',
      ],
    },
    {
      name: 'a fuse in the ISO profile',
      given: fusedRun(15, { ...known, size: '4 mm²', fuse: fuse({ interruptA: undefined }), basis: iso }),
      says: ['F1 does not say what it can interrupt (it has to be 2,977 A or more).'],
    },
    {
      name: 'a battery of no capacity, about which nothing could be worked out',
      given: fusedRun(15, { battery: { capacityAh: 0 } }),
      says: ['G1 does not say its capacity (more than 0).'],
    },
    {
      name: 'a load below nothing',
      given: fusedRun(15, { loadA: -50 }),
      says: ['E1 does not say what current it takes (more than 0).'],
    },
  ],
});
