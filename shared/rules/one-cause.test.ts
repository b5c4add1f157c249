import { describe, expect, it } from 'vitest';

import type { Design } from '#shared/model/design.ts';
import { aDesign, fusedRun } from '#shared/testing/build-design.ts';

import { analyse } from './analyse.ts';

const idsOf = (design: Design) => analyse(design).findings.map(({ id }) => id);

/** A panel of twelve branches, fed by a run that the main fuse may be missing from. */
function panel(isProtected: boolean): Design {
  const design = aDesign().battery('G1', { internalMilliohm: 5 }).busbar('X1', 'dc+').busbar('X2', 'dc-');
  if (isProtected) design.fuse('F1', 60, {}, { mountedOn: { device: 'g1', terminal: 'pos' } });
  design.run('W1', isProtected ? 'F1.b' : 'G1.pos', 'X1.1', 0.5, '6 AWG').run('W2', 'X2.1', 'G1.neg', 0.5, '6 AWG');
  for (let n = 0; n < 12; n++) {
    design
      .fuse(`F1${n}`, 10, { family: 'blade' }, { mountedOn: { device: 'x1', terminal: `${(n % 9) + 2}` } })
      .load(`E${n}`, 2)
      .run(`W1${n}`, `F1${n}.b`, `E${n}.pos`, 2, '14 AWG')
      .run(`W3${n}`, `E${n}.neg`, `X2.${(n % 9) + 2}`, 2, '14 AWG');
  }
  return design.build();
}

describe('one cause is one finding', () => {
  it('says nothing of a panel that is right', () => expect(idsOf(panel(true))).toEqual([]));

  it('says once that the main fuse of twelve branches is not there', () => {
    const ids = idsOf(panel(false));
    expect(ids.filter((id) => id.startsWith('protection/'))).toHaveLength(1);
    expect(ids).toHaveLength(1);
  });

  it('says once that a wire shorts a battery, and not what the short would drive', () => {
    const short = aDesign()
      .battery()
      .fuse('F1', 15, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
      .load('E1', 5)
      .run('W1', 'F1.b', 'E1.pos', 1, '10 AWG')
      .run('W2', 'E1.neg', 'G1.neg', 1, '10 AWG')
      .run('W3', 'E1.pos', 'E1.neg', 0.2, '10 AWG')
      .build();
    expect(idsOf(short)).toEqual(['topology/direct-short:g1']);
  });

  it('says once that a run has no length', () => {
    expect(idsOf(fusedRun(15, { runIs: { lengthM: undefined } }))).toEqual([
      'conductor/length-missing:w1',
      'conductor/length-missing:w2',
    ]);
  });

  it('leaves an alternator that reaches no battery idle instead of calling the network unable', () => {
    const design = aDesign()
      .battery()
      .fuse('F1', 80, {}, { mountedOn: { device: 'g1', terminal: 'pos' } })
      .device('Q1', 'switch', { continuousA: 300, role: 'battery', normal: 'open' })
      .device('G2', 'alternator', { maxA: 60, regulatedV: 14.4 })
      .run('W1', 'F1.b', 'Q1.a', 1, '4 AWG')
      .run('W2', 'Q1.b', 'G2.pos', 1, '4 AWG')
      .run('W3', 'G2.neg', 'G1.neg', 1, '4 AWG')
      .build();
    const { modes, runs } = analyse(design);
    expect(modes['all-charging']!.converged).toBe(true);
    expect(runs.w2!.designCurrentA).toBe(60);
    expect(idsOf(design)).toEqual([]);
  });

  it('finds banks joined by thin wire over a branch switch, though a starter hangs on one of them', () => {
    const design = aDesign()
      .battery('G1')
      .battery('G3')
      .device('Q1', 'switch', { continuousA: 300, role: 'battery' })
      .device('Q2', 'switch', { continuousA: 20, role: 'branch' })
      .device('M1', 'starter', { crankA: 200 })
      .run('W1', 'G1.pos', 'Q1.a', 0.5, '2 AWG')
      .run('W2', 'Q1.b', 'M1.pos', 1, '2 AWG')
      .run('W3', 'M1.neg', 'G1.neg', 1.5, '2 AWG')
      .run('W4', 'Q1.a', 'Q2.a', 1, '16 AWG')
      .run('W5', 'Q2.b', 'G3.pos', 1, '16 AWG')
      .run('W6', 'G3.neg', 'G1.neg', 1, '2 AWG')
      .build();
    expect(idsOf(design)).toEqual(['protection/missing:w4', 'protection/missing:w5']);
  });
});
