import type { Remedy } from '#shared/model/analysis.ts';
import type { Device } from '#shared/model/design.ts';
import { guardedBy, mayChange } from '#shared/rules/mending.ts';
import { leastRatingA } from '#shared/rules/protection-load.ts';
import { defineRule } from '#shared/rules/rule.ts';
import { highestVoltageAt } from '#shared/solve/highest-voltage.ts';
import { interruptNeedOf, type InterruptNeed } from '#shared/solve/interrupting.ts';
import type { Proof } from '#shared/solve/proof.ts';
import { amountOf, callOf, isProtective, ratingsOf } from '#shared/solve/ratings.ts';
import { standardRatings } from '#shared/tables/protection.ts';
import { formatA } from '#shared/units/current.ts';

/**
 * A fuse or breaker can break the greatest current a short circuit can send through it.
 *
 * Why: one that can't welds shut or bursts, and the wire behind it burns. Asked is the greater of the currents through
 * it for a bolted short on either side, never the sum at its node. It passes as well where it meets the table for the
 * bank's cold-cranking amperes, or above that the figure of the battery's maker; that table met but the computed
 * current above the rating should be mended. A device may rely on one ahead of it that is named. Above the voltage it is
 * made for it has no such rating at all.
 * Source: ABYC E-11 Table V-A and the text on banks above 2,200 CCA or 500 Ah.
 * Says nothing where the rating is not told: `record/rating-unknown` does.
 */
export const interruptRating = defineRule({
  id: 'protection/interrupt-rating',
  title: 'Protection cannot break the short-circuit current',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'ABYC E-11', clause: 'Table V-A' },
    'iso-13297': { title: 'ABYC E-11, in the absence of a figure in ISO 13297', clause: 'Table V-A' },
  },
  message: '{device} can break {interruptA}; a short circuit sends {computedA} through it.',

  *check(proof) {
    for (const device of proof.devices) {
      const interruptA = amountOf(ratingsOf(device), 'interruptA');
      if (!isProtective(device) || interruptA === undefined) continue;
      const need = interruptNeedOf(proof, device);
      if (!need) continue;
      const maxV = amountOf(ratingsOf(device), 'maxV');
      const highestV = highestVoltageAt(proof, device);
      if (maxV !== undefined && maxV < highestV * (1 - 1e-9) && need.computedA > 0) {
        yield {
          subject: { device: device.id },
          message:
            '{device} can break {interruptA} at {maxV} and below; its circuit can stand at {highestV}, and a short circuit sends {computedA} through it.',
          figures: { device: callOf(device), interruptA, maxV, highestV, computedA: need.computedA, basis: need.basis },
          remedies: highestV <= STRONG_FUSE.maxV ? strongerFuse(proof, device, need) : [],
        };
        continue;
      }
      if (interruptA >= need.computedA * (1 - 1e-9) || isBackedUp(proof, device, need)) continue;
      const { admittedA } = need;
      const figures = {
        device: callOf(device),
        interruptA,
        computedA: need.computedA,
        nodeA: need.nodeA,
        position: need.position,
        basis: need.basis,
        ...(admittedA !== null && { admittedA }),
      };
      const subject = { device: device.id };
      const remedies = strongerFuse(proof, device, need);
      const isAdmitted = admittedA !== null && (interruptA >= admittedA || need.isLargeBankDevice);
      if (!isAdmitted) {
        yield { subject, figures, remedies };
      } else if (need.admittedBy === 'table') {
        const message =
          '{device} can break {interruptA}, as the table asks of a {position} device; a short circuit is worked out to send {computedA} through it.';
        yield { subject, figures, severity: 'should', message, remedies };
      }
    }
  },
});

/** A device named as back-up counts where it really stands ahead and can break the current itself. */
function isBackedUp(proof: Proof, device: Device, need: InterruptNeed): boolean {
  const { backedUpBy } = ratingsOf(device);
  if (typeof backedUpBy !== 'string' || !proof.regions.upstreamOf(device.id).includes(backedUpBy)) return false;
  const ahead = proof.design.devices[backedUpBy];
  return ahead !== undefined && (amountOf(ratingsOf(ahead), 'interruptA') ?? 0) >= need.computedA;
}

const STRONG_FUSE = { family: 'class T', interruptA: 20_000, maxV: 125 } as const;

/** A fuse that breaks 20 kA in its place, of the same rating or the next of its family that the wires allow. */
function strongerFuse(proof: Proof, device: Device, need: InterruptNeed): Remedy[] {
  const ratings = ratingsOf(device);
  const isFitting = device.kind === 'fuse' && mayChange(device) && need.computedA <= STRONG_FUSE.interruptA;
  if (!isFitting) return [];
  const mostA = Math.min(...guardedBy(proof, device.id).map((guarded) => guarded.allowedRatingA));
  const leastA = Math.max(leastRatingA(proof, device.id), amountOf(ratings, 'ratedA') ?? 0);
  const ratedA = standardRatings(STRONG_FUSE.family).find((each) => each >= leastA && each <= mostA * (1 + 1e-9));
  if (ratedA === undefined) return [];
  const { coldMilliohm: _old, backedUpBy: _ahead, ...kept } = device.ratings;
  return [
    {
      title: `Use a class T fuse of ${formatA(ratedA)} for ${callOf(device)}`,
      patch: [
        { op: 'set', path: ['devices', device.id, 'ratings'], value: { ...kept, ratedA, ...STRONG_FUSE } },
        { op: 'set', path: ['devices', device.id, 'symbol'], value: 'class-t' },
        ...(device.partId === undefined ? [] : [{ op: 'remove' as const, path: ['devices', device.id, 'partId'] }]),
      ],
    },
  ];
}
