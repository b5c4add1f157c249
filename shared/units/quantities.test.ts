import fc from 'fast-check';
import { describe, expect, test } from 'vitest';

import { readSize } from '#shared/model/read-size.ts';

import { formatAh, readAmpHours } from './charge.ts';
import { formatA, readAmps } from './current.ts';
import { formatWh } from './energy.ts';
import { formatPercent, formatPercentBeside, readPercent } from './fraction.ts';
import { readNumber } from './number.ts';
import { formatVA, formatW, readWatts } from './power.ts';
import { formatOhm, readMilliohms } from './resistance.ts';
import { formatC, readCelsius } from './temperature.ts';
import { formatV, readVolts } from './voltage.ts';

describe('figures are printed as value, space, unit', () => {
  test.each([
    [formatA(287.4), '287 A'],
    [formatA(13.64), '13.6 A'],
    [formatA(0.424), '0.42 A'],
    [formatA(5), '5 A'],
    [formatA(-2404.8), '-2,405 A'],
    [formatA(-0.001), '0 A'],
    [formatA(99.97), '100 A'],
    [formatV(0.3361), '0.34 V'],
    [formatV(12.8), '12.8 V'],
    [formatV(120), '120 V'],
    [formatW(1500), '1,500 W'],
    [formatVA(3000), '3,000 VA'],
    [formatAh(280), '280 Ah'],
    [formatWh(1351.2), '1,351 Wh'],
    [formatPercent(0.028), '2.8 %'],
    [formatPercent(0.1), '10 %'],
    [formatPercent(0.0034), '0.34 %'],
    [formatOhm(0.00102277), '1.02 mΩ'],
    [formatOhm(0.0000215), '0.0215 mΩ'],
    [formatOhm(12.5), '12.5 Ω'],
    [formatC(105), '105 °C'],
    [formatA(Number.NaN), 'unknown A'],
  ])('%s', (printed, expected) => {
    expect(printed).toBe(expected);
  });

  test('a share just over its limit is not printed as the limit', () => {
    expect(formatPercentBeside(0.03004, 0.03)).toBe('3.004 %');
    expect(formatPercentBeside(0.042, 0.03)).toBe('4.2 %');
    expect(formatPercentBeside(0.03, 0.03)).toBe('3 %');
  });
});

describe('figures are read with or without their unit', () => {
  test.each([
    [readAmps('15'), 15],
    [readAmps('15A'), 15],
    [readAmps('300 mA'), 0.3],
    [readAmps('1,5'), 1.5],
    [readAmps('5,000 A'), 5000],
    [readVolts('12.8 v'), 12.8],
    [readVolts('340 mV'), 0.34],
    [readWatts('1.5 kW'), 1500],
    [readWatts('60'), 60],
    [readAmpHours('280 ah'), 280],
    [readPercent('3 %'), 0.03],
    [readPercent('2,5'), 0.025],
    [readMilliohms('4'), 4],
    [readMilliohms('0.004 ohm'), 4],
    [readCelsius('50'), 50],
    [readCelsius('-10 °C'), -10],
    [readCelsius('86 °F'), 30],
    [readCelsius('122F'), 50],
    [readNumber('−3'), -3],
    [readNumber('1,234.5'), 1234.5],
  ])('%d', (read, expected) => {
    expect(read).toBeCloseTo(expected, 12);
  });

  test.each([
    readAmps(''),
    readAmps('12 V'),
    readAmps('1 2'),
    readVolts('A'),
    readWatts('1.2.3'),
    readCelsius('5 K'),
    readNumber('1e5'),
  ])('another unit or no number is refused', (read) => {
    expect(read).toBeUndefined();
  });

  test('what was printed reads back to what is printed the same', () => {
    const amounts = fc.double({ min: -1e6, max: 1e6, noNaN: true });
    fc.assert(
      fc.property(amounts, (value) => {
        expect(formatA(readAmps(formatA(value))!)).toBe(formatA(value));
        expect(formatV(readVolts(formatV(value))!)).toBe(formatV(value));
        expect(formatW(readWatts(formatW(value))!)).toBe(formatW(value));
        expect(formatC(readCelsius(formatC(value))!)).toBe(formatC(value));
        expect(formatOhm(readMilliohms(formatOhm(value))! / 1000)).toBe(formatOhm(value));
      }),
      { seed: 9, numRuns: 500 },
    );
  });
});

describe('a conductor size as people type it', () => {
  test.each([
    ['2/0', 'us', '2/0 AWG'],
    ['2/0 awg', 'metric', '2/0 AWG'],
    ['00', 'us', '2/0 AWG'],
    ['10 ga', 'us', '10 AWG'],
    ['70 mm2', 'us', '70 mm²'],
    ['70mm²', 'us', '70 mm²'],
    ['70', 'us', '70 mm²'],
    ['2,5', 'metric', '2.5 mm²'],
    ['16', 'us', '16 AWG'],
    ['16', 'metric', '16 mm²'],
    ['12', 'metric', '12 AWG'],
    ['1', 'us', '1 AWG'],
  ] as const)('%s (%s) is %s', (text, units, size) => {
    expect(readSize(text, units)).toBe(size);
  });

  test.each(['', '5', '7 AWG', '3 mm²', 'fat', '2/1', '70 mm'])('"%s" is no size', (text) => {
    expect(readSize(text, 'us')).toBeUndefined();
  });
});
