import { z } from 'zod';

import { isTurnedOn } from './element.ts';
import { amount, defineKind, readRatings } from './kind.ts';

/** From memory: a small petrol engine. Larger ones say theirs. */
const CRANK_A = 150;

const ratings = z.strictObject({ crankA: amount.optional() });

export const starter = defineKind({
  kind: 'starter',
  title: 'Starter motor',
  drawer: 'Use',
  letter: () => 'M',
  ratings,
  symbols: ['starter'],
  offers: [{ partId: 'starter-outboard', title: 'Starter motor, 150 A', ratings: { crankA: 150 } }],
  terminals: () => [
    { name: 'pos', role: 'dc+', x: 2, y: 0 },
    { name: 'neg', role: 'dc-', x: 2, y: 6 },
    { name: 'solenoid', role: 'signal', x: 0, y: 2, optional: true },
  ],
  size: () => ({ width: 4, height: 6 }),
  defaults: () => ({ crankA: CRANK_A }),
  // Cranking is seconds long and never part of a working condition: only a mode that turns it on cranks. Its current
  // is that of the loaded motor, which falls little as the voltage does.
  network: (device, { mode, state }) => {
    const amount = readRatings(ratings, device).crankA ?? CRANK_A;
    const on = mode === 'own' && isTurnedOn(state);
    return [{ type: 'load', pos: 'pos', neg: 'neg', on, model: 'current', amount, fraction: state.fraction ?? 1 }];
  },
});
