import { z } from 'zod';

import { SWITCH_CONTACT_OHM } from './element.ts';
import { amount, defineKind, readRatings } from './kind.ts';

const POSITIONS: ReadonlySet<string> = new Set(['1', '2', 'both', 'off']);

const ratings = z.strictObject({
  continuousA: amount,
  intermittentA: amount.optional(),
  crankingA: amount.optional(),
  maxV: amount.optional(),
  normal: z.enum(['1', '2', 'both', 'off']).optional(),
  makeBeforeBreak: z.boolean().optional(),
  hasBoth: z.boolean().optional(),
});

export const selector = defineKind({
  kind: 'selector',
  title: 'Selector',
  drawer: 'Switch',
  letter: () => 'Q',
  ratings,
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
  defaults: () => ({ normal: '1', makeBeforeBreak: false, hasBoth: true }),
  network: (device, { mode, state }) => {
    const { normal = '1', hasBoth = true } = readRatings(ratings, device);
    const told = mode === 'own' && POSITIONS.has(state.position ?? '') ? state.position : undefined;
    const position = told ?? normal;
    const contact = {
      type: 'contact',
      b: 'common',
      ohm: SWITCH_CONTACT_OHM,
      closable: true,
      protective: false,
    } as const;
    const together = position === 'both' && hasBoth;
    return [
      { ...contact, a: '1', closed: position === '1' || together },
      { ...contact, a: '2', closed: position === '2' || together },
    ];
  },
});
