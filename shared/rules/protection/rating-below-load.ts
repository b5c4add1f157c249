import type { Remedy } from '#shared/model/analysis.ts';
import type { Device } from '#shared/model/design.ts';
import { guardedBy, mayChange, useRating } from '#shared/rules/mending.ts';
import { leastRatingA } from '#shared/rules/protection-load.ts';
import { defineRule } from '#shared/rules/rule.ts';
import type { Proof } from '#shared/solve/proof.ts';
import { familyOf } from '#shared/solve/protection.ts';
import { amountOf, callOf, isProtective, ratingsOf } from '#shared/solve/ratings.ts';
import { nextRatingUp } from '#shared/tables/protection.ts';

/**
 * A fuse or breaker is rated for what flows through it: never below the current, and not below 125 % of a load that
 * is on for three hours or more.
 *
 * Why: one that is too small opens in use, and a boat loses its lights or its pump; close to its rating it ages and
 * opens later. Momentary loads are left to the time-current curve of the device: a note says so.
 * Source: NEC 210.20(A); ABYC E-11 and ISO 13297 (from memory).
 * Says nothing about the wire: `protection/rating-above-ampacity` does.
 */
export const ratingBelowLoad = defineRule({
  id: 'protection/rating-below-load',
  title: 'Protection is rated below the load',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'NEC and ABYC E-11', clause: '210.20(A); overcurrent protection (from memory)' },
    'iso-13297': { title: 'NEC and ISO 13297:2020', clause: '210.20(A); overcurrent protection (from memory)' },
  },
  message: '{device} is rated {ratedA}; {currentA} flows through it.',

  *check(proof) {
    for (const device of proof.devices) {
      const ratedA = amountOf(ratingsOf(device), 'ratedA');
      if (!isProtective(device) || ratedA === undefined || isShorted(proof, device)) continue;
      const { lastingA, momentaryA } = proof.currentThrough(device.id);
      const neededA = leastRatingA(proof, device.id);
      const figures = { device: callOf(device), ratedA, currentA: lastingA, neededA, peakA: lastingA + momentaryA };
      const subject = { device: device.id };
      const isBelow = (amperes: number) => ratedA < amperes * (1 - 1e-9);
      if (isBelow(lastingA)) {
        yield { subject, figures, remedies: nextLarger(proof, device, neededA) };
      } else if (isBelow(neededA)) {
        const message =
          '{device} is rated {ratedA}; with loads that are on for 3 h or more counted at 125 %, {neededA} should be its rating at least.';
        yield { subject, figures, severity: 'should', message, remedies: nextLarger(proof, device, neededA) };
      } else if (isBelow(lastingA + momentaryA)) {
        const message =
          '{device} is rated {ratedA}; with the short-time loads {peakA} flows through it. See that its time-current curve lets that pass.';
        yield { subject, figures, severity: 'note', message };
      }
    }
  },
});

function isShorted({ circuits, shorts }: Proof, device: Device): boolean {
  return circuits.network.contactsOf(device.id).some(({ a }) => shorts.isShorted(a));
}

/** The next rating of its family, where every wire it protects allows it. */
function nextLarger(proof: Proof, device: Device, neededA: number): Remedy[] {
  const ratedA = nextRatingUp(familyOf(device), neededA);
  if (ratedA === undefined || !mayChange(device)) return [];
  const isAllowed = guardedBy(proof, device.id).every(({ allowedRatingA }) => ratedA <= allowedRatingA * (1 + 1e-9));
  return isAllowed ? [useRating(device, ratedA)] : [];
}
