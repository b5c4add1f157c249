import { describe, expect, it } from 'vitest';

import type { AwgSize } from '#shared/model/size.ts';

import {
  CIRCULAR_MILS,
  IEC_60228_CLASS_5_TINNED_OHM_PER_KM,
  METRES_IN_A_FOOT,
  ohmPerMetreAt20C,
  ohmPerMetreByCircularMils,
  squareMmOf,
  strandedOhmPerMetreAt20C,
} from './copper.ts';

describe('copper', () => {
  it('has the areas of ASTM B258, d = 0.005 in x 92^((36 - n)/39)', () => {
    for (const [size, mils] of Object.entries(CIRCULAR_MILS)) {
      const gauge = size.includes('/0') ? 1 - Number.parseInt(size) : Number.parseInt(size);
      const exact = (5 * 92 ** ((36 - gauge) / 39)) ** 2;
      expect(Math.abs(mils / exact - 1)).toBeLessThan(0.003);
    }
    expect(squareMmOf('4/0 AWG')).toBeCloseTo(107.219, 2);
    expect(squareMmOf('2/0 AWG')).toBeCloseTo(67.443, 2); // NEC's 133,100 cmil, rounded from 133,077
  });

  // NEC Chapter 9, Table 8: circular mils.
  it.each<[AwgSize, number]>([
    ['18 AWG', 1620],
    ['16 AWG', 2580],
    ['14 AWG', 4110],
    ['12 AWG', 6530],
    ['10 AWG', 10380],
    ['8 AWG', 16510],
    ['6 AWG', 26240],
    ['4 AWG', 41740],
    ['3 AWG', 52620],
    ['2 AWG', 66360],
    ['1 AWG', 83690],
    ['1/0 AWG', 105600],
    ['2/0 AWG', 133100],
    ['3/0 AWG', 167800],
    ['4/0 AWG', 211600],
  ])('%s holds %i circular mils', (size, mils) => expect(CIRCULAR_MILS[size]).toBe(mils));

  // NEC Chapter 9, Table 8, brought to 20 °C by the NEC form: 12 AWG 5.342, 10 AWG 3.3455, 2/0 0.2609, 4/0 0.1640 mΩ/m.
  it.each<[Exclude<AwgSize, '20 AWG'>, number]>([
    ['18 AWG', 21.4491],
    ['16 AWG', 13.463],
    ['14 AWG', 8.4717],
    ['12 AWG', 5.342],
    ['10 AWG', 3.3455],
    ['8 AWG', 2.099],
    ['6 AWG', 1.3247],
    ['4 AWG', 0.831],
    ['3 AWG', 0.661],
    ['2 AWG', 0.5234],
    ['1 AWG', 0.4155],
    ['1/0 AWG', 0.3292],
    ['2/0 AWG', 0.2609],
    ['3/0 AWG', 0.2067],
    ['4/0 AWG', 0.164],
  ])('%s, stranded, has %f mΩ/m at 20 °C', (size, milliohm) => {
    expect(Math.abs((strandedOhmPerMetreAt20C(size) * 1000) / milliohm - 1)).toBeLessThan(5e-4);
  });

  it('has the greatest resistances of IEC 60228, class 5, tinned', () => {
    expect(IEC_60228_CLASS_5_TINNED_OHM_PER_KM).toEqual({
      '0.75 mm²': 26.7,
      '1 mm²': 20,
      '1.5 mm²': 13.7,
      '2.5 mm²': 8.21,
      '4 mm²': 5.09,
      '6 mm²': 3.39,
      '10 mm²': 1.95,
      '16 mm²': 1.24,
      '25 mm²': 0.795,
      '35 mm²': 0.565,
      '50 mm²': 0.393,
      '70 mm²': 0.277,
      '95 mm²': 0.21,
      '120 mm²': 0.164,
      '150 mm²': 0.132,
    });
    expect(ohmPerMetreAt20C('2.5 mm²') * 1000).toBeCloseTo(8.21, 9);
  });

  it('drops 7.90 V by K = 12.9 where the circular-mil form with K = 10.75 drops 6.58 V', () => {
    // A 120 V branch: 20 A, 100 ft one way, 12 AWG: 2 x 12.9 x 20 x 100 / 6,530 = 7.90 V.
    const volts = ohmPerMetreByCircularMils('12 AWG') * 200 * METRES_IN_A_FOOT * 20;
    expect((volts * 12.9) / 10.75).toBeCloseTo(7.902, 2);
    expect(volts).toBeCloseTo(6.585, 2);
  });

  it('makes K = 10.75 Ω·cmil/ft 0.017 871 Ω·mm²/m', () => {
    expect(ohmPerMetreByCircularMils('10 AWG') * squareMmOf('10 AWG')).toBeCloseTo(0.017871, 6);
  });

  it('counts an mm² size with the copper of its resistance class: 2.5 mm² holds 2.100 mm²', () => {
    expect(0.017871 / ohmPerMetreByCircularMils('2.5 mm²')).toBeCloseTo(2.1, 3);
  });
});
