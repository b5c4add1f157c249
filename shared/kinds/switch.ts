import { z } from 'zod';

import { SWITCH_CONTACT_OHM } from './element.ts';
import { amount, count, defineKind, readRatings } from './kind.ts';
import { poleNames, poleTerminals } from './poles.ts';

const ratings = z.strictObject({
  continuousA: amount,
  intermittentA: amount.optional(),
  crankingA: amount.optional(),
  interruptA: amount.optional(),
  maxV: amount.optional(),
  poles: count(1, 3).optional(),
  role: z.enum(['branch', 'battery', 'float', 'push', 'emergencyParallel']).optional(),
  normal: z.enum(['closed', 'open']).optional(),
  interlock: z.string().optional(),
});

export const switchKind = defineKind({
  kind: 'switch',
  title: 'Switch',
  drawer: 'Switch',
  letter: (symbol) => (symbol === 'push' ? 'S' : symbol === 'float' ? 'B' : 'Q'),
  ratings,
  symbols: ['switch', 'battery', 'push', 'float'],
  offers: [
    {
      partId: 'switch-battery-300',
      title: 'Battery switch, 300 A',
      symbol: 'battery',
      ratings: { continuousA: 300, intermittentA: 500, crankingA: 900, maxV: 48, role: 'battery' },
    },
    {
      partId: 'switch-20',
      title: 'Switch, 20 A',
      symbol: 'switch',
      ratings: { continuousA: 20, maxV: 32, role: 'branch' },
    },
    {
      partId: 'switch-push-10',
      title: 'Push button, 10 A',
      symbol: 'push',
      ratings: { continuousA: 10, maxV: 32, role: 'push', normal: 'open' },
    },
    {
      partId: 'switch-float-15',
      title: 'Float switch, 15 A',
      symbol: 'float',
      ratings: { continuousA: 15, maxV: 32, role: 'float' },
    },
  ],
  terminals: (device) => poleTerminals(readRatings(ratings, device).poles ?? 1),
  size: (device) => ({ width: 6, height: 2 * (readRatings(ratings, device).poles ?? 1) }),
  defaults: () => ({ poles: 1, role: 'branch', normal: 'closed' }),
  network: (device, { mode, state }) => {
    const { poles = 1, normal = 'closed' } = readRatings(ratings, device);
    const told = mode === 'own' ? (state.closed ?? state.on) : undefined;
    const pole = { ohm: SWITCH_CONTACT_OHM, closed: told ?? normal === 'closed', closable: true, protective: false };
    return poleNames(poles).map(({ a, b }) => ({ type: 'contact', a, b, ...pole }));
  },
});
