import { z } from 'zod';

import { count, defineKind, readRatings } from './kind.ts';

export const BOND_ROLES = ['common', 'engine', 'plate', 'hull', 'anode', 'lightning'] as const;

const ratings = z.strictObject({ role: z.enum(BOND_ROLES).optional(), ways: count(1, 20).optional() });

/** The bar over a bond's symbol: as wide as its ways, and never narrower than the symbol. */
function barWidth(ways: number): number {
  return Math.max(4, 2 * ways);
}

export const bond = defineKind({
  kind: 'bond',
  title: 'Bond',
  drawer: 'Join',
  letter: () => 'X',
  ratings,
  symbols: ['bond'],
  offers: [
    { partId: 'bond-common', title: 'Common ground point', ratings: { role: 'common', ways: 4 } },
    { partId: 'bond-engine', title: 'Engine block', ratings: { role: 'engine', ways: 2 } },
    { partId: 'bond-plate', title: 'Bonding plate', ratings: { role: 'plate', ways: 1 } },
  ],
  terminals: (device) => {
    const ways = readRatings(ratings, device).ways ?? 4;
    const left = (barWidth(ways) - 2 * (ways - 1)) / 2;
    return Array.from({ length: ways }, (_, i) => ({
      name: String(i + 1),
      role: 'bond' as const,
      x: left + 2 * i,
      y: 0,
      optional: true as const,
    }));
  },
  size: (device) => ({ width: barWidth(readRatings(ratings, device).ways ?? 4), height: 4 }),
  defaults: () => ({ role: 'common', ways: 4 }),
  network: (device) => [
    {
      type: 'join',
      terminals: Array.from({ length: readRatings(ratings, device).ways ?? 4 }, (_, i) => String(i + 1)),
    },
  ],
});
