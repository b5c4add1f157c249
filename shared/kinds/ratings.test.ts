import { describe, expect, test } from 'vitest';

import { KINDS } from './index.ts';

/** Terminals and ratings as the design document has them; what is required first, and a value each key may have. */
const DOCUMENTED: Readonly<Record<string, { required: Record<string, unknown>; optional: Record<string, unknown> }>> = {
  battery: {
    required: { chemistry: 'flooded', nominalV: 12, capacityAh: 95 },
    optional: {
      internalMilliohm: 4,
      emfV: 12.7,
      ccaA: 800,
      shortCircuitA: 3000,
      maxDischargeA: 100,
      maxChargeA: 50,
      chargeV: 14.4,
      floatV: 13.6,
      equaliseV: 15.5,
      usableFraction: 0.5,
      peukert: 1.2,
      managed: true,
      maxSeries: 4,
      maxParallel: 4,
      lowTempCutoff: true,
      preAlarm: false,
    },
  },
  fuse: {
    required: { ratedA: 100 },
    optional: { interruptA: 6000, maxV: 32, family: 'gG', coldMilliohm: 0.4, backedUpBy: 'f1' },
  },
  breaker: {
    required: { ratedA: 30 },
    optional: {
      interruptA: 3000,
      maxV: 65,
      poles: 2,
      main: true,
      residualMilliamp: 30,
      rerating: 0.005,
      backedUpBy: 'f1',
    },
  },
  switch: {
    required: { continuousA: 300 },
    optional: {
      intermittentA: 500,
      crankingA: 900,
      interruptA: 1000,
      maxV: 48,
      poles: 2,
      role: 'emergencyParallel',
      normal: 'open',
      interlock: 'shore',
    },
  },
  selector: {
    required: { continuousA: 300 },
    optional: {
      intermittentA: 500,
      crankingA: 900,
      maxV: 48,
      normal: 'both',
      makeBeforeBreak: true,
      hasBoth: true,
    },
  },
  busbar: { required: { ratedA: 150 }, optional: { maxV: 48, role: 'pe', studs: 8 } },
  terminal: { required: { ratedA: 30 }, optional: { ways: 6 } },
  bond: { required: {}, optional: { role: 'lightning', ways: 2 } },
  alternator: {
    required: { maxA: 60, regulatedV: 14.2 },
    optional: {
      hotDerate: 0.75,
      externalRegulator: true,
      surgeProtector: true,
      fieldDisconnect: true,
      selfLimiting: true,
    },
  },
  starter: { required: {}, optional: { crankA: 150 } },
  load: {
    required: { nominalV: 12 },
    optional: {
      ratedA: 5,
      ratedW: 60,
      minV: 10.5,
      maxV: 15,
      model: 'power',
      dropClass: 'critical',
      hoursPerDay: 2,
      demand: 'momentary',
      onMinutes: 5,
      duty: 'memory',
      lockedRotorA: 20,
      thermallyProtected: true,
      essential: true,
    },
  },
};

describe.each(KINDS.map((kind) => [kind.kind, kind] as const))('the ratings of a %s', (name, kind) => {
  const { required, optional } = DOCUMENTED[name]!;
  const accepts = (ratings: object) => kind.ratings.safeParse(ratings).success;

  test('may hold every documented key at once, and the required ones alone', () => {
    expect(accepts({ ...required, ...optional })).toBe(true);
    expect(accepts(required)).toBe(true);
  });

  test('hold nothing that is not documented', () => {
    expect(Object.keys(kind.ratings.shape).sort()).toEqual(Object.keys({ ...required, ...optional }).sort());
    expect(accepts({ ...required, colour: 'red' })).toBe(false);
  });

  test('are refused without a required one', () => {
    for (const key of Object.keys(required)) expect(accepts({ ...required, [key]: undefined })).toBe(false);
  });

  test('are refused with a value of another sort', () => {
    for (const key of Object.keys({ ...required, ...optional })) {
      expect(accepts({ ...required, ...optional, [key]: { not: 'this' } })).toBe(false);
    }
  });

  test('of every offer in the locker fit', () => {
    for (const offer of kind.offers) expect(accepts(offer.ratings), offer.partId).toBe(true);
  });
});
