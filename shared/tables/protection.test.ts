import { describe, expect, it } from 'vitest';

import {
  LARGE_BANK_DEVICE_A,
  LARGE_BANK_FIGURE_A,
  TABLE_MOST_AH,
  TABLE_MOST_CCA,
  tableInterruptA,
} from './interrupting.ts';
import { MINIMUM_SIZE } from './minimum-size.ts';
import { DISTANCES, nextRatingDown, nextRatingUp, STANDARD_RATINGS } from './protection.ts';

describe('protection tables', () => {
  it('asks what E-11 Table V-A asks, at the edges of each row', () => {
    const at = (cca: number, volts = 12) => [
      tableInterruptA(volts, cca, 'main'),
      tableInterruptA(volts, cca, 'branch'),
    ];
    expect(at(650)).toEqual([1500, 750]);
    expect(at(651)).toEqual([3000, 1500]);
    expect(at(900)).toEqual([3000, 1500]);
    expect(at(1100, 24)).toEqual([3000, 1500]);
    expect(at(1101, 24)).toEqual([5000, 2500]);
    expect(at(1400)).toEqual([5000, 2500]);
    expect(at(1250, 32)).toEqual([3000, 1500]);
    expect(at(1251, 32)).toEqual([5000, 2500]);
    expect(at(600, 48)).toEqual([undefined, undefined]);
    expect([TABLE_MOST_CCA, TABLE_MOST_AH, LARGE_BANK_DEVICE_A, LARGE_BANK_FIGURE_A]).toEqual([
      2200, 500, 20_000, 10_000,
    ]);
  });

  it('allows 7, 40 and 72 in by 33 CFR 183.455 and ABYC, 0.2 and 1.8 m by ISO', () => {
    const inches = (metres: number) => metres / 0.0254;
    const { bareM, enclosedElsewhereM, enclosedFromBatteryM } = DISTANCES['abyc-e11'];
    expect(
      [bareM, enclosedElsewhereM, enclosedFromBatteryM].map(inches).map((each) => Number(each.toFixed(6))),
    ).toEqual([7, 40, 72]);
    expect(DISTANCES['iso-13297']).toMatchObject({ bareM: 0.2, enclosedFromBatteryM: 1.8 });
  });

  it('has the standard ratings of NEC 240.6(A) for breakers and unknown families', () => {
    for (const rating of [
      10, 15, 20, 25, 30, 35, 40, 45, 50, 60, 70, 80, 90, 100, 110, 125, 150, 175, 200, 225, 250, 300, 350, 400,
    ]) {
      expect(nextRatingUp(undefined, rating)).toBe(rating);
    }
    expect(nextRatingUp(undefined, 31.5)).toBe(35);
    expect(nextRatingUp('gG', 31.5)).toBe(32);
    expect(nextRatingDown(undefined, 16.9)).toBe(15);
    expect(nextRatingUp('terminal', 301)).toBeUndefined();
    for (const ratings of Object.values(STANDARD_RATINGS)) expect(ratings).toEqual(ratings.toSorted((a, b) => a - b));
  });

  it('has the smallest conductors of E-11 11.14.1.2 and ISO 10133 7.7', () => {
    expect(MINIMUM_SIZE['abyc-e11'].separate.awg).toBe('16 AWG');
    expect(MINIMUM_SIZE['abyc-e11'].sheathed.awg).toBe('18 AWG');
    expect(MINIMUM_SIZE['iso-13297'].separate.metric).toBe('1 mm²');
    expect(MINIMUM_SIZE['iso-13297'].sheathed.metric).toBe('0.75 mm²');
  });
});
