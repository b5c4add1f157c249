import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { testRule } from '#shared/testing/test-rule.ts';

import { interruptRating } from './interrupt-rating.ts';

const iso = { profile: 'iso-13297' } as const;

/**
 * A battery of 12.8 V behind 4 mΩ and a fuse of 0.3 mΩ on its stud: 12.8 / 4 mΩ = 3,200 A just before it and
 * 12.8 / 4.3 mΩ = 2,976.7 A through it for a short just behind it.
 */
function fuseThatBreaks(interruptA: number, battery: Record<string, unknown> = {}, fuse: Record<string, unknown> = {}) {
  return fusedRun(15, {
    battery: { internalMilliohm: 4, ...battery },
    fuse: { interruptA, coldMilliohm: 0.3, ...fuse },
  });
}

testRule(interruptRating, {
  right: [
    { name: 'a fuse that breaks what was worked out', given: fuseThatBreaks(2977) },
    {
      name: 'a rating that is not told, which another rule says',
      given: fuseThatBreaks(0, {}, { interruptA: undefined }),
    },
    {
      name: "the maker's figure of a large bank met",
      given: fuseThatBreaks(2500, { capacityAh: 600, shortCircuitA: 2500, internalMilliohm: 4 }),
    },
    {
      name: 'a fuse of 20 kA at 125 V on a bank of more than 10 kA',
      given: fuseThatBreaks(
        20_000,
        { capacityAh: 600, shortCircuitA: 25_000, internalMilliohm: 0.3 },
        { maxV: 125, coldMilliohm: 0 },
      ),
    },
    {
      name: 'a small fuse backed up by the one ahead of it',
      given: aDesign()
        .battery('G1', { internalMilliohm: 4 })
        .fuse('F1', 30, { coldMilliohm: 0.3 }, { mountedOn: { device: 'g1', terminal: 'pos' } })
        .fuse('F2', 15, { interruptA: 500, coldMilliohm: 1, backedUpBy: 'f1' })
        .load('E1', 5)
        .run('W1', 'F1.b', 'F2.a', 0.1, '10 AWG')
        .run('W2', 'F2.b', 'E1.pos', 1, '10 AWG')
        .run('W3', 'E1.neg', 'G1.neg', 1, '10 AWG')
        .build(),
    },
    {
      name: 'a fuse for 58 V on a LiFePO4 bank that is charged to 58 V',
      given: fusedRun(15, {
        battery: { chemistry: 'lifepo4', nominalV: 51.2, emfV: 53, chargeV: 58, internalMilliohm: 20 },
        load: { nominalV: 48 },
        fuse: { maxV: 58 },
      }),
    },
  ],
  wrong: [
    {
      name: 'a fuse below the current and the table',
      given: fuseThatBreaks(1400),
      says: ['F1 can break 1,400 A; a short circuit sends 2,977 A through it.'],
      remedies: ['Use a class T fuse of 15 A for F1'],
      figures: { computedA: 2976.744, admittedA: 1500, position: 'main' },
    },
    {
      // E-11 Table V-A: 650 CCA or less, main device 1,500 A.
      name: 'a fuse that meets the table for 600 CCA but not the current',
      given: fuseThatBreaks(1500),
      severity: 'should',
      says: [
        'F1 can break 1,500 A, as the table asks of a main device; a short circuit is worked out to send 2,977 A through it.',
      ],
    },
    {
      // The table again: 651 CCA asks for 3,000 A.
      name: 'the same fuse on a battery of 651 CCA',
      given: fuseThatBreaks(1500, { ccaA: 651 }),
      says: ['F1 can break 1,500 A; a short circuit sends 2,977 A through it.'],
      figures: { admittedA: 3000 },
    },
    {
      name: 'a battery whose CCA nobody knows',
      given: fuseThatBreaks(2900, { ccaA: undefined }),
      says: ['F1 can break 2,900 A; a short circuit sends 2,977 A through it.'],
    },
    {
      name: 'a LiFePO4 battery, which has no CCA, in the ISO profile',
      given: fusedRun(15, {
        size: '4 mm²',
        basis: iso,
        battery: { chemistry: 'lifepo4', internalMilliohm: 4, ccaA: 600 },
        fuse: { interruptA: 2000, coldMilliohm: 0.3 },
      }),
      says: ['F1 can break 2,000 A; a short circuit sends 2,977 A through it.'],
    },
    {
      // 12.8 V behind 5 mΩ: 2,560 A. What a blade fuse of 10 A itself adds is only guessed, and a guess protects nobody.
      name: 'a small blade fuse whose own resistance nobody has entered',
      given: fusedRun(10, { fuse: { interruptA: 1000, maxV: 32, family: 'blade' } }),
      says: ['F1 can break 1,000 A; a short circuit sends 2,560 A through it.'],
      remedies: ['Use a class T fuse of 10 A for F1'],
    },
    {
      name: 'a fuse for 32 V on a bank of 48 V, however much it breaks below that',
      given: fusedRun(15, {
        battery: { nominalV: 48, emfV: 51, internalMilliohm: 20 },
        load: { nominalV: 48 },
        fuse: { interruptA: 20_000, maxV: 32, coldMilliohm: 0 },
      }),
      says: [
        'F1 can break 20,000 A at 32 V and below; its circuit can stand at 57.6 V, and a short circuit sends 2,550 A through it.',
      ],
      remedies: ['Use a class T fuse of 15 A for F1'],
    },
  ],
});
