import { expect, test } from 'vitest';

import { benchLine, quantile, sample } from './bench.ts';

test('the median of an even number of samples lies half-way between the middle two', () => {
  expect(quantile([4, 1, 3, 2], 0.5)).toBe(2.5);
});

test('the 95th percentile of 1 to 21 is 20', () => {
  const samples = Array.from({ length: 21 }, (_, index) => index + 1);
  expect(quantile(samples, 0.95)).toBe(20);
});

test('a line carries the median twice, as its value too, and how it stands to what was measured beside it', () => {
  expect(benchLine('a/b', { samplesMs: [2, 4, 6], beside: { what: 'another', samplesMs: [8, 8, 8] } })).toEqual({
    name: 'a/b',
    value: 4,
    unit: 'ms',
    reference: 8,
    ratio: 0.5,
    median: 4,
    p95: 5.8,
    samples: 3,
  });
});

test('a line without anything beside it has neither reference nor ratio', () => {
  expect(benchLine('a/b', { samplesMs: [1] })).toEqual({
    name: 'a/b',
    value: 1,
    unit: 'ms',
    median: 1,
    p95: 1,
    samples: 1,
  });
});

test('two things are measured in turn, as often as asked', async () => {
  const order: string[] = [];
  const measured = await sample(3, () => order.push('ours'), { what: 'another', run: () => order.push('theirs') });
  expect(order).toEqual(['ours', 'theirs', 'ours', 'theirs', 'ours', 'theirs']);
  expect(measured.samplesMs).toHaveLength(3);
  expect(measured.beside?.samplesMs).toHaveLength(3);
});
