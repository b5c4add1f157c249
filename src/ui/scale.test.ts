import { expect, it } from 'vitest';

import { roundStep } from './scale.tsx';

it('steps a scale by round figures, two to seven of them', () => {
  expect([1, 1.5, 3.4, 3.5, 6.9, 7, 9.9].map(roundStep)).toEqual([0.5, 1, 1, 2, 2, 5, 5]);
  for (let most = 0.013; most < 100_000; most *= 1.07) {
    const steps = most / roundStep(most);
    expect([most, steps >= 1.3 && steps <= 3.6]).toEqual([most, true]);
  }
});

it('steps the same way at every power of ten', () => {
  expect([roundStep(0.02), roundStep(0.2), roundStep(200)].map((step) => Number(step.toPrecision(6)))).toEqual([
    0.01, 0.1, 100,
  ]);
});
