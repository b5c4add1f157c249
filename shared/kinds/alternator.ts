import { z } from 'zod';

import { isTurnedOn } from './element.ts';
import { amount, defineKind, readRatings } from './kind.ts';

const ratings = z.strictObject({
  maxA: amount,
  regulatedV: amount,
  hotDerate: amount.optional(),
  externalRegulator: z.boolean().optional(),
  surgeProtector: z.boolean().optional(),
  fieldDisconnect: z.boolean().optional(),
  selfLimiting: z.boolean().optional(),
});

export const alternator = defineKind({
  kind: 'alternator',
  title: 'Alternator',
  drawer: 'Charge',
  letter: () => 'G',
  ratings,
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
  defaults: () => ({
    hotDerate: 0.75,
    externalRegulator: false,
    surgeProtector: false,
    fieldDisconnect: false,
    selfLimiting: true,
  }),
  // Wires and fuses must stand what it gives cold, so the network takes its whole rating; `hotDerate` is for energy.
  network: (device, { mode, state }) => {
    const { maxA, regulatedV } = readRatings(ratings, device);
    if (maxA === undefined || regulatedV === undefined) return [];
    const on = mode === 'all-charging' || (mode === 'own' && isTurnedOn(state));
    const output = { maxA: maxA * (state.fraction ?? 1), regulatedV, atRated: mode === 'all-charging' };
    return [{ type: 'charging', pos: 'pos', neg: 'neg', on, ...output }];
  },
});
