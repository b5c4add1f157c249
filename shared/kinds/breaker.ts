import { z } from 'zod';

import { EntityId } from '#shared/model/design.ts';

import { protectionOhm } from './element.ts';
import { amount, count, defineKind, readRatings } from './kind.ts';
import { poleNames, poleTerminals } from './poles.ts';

const ratings = z.strictObject({
  ratedA: amount,
  interruptA: amount.optional(),
  maxV: amount.optional(),
  poles: count(1, 3).optional(),
  main: z.boolean().optional(),
  residualMilliamp: amount.optional(),
  rerating: amount.optional(),
  backedUpBy: EntityId.optional(),
});

export const breaker = defineKind({
  kind: 'breaker',
  title: 'Breaker',
  drawer: 'Protect',
  letter: () => 'F',
  ratings,
  symbols: ['breaker'],
  offers: [
    { partId: 'breaker-15', title: 'Breaker, 15 A', ratings: { ratedA: 15, interruptA: 3000, maxV: 65, poles: 1 } },
    { partId: 'breaker-100', title: 'Breaker, 100 A', ratings: { ratedA: 100, interruptA: 5000, maxV: 48, poles: 1 } },
    {
      partId: 'breaker-2p-30',
      title: 'Breaker, 2 poles, 30 A',
      ratings: { ratedA: 30, interruptA: 3000, maxV: 65, poles: 2 },
    },
  ],
  terminals: (device) => poleTerminals(readRatings(ratings, device).poles ?? 1),
  size: (device) => ({ width: 6, height: 2 * (readRatings(ratings, device).poles ?? 1) }),
  defaults: () => ({ poles: 1, main: false }),
  // The trip coil and contacts of a pole, taken like a fuse: from memory, small breakers drop about that at their rating.
  network: (device, { state }) => {
    const { ratedA, poles = 1 } = readRatings(ratings, device);
    const pole = {
      ohm: protectionOhm(ratedA),
      closed: state.closed ?? state.on ?? true,
      closable: true,
      protective: true,
    };
    return poleNames(poles).map(({ a, b }) => ({ type: 'contact', a, b, ...pole }));
  },
});
