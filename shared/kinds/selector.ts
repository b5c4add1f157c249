import { z } from 'zod';

import { amount, defineKind } from './kind.ts';

export const selector = defineKind({
  kind: 'selector',
  title: 'Selector',
  drawer: 'Switch',
  letter: () => 'Q',
  ratings: z.strictObject({
    continuousA: amount,
    intermittentA: amount.optional(),
    crankingA: amount.optional(),
    maxV: amount.optional(),
    normal: z.enum(['1', '2', 'both', 'off']).optional(),
    makeBeforeBreak: z.boolean().optional(),
    hasBoth: z.boolean().optional(),
  }),
  symbols: ['selector'],
  offers: [
    {
      partId: 'selector-300',
      title: 'Battery selector, 300 A',
      ratings: { continuousA: 300, intermittentA: 500, crankingA: 900, maxV: 48, makeBeforeBreak: true, hasBoth: true },
    },
  ],
  terminals: () => [
    { name: '1', role: 'any', x: 0, y: 1 },
    { name: '2', role: 'any', x: 0, y: 3 },
    { name: 'common', role: 'any', x: 6, y: 2 },
    { name: 'field1', role: 'signal', x: 2, y: 4, optional: true },
    { name: 'field2', role: 'signal', x: 4, y: 4, optional: true },
  ],
  size: () => ({ width: 6, height: 4 }),
});
