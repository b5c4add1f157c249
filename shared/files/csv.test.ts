import { describe, expect, test } from 'vitest';

import { toCsv } from './csv.ts';

describe('a list as CSV', () => {
  test('opens as UTF-8 in a spreadsheet, with lines that any reader ends rightly (RFC 4180)', () => {
    expect(
      toCsv([
        ['Mark', 'Size'],
        ['W1', '70 mm²'],
      ]),
    ).toBe('\uFEFFMark,Size\r\nW1,70 mm²\r\n');
  });

  test('keeps commas, quotes and new lines inside one cell', () => {
    expect(toCsv([['a,b', 'say "on"', 'one\ntwo', ' led ']])).toBe('\uFEFF"a,b","say ""on""","one\ntwo"," led "\r\n');
  });

  test.each(['=1+1', '+1', '-1', '@SUM(A1)', '\tx', '\rx', '=HYPERLINK("http://x","y")'])(
    'text that a spreadsheet would run is made harmless: %j',
    (text) => {
      const cell = toCsv([[text]])
        .slice(1)
        .trimEnd();
      expect(cell.replace(/^"/, '').startsWith("'")).toBe(true);
    },
  );

  test('our own negative numbers stay numbers, and what is no number is an empty cell', () => {
    expect(toCsv([[-3, 0.5, Number.NaN, undefined, null, 1200]])).toBe('\uFEFF-3,0.5,,,,1200\r\n');
  });
});
