import { z } from 'zod';

import { amount, count, defineKind, pitchOf, readRatings, rowOfTerminals, type Terminal } from './kind.ts';

const ratings = z.strictObject({ ratedA: amount, ways: count(1, 60).optional() });

/** A splice has its ways round the dot: left, right, below, above; more of them meet at the left. */
const SPLICE_PLACES = [
  { x: 0, y: 1 },
  { x: 2, y: 1 },
  { x: 1, y: 2 },
  { x: 1, y: 0 },
] as const;

export const terminal = defineKind({
  kind: 'terminal',
  title: 'Terminal block',
  drawer: 'Join',
  letter: () => 'X',
  ratings,
  symbols: ['block', 'splice'],
  offers: [
    {
      partId: 'terminal-block-30',
      title: 'Terminal block, 4 ways, 30 A',
      symbol: 'block',
      ratings: { ratedA: 30, ways: 4 },
    },
    { partId: 'terminal-splice-30', title: 'Splice, 30 A', symbol: 'splice', ratings: { ratedA: 30, ways: 3 } },
  ],
  terminals: (device) => {
    const ways = readRatings(ratings, device).ways ?? 4;
    if (device.symbol !== 'splice') return rowOfTerminals(ways, pitchOf(device), 1, 'any');
    return Array.from({ length: ways }, (_, i): Terminal => {
      const place = SPLICE_PLACES[i] ?? SPLICE_PLACES[0];
      return { name: String(i + 1), role: 'any', optional: true, ...place };
    });
  },
  size: (device) =>
    device.symbol === 'splice'
      ? { width: 2, height: 2 }
      : { width: ((readRatings(ratings, device).ways ?? 4) - 1) * pitchOf(device) + 2, height: 2 },
  defaults: () => ({ ways: 4 }),
  network: (device) => [
    {
      type: 'join',
      terminals: Array.from({ length: readRatings(ratings, device).ways ?? 4 }, (_, i) => String(i + 1)),
    },
  ],
});
