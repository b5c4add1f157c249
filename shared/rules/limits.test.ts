import { describe, expect, it } from 'vitest';

import type { Design } from '#shared/model/design.ts';
import { aDesign, fusedRun } from '#shared/testing/build-design.ts';
import { mustFix } from '#shared/testing/test-rule.ts';

const INCH = 0.0254;
const iso = { profile: 'iso-13297' } as const;

/** G1, a run to F1, and its load. */
function fuseAt(lengthM: number, enclosed: 'none' | 'sheath', isIso = false): Design {
  const size = isIso ? '6 mm²' : '10 AWG';
  return aDesign(isIso ? iso : {})
    .battery()
    .fuse('F1', 30)
    .load('E1', 5)
    .run('W1', 'G1.pos', 'F1.a', lengthM, size, { enclosed })
    .run('W2', 'F1.b', 'E1.pos', 1, size)
    .run('W3', 'E1.neg', 'G1.neg', 1, size)
    .build();
}

/** 10 A over 10 AWG there and back: 10.75 / 10,380 cmil is 1.03565 mΩ/ft, so 0.067956 V for each metre of the way. */
const VOLTS_PER_METRE = (2 * 10 * 10.75) / 10_380 / 0.3048;
const lit = (lengthM: number, dropClass: 'critical' | 'general') =>
  fusedRun(15, { loadA: 10, lengthM, load: { dropClass } });

/** A limit that is moved by a hundredth, either way, leaves one of the two without its answer. */
const LIMITS: readonly { of: string; finding: string; limit: number; at: (value: number) => Design }[] = [
  // 33 CFR 183.425 Table 5: 16 AWG of 105 °C carries 25 A.
  { of: '16 AWG', finding: 'conductor/ampacity:w1', limit: 25, at: (loadA) => fusedRun(25, { size: '16 AWG', loadA }) },
  {
    of: '16 AWG in an engine space',
    finding: 'conductor/ampacity:w1',
    limit: 25 * 0.85,
    at: (loadA) => fusedRun(25, { size: '16 AWG', loadA, engineSpace: true }),
  },
  {
    of: '2.5 mm² in the ISO profile',
    finding: 'conductor/ampacity:w1',
    limit: 35,
    at: (loadA) => fusedRun(40, { size: '2.5 mm²', loadA, basis: iso }),
  },
  {
    of: 'a critical load',
    finding: 'conductor/voltage-drop:e1',
    limit: (0.03 * 12) / VOLTS_PER_METRE,
    at: (lengthM) => lit(lengthM, 'critical'),
  },
  {
    of: 'any other load',
    finding: 'conductor/voltage-drop:e1',
    limit: (0.1 * 12) / VOLTS_PER_METRE,
    at: (lengthM) => lit(lengthM, 'general'),
  },
  { of: 'a bare run', finding: 'protection/too-far-from-source:w1', limit: 7 * INCH, at: (m) => fuseAt(m, 'none') },
  {
    of: 'a sheathed run from a battery',
    finding: 'protection/too-far-from-source:w1',
    limit: 72 * INCH,
    at: (m) => fuseAt(m, 'sheath'),
  },
  {
    of: 'a bare run in the ISO profile',
    finding: 'protection/too-far-from-source:w1',
    limit: 0.2,
    at: (m) => fuseAt(m, 'none', true),
  },
  { of: '10 AWG', finding: 'protection/rating-above-ampacity:w1', limit: 60, at: (ratedA) => fusedRun(ratedA) },
  {
    of: '4 mm² in the ISO profile, 150 % of 45 A',
    finding: 'protection/rating-above-ampacity:w1',
    limit: 67.5,
    at: (ratedA) => fusedRun(ratedA, { size: '4 mm²', basis: iso }),
  },
];

describe('the limits', () => {
  it.each(LIMITS)('$finding: $of is let pass at its limit, and is a must 0.5 % past it', ({ finding, limit, at }) => {
    expect(mustFix(at(limit * (1 - 1e-9)))).not.toContain(finding);
    expect(mustFix(at(limit * 1.005))).toContain(finding);
  });
});
