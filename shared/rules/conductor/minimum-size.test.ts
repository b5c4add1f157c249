import { fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { minimumSize } from './minimum-size.ts';

const iso = { profile: 'iso-13297' } as const;
const radio = { loadA: 0.9, load: { dropClass: 'critical' } };

function withRadio(loadA: number) {
  const design = fusedRun(1, { size: '20 AWG', ...radio, loadA, lengthM: 0.5 });
  return { ...design, devices: { ...design.devices, e1: { ...design.devices.e1!, symbol: 'radio' } } };
}

testRule(minimumSize, {
  right: [
    { name: '16 AWG on its own', given: fusedRun(15, { size: '16 AWG' }) },
    { name: '18 AWG in a sheath with others', given: fusedRun(15, { size: '18 AWG', runIs: { enclosed: 'sheath' } }) },
    { name: 'a pigtail of 6.9 in', given: fusedRun(15, { size: '18 AWG', lengthM: 6.9 * 0.0254 }) },
    { name: 'a radio of 0.9 A behind its own fuse', given: withRadio(0.9) },
    {
      name: 'wiring inside an enclosure',
      given: fusedRun(10, { size: '20 AWG', loadA: 1, runIs: { enclosed: 'enclosure' } }),
    },
    { name: '1 mm² in the ISO profile', given: fusedRun(15, { size: '1 mm²', basis: iso }) },
    {
      name: '0.75 mm² in a sheath in the ISO profile',
      given: fusedRun(10, { size: '0.75 mm²', runIs: { enclosed: 'sheath' }, basis: iso }),
    },
  ],
  wrong: [
    {
      name: '18 AWG on its own',
      given: fusedRun(15, { size: '18 AWG' }),
      says: [
        'W1 is 18 AWG; 16 AWG is the smallest allowed for a conductor on its own.',
        'W2 is 18 AWG; 16 AWG is the smallest allowed for a conductor on its own.',
      ],
      remedies: ['Use 16 AWG for W1', 'Use 16 AWG for W2'],
    },
    {
      name: '20 AWG in a sheath',
      given: fusedRun(10, { size: '20 AWG', loadA: 2, runIs: { enclosed: 'sheath' } }),
      says: [
        'W1 is 20 AWG; 18 AWG is the smallest allowed in a sheath with others.',
        'W2 is 20 AWG; 18 AWG is the smallest allowed in a sheath with others.',
      ],
      remedies: ['Use 18 AWG for W1', 'Use 18 AWG for W2'],
    },
    {
      name: 'a pigtail of 7 in',
      given: fusedRun(15, { size: '18 AWG', lengthM: 7 * 0.0254 }),
      says: [
        'W1 is 18 AWG; 16 AWG is the smallest allowed for a conductor on its own.',
        'W2 is 18 AWG; 16 AWG is the smallest allowed for a conductor on its own.',
      ],
    },
    {
      name: 'a radio of 1 A',
      given: withRadio(1),
      says: [
        'W1 is 20 AWG; 16 AWG is the smallest allowed for a conductor on its own.',
        'W2 is 20 AWG; 16 AWG is the smallest allowed for a conductor on its own.',
      ],
    },
    {
      name: '0.75 mm² on its own in the ISO profile',
      given: fusedRun(10, { size: '0.75 mm²', basis: iso }),
      says: [
        'W1 is 0.75 mm²; 1 mm² is the smallest allowed for a conductor on its own.',
        'W2 is 0.75 mm²; 1 mm² is the smallest allowed for a conductor on its own.',
      ],
      remedies: ['Use 1 mm² for W1', 'Use 1 mm² for W2'],
    },
  ],
});
