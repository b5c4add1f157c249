import { describe, expect, it } from 'vitest';

import type { Design } from '#shared/model/design.ts';
import { aSmallDesign, edited } from '#shared/testing/small-design.ts';
import { fusedRun } from '#shared/testing/build-design.ts';

import { analyse } from './analyse.ts';
import { compareNaturally } from './marks.ts';

function backwards<T>(value: T): T {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) return value;
  return Object.fromEntries(
    Object.entries(value)
      .map(([key, each]) => [key, backwards(each)])
      .toReversed(),
  ) as T;
}

function numbersIn(value: unknown): unknown[] {
  if (typeof value !== 'object' || value === null) return [value];
  return Object.values(value).flatMap(numbersIn);
}

describe('analyse', () => {
  it('gives the same findings in the same order whatever the order of keys', () => {
    const design = fusedRun(125, { size: '18 AWG', engineSpace: true, loadA: 30, fuse: { maxV: undefined } });
    const findings = analyse(design).findings;
    expect(findings.length).toBeGreaterThan(4);
    expect(JSON.stringify(analyse(backwards(design)).findings.map((each) => each.id))).toBe(
      JSON.stringify(findings.map((each) => each.id)),
    );
  });

  it('puts must before should, the rules in their order, and F2 before F10', () => {
    const severities = analyse(fusedRun(125, { size: '18 AWG', runIs: { lengthM: undefined } })).findings.map(
      ({ severity }) => severity,
    );
    expect(severities).toEqual(
      [...severities].toSorted((a, b) => ['must', 'should', 'note'].indexOf(a) - ['must', 'should', 'note'].indexOf(b)),
    );
    expect(['F10', '', 'F2', 'F1'].toSorted(compareNaturally)).toEqual(['F1', 'F2', 'F10', '']);
  });

  it('marks what somebody has accepted with a reason', () => {
    const design = fusedRun(125, { size: '6 AWG', engineSpace: true });
    const id = 'protection/rating-above-ampacity:w1';
    const accepted = { [id]: { reason: 'Seen and argued.', by: 'Ines Halloran', at: '2026-01-05' } };
    expect(analyse(design).findings.find((each) => each.id === id)?.accepted).toBeUndefined();
    expect(analyse({ ...design, accepted }).findings.find((each) => each.id === id)?.accepted).toBe(true);
  });

  it('tells ampacity by its factors: 10 AWG, three bundled, in an engine space carries 60 x 0.85 x 0.7 = 35.7 A', () => {
    const run = analyse(fusedRun(30, { bundled: 3, engineSpace: true })).runs.w1!;
    expect(run.ampacity.baseA).toBe(60);
    expect(run.ampacity.factors).toEqual([
      { name: 'temperature', factor: 0.85 },
      { name: 'bundling', factor: 0.7 },
    ]);
    expect(run.ampacity.allowedA).toBeCloseTo(35.7, 9);
  });

  it('tells drop, path and the smallest size that would do', () => {
    const run = analyse(aSmallDesign()).runs.w2!;
    // 5 A over 3 m of 14 AWG out and 3 m and 0.1 m back: 10.75 x 5 x 6.1 / 0.3048 / 4,110 = 0.2617 V.
    expect(run.drop?.volts).toBeCloseTo(0.2617, 4);
    expect(run.drop?.path).toEqual(['w1', 'w2', 'w3']);
    expect(run.designCurrentA).toBe(5);
    // W2 alone on 16 AWG loses 0.2050 V instead of 0.1287: 0.338 V in all, within 0.36.
    expect(run.smallestSize).toBe('16 AWG');
  });

  const broken: readonly [string, unknown][] = [
    ['basis', null],
    ['basis.ambientC', Number.NaN],
    ['devices', undefined],
    ['devices.g1', 7],
    ['devices.g1.ratings', null],
    ['devices.g1.ratings.nominalV', 0],
    ['devices.g1.ratings.capacityAh', -1],
    ['devices.f1.ratings.ratedA', Number.NaN],
    ['devices.f1.ratings.ratedA', 0],
    ['devices.f1.kind', 'teapot'],
    ['devices.p1.ratings.nominalV', 0],
    ['runs', 'none'],
    ['runs.w1.conductor', undefined],
    ['runs.w1.conductor.size', '7 AWG'],
    ['runs.w1.conductor.parallel', 0],
    ['runs.w1.lengthM', Number.POSITIVE_INFINITY],
    ['runs.w1.from', { device: 'nowhere', terminal: 'pos' }],
    ['runs.w2.to', { device: 'f1', terminal: 'b' }],
    ['runs.w1.zoneIds', 'helm'],
    ['modes.m1', { id: 'm1', name: 'M', states: { p1: { fraction: Number.NaN } } }],
    ['zones', undefined],
  ];
  it.each(broken)('answers finite numbers with %s broken', (path, value) => {
    const analysis = analyse(edited(path, value) as Design);
    const numbers = numbersIn({ ...analysis, parts: [] }).filter((each) => typeof each === 'number');
    expect(numbers.filter((each) => !Number.isFinite(each))).toEqual([]);
  });

  it('answers whatever it is given', () => {
    for (const nothing of [null, undefined, 5, 'design', [], {}]) {
      expect(analyse(nothing as unknown as Design).findings).toEqual([]);
    }
  });
});
