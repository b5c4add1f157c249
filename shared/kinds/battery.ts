import { z } from 'zod';

import { CHEMISTRIES, type Chemistry } from './chemistry.ts';
import { amount, count, defineKind, readRatings } from './kind.ts';

const ratings = z.strictObject({
  chemistry: z.enum(CHEMISTRIES),
  nominalV: amount,
  capacityAh: amount,
  internalMilliohm: amount.optional(),
  emfV: amount.optional(),
  ccaA: amount.optional(),
  shortCircuitA: amount.optional(),
  maxDischargeA: amount.optional(),
  maxChargeA: amount.optional(),
  chargeV: amount.optional(),
  floatV: amount.optional(),
  equaliseV: amount.optional(),
  usableFraction: amount.optional(),
  peukert: amount.optional(),
  managed: z.boolean().optional(),
  maxSeries: count(1, 99).optional(),
  maxParallel: count(1, 99).optional(),
  lowTempCutoff: z.boolean().optional(),
  preAlarm: z.boolean().optional(),
});

export const battery = defineKind({
  kind: 'battery',
  title: 'Battery',
  drawer: 'Store',
  letter: () => 'G',
  ratings,
  symbols: ['cells', 'block'],
  offers: [
    {
      partId: 'battery-flooded-12-95',
      title: 'Start battery, flooded, 12 V, 95 Ah',
      ratings: { chemistry: 'flooded', nominalV: 12, capacityAh: 95, ccaA: 800 },
    },
    {
      partId: 'battery-agm-12-100',
      title: 'AGM battery, 12 V, 100 Ah',
      ratings: { chemistry: 'agm', nominalV: 12, capacityAh: 100, ccaA: 650 },
    },
    {
      partId: 'battery-gel-12-100',
      title: 'Gel battery, 12 V, 100 Ah',
      ratings: { chemistry: 'gel', nominalV: 12, capacityAh: 100, ccaA: 500 },
    },
    {
      partId: 'battery-lifepo4-12-100',
      title: 'LiFePO4 battery, 12.8 V, 100 Ah',
      ratings: {
        chemistry: 'lifepo4',
        nominalV: 12.8,
        capacityAh: 100,
        managed: true,
        lowTempCutoff: true,
        maxDischargeA: 100,
        maxChargeA: 50,
        shortCircuitA: 3000,
      },
    },
    {
      partId: 'battery-lifepo4-12-280',
      title: 'LiFePO4 battery, 12.8 V, 280 Ah',
      ratings: {
        chemistry: 'lifepo4',
        nominalV: 12.8,
        capacityAh: 280,
        managed: true,
        lowTempCutoff: true,
        maxDischargeA: 200,
        maxChargeA: 140,
        shortCircuitA: 6000,
      },
    },
  ],
  terminals: () => [
    { name: 'pos', role: 'dc+', x: 2, y: 0 },
    { name: 'neg', role: 'dc-', x: 2, y: 6 },
    { name: 'sense', role: 'signal', x: 0, y: 4, optional: true },
  ],
  size: () => ({ width: 4, height: 6 }),
  defaults: (device) => {
    const { chemistry = 'flooded' } = readRatings(ratings, device);
    return { ...BY_CHEMISTRY[chemistry], managed: false, lowTempCutoff: false, preAlarm: false };
  },
  network: (device, { state }) => {
    const { chemistry, nominalV, capacityAh, emfV, internalMilliohm, shortCircuitA } = readRatings(ratings, device);
    if (chemistry === undefined || nominalV === undefined || capacityAh === undefined) return [];
    const facts = { chemistry, nominalV, capacityAh, emfV, internalMilliohm, shortCircuitA, soc: state.soc };
    return [{ type: 'battery', pos: 'pos', neg: 'neg', ...facts }];
  },
});

/** Usual design figures, from memory; a battery's own data governs. EMF and resistance are in the tables. */
const BY_CHEMISTRY: Readonly<Record<Chemistry, { readonly usableFraction: number; readonly peukert: number }>> = {
  flooded: { usableFraction: 0.5, peukert: 1.25 },
  agm: { usableFraction: 0.5, peukert: 1.1 },
  gel: { usableFraction: 0.5, peukert: 1.15 },
  lifepo4: { usableFraction: 0.8, peukert: 1.03 },
};
