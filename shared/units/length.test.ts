import fc from 'fast-check';
import { describe, expect, test } from 'vitest';

import { formatLength, readLengthM } from './length.ts';

describe('a length as people type it', () => {
  // An inch is 25.4 mm exactly and a foot 304.8 mm (international yard and pound agreement, 1959).
  test.each([
    ['6 ft 4 in', 1.9304],
    ['6\'4"', 1.9304],
    ["6' 4 1/2", 1.9431],
    ['6 ft 4½ in', 1.9431],
    ['6’ 4”', 1.9304],
    ['6ft', 1.8288],
    ['76 in', 1.9304],
    ['1/2 in', 0.0127],
    ['6 1/2 ft', 1.9812],
    ['1.9 m', 1.9],
    ['1,9 m', 1.9],
    ['190 cm', 1.9],
    ['1900 mm', 1.9],
    ['1,900 mm', 1.9],
    ['1 m 90 cm', 1.9],
    ['.5 m', 0.5],
  ])('%s is understood under either way of measuring', (text, lengthM) => {
    expect(readLengthM(text, 'us')).toBeCloseTo(lengthM, 9);
    expect(readLengthM(text, 'metric')).toBeCloseTo(lengthM, 9);
  });

  test('a bare number is feet or metres, as the reader measures', () => {
    expect(readLengthM('6', 'us')).toBeCloseTo(1.8288, 9);
    expect(readLengthM('6', 'metric')).toBe(6);
  });

  test.each([
    '',
    ' ',
    'long',
    '-3 m',
    '3 furlongs',
    '1 m 2 m',
    '4 in 6 ft',
    '6 4',
    '1/0 in',
    '3 m 2 m 1 m',
    'NaN',
    '1e3',
    '6 ft 4 in 2',
  ])('what is no length is not guessed at: "%s"', (text) => {
    expect(readLengthM(text, 'us')).toBeUndefined();
    expect(readLengthM(text, 'metric')).toBeUndefined();
  });
});

describe('a length as it is printed', () => {
  test.each([
    [1.9304, '6 ft 4 in', '1.93 m'],
    [1.9431, '6 ft 4 1/2 in', '1.94 m'],
    [0.1778, '7 in', '0.178 m'],
    [0.18034, '7.1 in', '0.18 m'],
    [0.3048, '1 ft', '0.305 m'],
    [3.6576, '12 ft', '3.66 m'],
    [0, '0 in', '0 m'],
  ])('%d m', (lengthM, us, metric) => {
    expect(formatLength(lengthM, 'us')).toBe(us);
    expect(formatLength(lengthM, 'metric')).toBe(metric);
  });

  test('does not drift when it is read and printed again and again', () => {
    fc.assert(
      fc.property(fc.double({ min: 0, max: 2000, noNaN: true }), fc.constantFrom('us', 'metric'), (lengthM, units) => {
        const printed = formatLength(lengthM, units);
        const read = readLengthM(printed, units);
        expect(read).toBeDefined();
        expect(formatLength(read!, units)).toBe(printed);
      }),
      { seed: 7, numRuns: 1000 },
    );
  });

  test('reading never throws and never answers something that is no number', () => {
    fc.assert(
      fc.property(fc.string({ maxLength: 80 }), (text) => {
        const lengthM = readLengthM(text, 'us');
        expect(lengthM === undefined || (Number.isFinite(lengthM) && lengthM >= 0)).toBe(true);
      }),
      { seed: 8, numRuns: 1000 },
    );
  });
});
