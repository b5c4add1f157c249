import { describe, expect, it } from 'vitest';

import { analyse } from '#shared/rules/analyse.ts';
import { aDesign, type DesignBuilder } from '#shared/testing/build-design.ts';

const currents = (design: DesignBuilder, ...runs: string[]) => {
  const analysis = analyse(design.build());
  return runs.map((run) => Number(analysis.runs[run]!.designCurrentA.toFixed(6)));
};
const onG1 = { mountedOn: { device: 'g1', terminal: 'pos' } };

/** A pump that a float switch holds on, with a switch by hand beside it: W3 and W4 lead over that one. */
const pump = () =>
  aDesign()
    .battery()
    .fuse('F1', 15, {}, onG1)
    .device('S1', 'switch', { continuousA: 20, role: 'float' })
    .device('S2', 'switch', { continuousA: 20, role: 'branch', normal: 'open' })
    .load('M1', 12)
    .run('W1', 'F1.b', 'S1.a', 1, '10 AWG')
    .run('W2', 'S1.b', 'M1.pos', 1, '10 AWG')
    .run('W3', 'F1.b', 'S2.a', 1, '16 AWG')
    .run('W4', 'S2.b', 'M1.pos', 1, '16 AWG')
    .run('W5', 'M1.neg', 'G1.neg', 1, '10 AWG');

describe('a way that carries nothing as the boat is left', () => {
  it('carries the whole of the pump that its open switch can run', () => {
    expect(currents(pump(), 'w1', 'w2', 'w3', 'w4', 'w5')).toEqual([12, 12, 12, 12, 12]);
  });

  it('carries nothing where it leads to no load', () => {
    const spare = pump()
      .device('S3', 'switch', { continuousA: 20, role: 'branch', normal: 'open' })
      .busbar('X9', 'dc+')
      .run('W6', 'F1.b', 'S3.a', 1, '16 AWG')
      .run('W7', 'S3.b', 'X9.1', 1, '16 AWG');
    expect(currents(spare, 'w3', 'w6', 'w7')).toEqual([12, 0, 0]);
  });

  it('carries the horn from either of two buttons', () => {
    const horn = aDesign()
      .battery()
      .fuse('F1', 15, {}, onG1)
      .device('S1', 'switch', { continuousA: 20, role: 'push', normal: 'open' })
      .device('S2', 'switch', { continuousA: 20, role: 'push', normal: 'open' })
      .load('P1', 8, { demand: 'intermittent' })
      .run('W1', 'F1.b', 'S1.a', 1, '14 AWG')
      .run('W2', 'S1.b', 'P1.pos', 1, '14 AWG')
      .run('W3', 'F1.b', 'S2.a', 6, '14 AWG')
      .run('W4', 'S2.b', 'P1.pos', 6, '14 AWG')
      .run('W5', 'P1.neg', 'G1.neg', 1, '14 AWG');
    expect(currents(horn, 'w1', 'w2', 'w3', 'w4')).toEqual([8, 8, 8, 8]);
  });

  it('counts its loads by the same demand as the way they are fed by', () => {
    // E-11's load worksheet: 20 A continuous and the greater of 18 A and a tenth of 18 + 10 A.
    const panel = aDesign()
      .battery()
      .fuse('F1', 60, {}, onG1)
      .device('Q1', 'switch', { continuousA: 300, role: 'branch' })
      .device('Q2', 'switch', { continuousA: 300, role: 'branch', normal: 'open' })
      .busbar('X1', 'dc+')
      .busbar('X2', 'dc-')
      .run('W1', 'F1.b', 'Q1.a', 1, '6 AWG')
      .run('W2', 'Q1.b', 'X1.1', 1, '6 AWG')
      .run('W3', 'F1.b', 'Q2.a', 1, '6 AWG')
      .run('W4', 'Q2.b', 'X1.2', 1, '6 AWG')
      .run('W5', 'X2.1', 'G1.neg', 1, '6 AWG');
    [20, 18, 10].forEach((amperes, n) => {
      const demand = n === 0 ? 'continuous' : 'intermittent';
      panel
        .load(`E${n}`, amperes, { demand })
        .run(`W1${n}`, `X1.${n + 3}`, `E${n}.pos`, 1, '6 AWG')
        .run(`W2${n}`, `E${n}.neg`, `X2.${n + 3}`, 1, '6 AWG');
    });
    expect(currents(panel, 'w2', 'w3', 'w4')).toEqual([38, 38, 38]);
  });

  it('leads from a second battery, both its runs, to all that a selector can put on it', () => {
    const two = aDesign()
      .battery('G1')
      .battery('G2')
      .fuse('F1', 60, {}, onG1)
      .fuse('F2', 60, {}, { mountedOn: { device: 'g2', terminal: 'pos' } })
      .device('Q1', 'selector', { continuousA: 300, normal: '1' })
      .load('E1', 40)
      .run('W1', 'F1.b', 'Q1.1', 1, '6 AWG')
      .run('W2', 'F2.b', 'Q1.2', 1, '16 AWG')
      .run('W3', 'Q1.common', 'E1.pos', 1, '6 AWG')
      .run('W4', 'E1.neg', 'G1.neg', 1, '6 AWG')
      .run('W5', 'G2.neg', 'G1.neg', 1, '6 AWG');
    expect(currents(two, 'w1', 'w2', 'w3', 'w5')).toEqual([40, 40, 40, 40]);
    const { findings } = analyse(two.build());
    expect(findings.map(({ id }) => id)).toContain('conductor/ampacity:w2');
  });

  it('asks nothing of a second battery for loads that no switch can put on it', () => {
    const apart = pump()
      .battery('G2', {}, {})
      .device('S3', 'switch', { continuousA: 20, role: 'branch', normal: 'open' })
      .fuse('F2', 15, {}, { mountedOn: { device: 'g2', terminal: 'pos' } })
      .run('W6', 'F2.b', 'S3.a', 1, '16 AWG')
      .run('W7', 'G2.neg', 'G1.neg', 1, '16 AWG');
    expect(currents(apart, 'w6', 'w7')).toEqual([0, 0]);
  });
});
