import { describe, expect, it } from 'vitest';

import { sayAgo, sayDay, sayExactly } from './when.tsx';

/** Local time, as the reader's clock has it. */
const NOW = new Date(2026, 10, 27, 15, 30, 0);
const ago = (seconds: number) => sayAgo(new Date(NOW.getTime() - seconds * 1000), NOW);
const HOUR = 3600;

describe('how long ago something was', () => {
  it('is just now for most of a minute, also when the clocks of two machines differ', () => {
    expect([ago(0), ago(44), ago(-5)]).toEqual(['just now', 'just now', 'just now']);
  });

  it('is said in minutes within the hour and in hours within the day', () => {
    expect([ago(45), ago(119), ago(59 * 60)]).toEqual(['1 min ago', '2 min ago', '59 min ago']);
    expect([ago(HOUR), ago(15 * HOUR)]).toEqual(['1 h ago', '15 h ago']);
  });

  it('is still hours shortly after midnight, then yesterday, then a date', () => {
    const early = new Date(2026, 10, 27, 1, 0, 0);
    expect(sayAgo(new Date(2026, 10, 26, 22, 0, 0), early)).toBe('3 h ago');
    expect(sayAgo(new Date(2026, 10, 26, 2, 0, 0), NOW)).toBe('yesterday');
    expect(sayAgo(new Date(2026, 10, 25, 23, 59, 0), NOW)).toBe('25 Nov');
  });
});

describe('a date', () => {
  it('has its year only when it is another one', () => {
    expect(sayDay(new Date(2026, 0, 3), NOW)).toBe('3 Jan');
    expect(sayDay(new Date(2025, 11, 31), NOW)).toBe('31 Dec 2025');
  });

  it('can be read to the second', () => {
    expect(sayExactly(new Date(2026, 1, 5, 7, 4, 9))).toBe('5 Feb 2026, 07:04:09');
  });
});
