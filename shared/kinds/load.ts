import { z } from 'zod';

import { amount, defineKind, readRatings } from './kind.ts';

export const LOAD_SYMBOLS = [
  'plain',
  'motor',
  'pump',
  'lamp',
  'heater',
  'horn',
  'socket',
  'radio',
  'instrument',
  'fridge',
] as const;

const LETTERS: Readonly<Record<string, string>> = {
  motor: 'M',
  pump: 'M',
  horn: 'P',
  radio: 'P',
  instrument: 'P',
  socket: 'X',
};

const ratings = z.strictObject({
  nominalV: amount,
  ratedA: amount.optional(),
  ratedW: amount.optional(),
  minV: amount.optional(),
  maxV: amount.optional(),
  model: z.enum(['current', 'power', 'resistance']).optional(),
  dropClass: z.enum(['general', 'critical']).optional(),
  hoursPerDay: amount.optional(),
  demand: z.enum(['continuous', 'intermittent', 'momentary']).optional(),
  onMinutes: amount.optional(),
  duty: z.enum(['bilge', 'navLight', 'blower', 'thruster', 'windlass', 'alarm', 'memory']).optional(),
  lockedRotorA: amount.optional(),
  thermallyProtected: z.boolean().optional(),
  essential: z.boolean().optional(),
});

export const load = defineKind({
  kind: 'load',
  title: 'Load',
  drawer: 'Use',
  letter: (symbol) => LETTERS[symbol ?? 'plain'] ?? 'E',
  ratings,
  symbols: LOAD_SYMBOLS as readonly [string, ...string[]],
  offers: [
    { partId: 'load-plain', title: 'DC load', symbol: 'plain', ratings: { nominalV: 12, ratedA: 5 } },
    {
      partId: 'load-motor',
      title: 'Motor',
      symbol: 'motor',
      ratings: { nominalV: 12, ratedA: 20, demand: 'intermittent' },
    },
    {
      partId: 'load-windlass',
      title: 'Windlass, 1,000 W',
      symbol: 'motor',
      ratings: { nominalV: 12, ratedW: 1000, demand: 'momentary', onMinutes: 5, duty: 'windlass' },
    },
    {
      partId: 'load-bilge-pump',
      title: 'Bilge pump',
      symbol: 'pump',
      ratings: { nominalV: 12, ratedA: 5, duty: 'bilge' },
    },
    {
      partId: 'load-pump',
      title: 'Pump',
      symbol: 'pump',
      ratings: { nominalV: 12, ratedA: 7, demand: 'intermittent' },
    },
    {
      partId: 'load-nav-light',
      title: 'Navigation light',
      symbol: 'lamp',
      ratings: { nominalV: 12, ratedA: 0.8, duty: 'navLight' },
    },
    { partId: 'load-lamp', title: 'Lamp', symbol: 'lamp', ratings: { nominalV: 12, ratedA: 1 } },
    {
      partId: 'load-heater',
      title: 'Heater',
      symbol: 'heater',
      ratings: { nominalV: 12, ratedW: 200, model: 'resistance' },
    },
    {
      partId: 'load-horn',
      title: 'Horn',
      symbol: 'horn',
      ratings: { nominalV: 12, ratedA: 5, demand: 'intermittent' },
    },
    {
      partId: 'load-socket',
      title: 'Socket',
      symbol: 'socket',
      ratings: { nominalV: 12, ratedA: 10, demand: 'intermittent' },
    },
    {
      partId: 'load-radio',
      title: 'Radio',
      symbol: 'radio',
      ratings: { nominalV: 12, ratedA: 6, dropClass: 'critical', demand: 'intermittent' },
    },
    {
      partId: 'load-instrument',
      title: 'Instrument',
      symbol: 'instrument',
      ratings: { nominalV: 12, ratedA: 1, dropClass: 'critical' },
    },
    { partId: 'load-fridge', title: 'Refrigerator', symbol: 'fridge', ratings: { nominalV: 12, ratedA: 5 } },
  ],
  terminals: () => [
    { name: 'pos', role: 'dc+', x: 2, y: 0 },
    { name: 'neg', role: 'dc-', x: 2, y: 6 },
  ],
  size: () => ({ width: 4, height: 6 }),
  defaults: (device) => {
    const { duty } = readRatings(ratings, device);
    return {
      model: 'current',
      dropClass: duty !== undefined && CRITICAL_DUTIES.has(duty) ? 'critical' : 'general',
      demand: duty !== undefined && MOMENTARY_DUTIES.has(duty) ? 'momentary' : 'continuous',
      thermallyProtected: false,
      essential: false,
    };
  },
  network: (device, { mode, state }) => {
    const { nominalV, ratedA, ratedW, model = 'current' } = readRatings(ratings, device);
    const amount = loadAmount(model, nominalV, ratedA, ratedW);
    if (amount === undefined) return [];
    const on = mode !== 'all-charging' && (mode === 'all-on' || state.on !== false);
    return [{ type: 'load', pos: 'pos', neg: 'neg', on, model, amount, fraction: state.fraction ?? 1 }];
  },
});

const CRITICAL_DUTIES: ReadonlySet<string> = new Set(['bilge', 'navLight', 'blower']);
const MOMENTARY_DUTIES: ReadonlySet<string> = new Set(['thruster', 'windlass']);

/** A, W or ohm by the model, from whichever of the two ratings is there; undefined where they make no sense. */
function loadAmount(
  model: 'current' | 'power' | 'resistance',
  nominalV: number | undefined,
  ratedA: number | undefined,
  ratedW: number | undefined,
): number | undefined {
  const v = nominalV ?? Number.NaN;
  const byModel = {
    current: ratedA ?? (ratedW ?? Number.NaN) / v,
    power: ratedW ?? (ratedA ?? Number.NaN) * v,
    resistance: ratedA === undefined ? (v * v) / (ratedW ?? Number.NaN) : v / ratedA,
  };
  const amount = byModel[model];
  return Number.isFinite(amount) && amount > 0 ? amount : undefined;
}
