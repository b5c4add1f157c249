import { z } from 'zod';

import { amount, defineKind } from './kind.ts';

export const alternator = defineKind({
  kind: 'alternator',
  title: 'Alternator',
  drawer: 'Charge',
  letter: () => 'G',
  ratings: z.strictObject({
    maxA: amount,
    regulatedV: amount,
    hotDerate: amount.optional(),
    externalRegulator: z.boolean().optional(),
    surgeProtector: z.boolean().optional(),
    fieldDisconnect: z.boolean().optional(),
    selfLimiting: z.boolean().optional(),
  }),
  symbols: ['alternator'],
  offers: [
    { partId: 'alternator-60', title: 'Alternator, 60 A', ratings: { maxA: 60, regulatedV: 14.2 } },
    { partId: 'alternator-110', title: 'Alternator, 110 A', ratings: { maxA: 110, regulatedV: 14.4 } },
  ],
  terminals: () => [
    { name: 'pos', role: 'dc+', x: 2, y: 0 },
    { name: 'neg', role: 'dc-', x: 2, y: 6 },
    { name: 'field', role: 'signal', x: 0, y: 2, optional: true },
    { name: 'sense', role: 'signal', x: 0, y: 4, optional: true },
  ],
  size: () => ({ width: 4, height: 6 }),
});
