import { z } from 'zod';

import { amount, count, defineKind, pitchOf, readRatings, rowOfTerminals, type TerminalRole } from './kind.ts';

const ROLES = ['dc+', 'dc-', 'l', 'n', 'pe', 'bond'] as const satisfies readonly TerminalRole[];

const ratings = z.strictObject({
  ratedA: amount,
  maxV: amount.optional(),
  role: z.enum(ROLES).optional(),
  studs: count(1, 60).optional(),
});

export const busbar = defineKind({
  kind: 'busbar',
  title: 'Busbar',
  drawer: 'Join',
  letter: () => 'X',
  ratings,
  symbols: ['busbar'],
  offers: [
    {
      partId: 'busbar-positive-150',
      title: 'Positive busbar, 150 A',
      ratings: { ratedA: 150, maxV: 48, role: 'dc+', studs: 6 },
    },
    {
      partId: 'busbar-negative-150',
      title: 'Negative busbar, 150 A',
      ratings: { ratedA: 150, maxV: 48, role: 'dc-', studs: 10 },
    },
    {
      partId: 'busbar-positive-600',
      title: 'Positive busbar, 600 A',
      ratings: { ratedA: 600, maxV: 48, role: 'dc+', studs: 8 },
    },
    {
      partId: 'busbar-negative-600',
      title: 'Negative busbar, 600 A',
      ratings: { ratedA: 600, maxV: 48, role: 'dc-', studs: 8 },
    },
  ],
  terminals: (device) => {
    const { studs, role } = readRatings(ratings, device);
    return rowOfTerminals(studs ?? 10, pitchOf(device), 1, role ?? 'dc+');
  },
  size: (device) => ({ width: ((readRatings(ratings, device).studs ?? 10) - 1) * pitchOf(device) + 2, height: 2 }),
  defaults: () => ({ studs: 10, role: 'dc+' }),
  network: (device) => [
    {
      type: 'join',
      terminals: Array.from({ length: readRatings(ratings, device).studs ?? 10 }, (_, i) => String(i + 1)),
    },
  ],
});
