import { z } from 'zod';

import { amount, defineKind } from './kind.ts';

export const starter = defineKind({
  kind: 'starter',
  title: 'Starter motor',
  drawer: 'Use',
  letter: () => 'M',
  ratings: z.strictObject({ crankA: amount.optional() }),
  symbols: ['starter'],
  offers: [{ partId: 'starter-outboard', title: 'Starter motor, 150 A', ratings: { crankA: 150 } }],
  terminals: () => [
    { name: 'pos', role: 'dc+', x: 2, y: 0 },
    { name: 'neg', role: 'dc-', x: 2, y: 6 },
    { name: 'solenoid', role: 'signal', x: 0, y: 2, optional: true },
  ],
  size: () => ({ width: 4, height: 6 }),
});
