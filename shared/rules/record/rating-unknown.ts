import { workOf } from '#shared/model/defaults.ts';
import type { Device } from '#shared/model/design.ts';
import { defineRule } from '#shared/rules/rule.ts';
import { highestVoltageAt } from '#shared/solve/highest-voltage.ts';
import { interruptNeedOf } from '#shared/solve/interrupting.ts';
import type { Proof } from '#shared/solve/proof.ts';
import { amountOf, callOf, isProtective, ratingsOf } from '#shared/solve/ratings.ts';
import { formatA } from '#shared/units/current.ts';
import { formatV } from '#shared/units/voltage.ts';
import { listOf } from '#shared/rules/mending.ts';

/**
 * The ratings that safety hangs on are told: what a fuse or breaker can interrupt, and at what voltage; and those that
 * nothing can be worked out without make sense.
 *
 * Why: what is not known is not passed. New work has its data sheet, so there it must be told; on what already is
 * aboard it should be found out. The finding says the value the rating would have to have.
 * Source: ABYC E-11 and 33 CFR 183.455, which ask for both.
 * Says nothing about a rating that is told and too low: the rules of `protection/` do.
 */
export const ratingUnknown = defineRule({
  id: 'record/rating-unknown',
  title: 'A rating that safety hangs on is not told',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'ABYC E-11 and 33 CFR 183', clause: 'overcurrent protection; 183.455(d)' },
    'iso-13297': { title: 'ISO 13297:2020', clause: 'overcurrent protection (from memory)' },
  },
  message: '{device} does not say {missing}.',

  *check(proof) {
    for (const device of proof.devices) {
      const unknown = unknownRatings(proof, device);
      if (unknown.length === 0) continue;
      yield {
        subject: { device: device.id },
        severity: workOf(device) === 'existing' ? 'should' : 'must',
        figures: {
          device: callOf(device),
          missing: listOf(unknown.map(({ says }) => says)),
          ...Object.fromEntries(unknown.map(({ name, value }) => [name, value])),
        },
      };
    }
  },
});

/** What no figure of a device can be worked out without. A load says its amperes or its watts. */
function neededRatings({ kind, ratings }: Device): readonly (readonly [name: string, what: string])[] {
  if (kind !== 'load') return Object.hasOwn(NEEDED, kind) ? NEEDED[kind]! : [];
  return [
    ['nominalV', 'its voltage'],
    ratings.ratedA === undefined && ratings.ratedW !== undefined
      ? ['ratedW', 'what power it takes']
      : ['ratedA', 'what current it takes'],
  ];
}

const NEEDED: Readonly<Record<string, readonly (readonly [name: string, what: string])[]>> = {
  battery: [
    ['nominalV', 'its voltage'],
    ['capacityAh', 'its capacity'],
  ],
  alternator: [
    ['maxA', 'the most it gives'],
    ['regulatedV', 'the voltage it holds'],
  ],
  fuse: [['ratedA', 'its rating']],
  breaker: [['ratedA', 'its rating']],
  switch: [['continuousA', 'what it carries']],
  selector: [['continuousA', 'what it carries']],
};

interface Unknown {
  readonly name: string;
  readonly value: number;
  readonly says: string;
}

function unknownRatings(proof: Proof, device: Device): Unknown[] {
  const ratings = ratingsOf(device);
  const isTold = (name: string) => (amountOf(ratings, name) ?? 0) > 0;
  const unknown: Unknown[] = neededRatings(device)
    .filter(([name]) => !isTold(name))
    .map(([name, what]) => ({ name, value: 0, says: `${what} (more than 0)` }));
  if (!isProtective(device)) return unknown;
  if (!isTold('interruptA')) {
    const value = interruptNeedOf(proof, device)?.computedA ?? 0;
    unknown.push({ name: 'interruptA', value, says: `what it can interrupt (it has to be ${formatA(value)} or more)` });
  }
  if (!isTold('maxV')) {
    const value = highestVoltageAt(proof, device);
    unknown.push({ name: 'maxV', value, says: `up to what voltage (it has to be ${formatV(value)} or more)` });
  }
  return unknown;
}
