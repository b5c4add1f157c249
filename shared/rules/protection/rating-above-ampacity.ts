import type { Remedy } from '#shared/model/analysis.ts';
import { workOf } from '#shared/model/defaults.ts';
import type { Device } from '#shared/model/design.ts';
import { compareMarks } from '#shared/rules/marks.ts';
import { listOf, mayChange, useRating, useSize } from '#shared/rules/mending.ts';
import { defineRule } from '#shared/rules/rule.ts';
import { leastRatingA } from '#shared/rules/protection-load.ts';
import type { Proof, ProvedRun } from '#shared/solve/proof.ts';
import { familyOf } from '#shared/solve/protection.ts';
import { callOf } from '#shared/solve/ratings.ts';
import { smallestByAmpacity } from '#shared/solve/sizes.ts';
import { nextRatingDown } from '#shared/tables/protection.ts';

/**
 * The fuse or breaker ahead of a run is not rated above what the run can carry: its ampacity or the next standard
 * rating up to 150 % of it (ABYC), 150 % (ISO, DC).
 *
 * Why: a conductor loaded beyond its ampacity overheats before the protection opens; the wire becomes the fuse. The
 * ampacity is the one left after every derating of the run, unless the basis takes the table's own. A run that is
 * protected from both ends is asked for each.
 * Source: ABYC E-11 (from memory) and 33 CFR 183.455(c); ISO 10133:2012 8.1 (from memory).
 * Says nothing about a run with no protection at all: `protection/missing` does.
 */
export const ratingAboveAmpacity = defineRule({
  id: 'protection/rating-above-ampacity',
  title: 'Protection is rated above the wire it protects',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'ABYC E-11 and 33 CFR 183', clause: 'overcurrent protection, rating; 183.455(c)' },
    'iso-13297': { title: 'ISO 10133:2012 and ISO 13297:2020', clause: '8.1 (from memory)' },
  },
  message:
    '{device} is rated {ratedA}; {run} carries {allowedA}, so no more than {allowedRatingA} may stand ahead of it.',

  *check(proof) {
    for (const run of proof.runs) {
      for (const { device, beside = [], others = [], ratedA, allowedRatingA } of run.protection) {
        if (!device || ratedA === undefined || allowedRatingA === undefined || run.ampacity.allowedA <= 0) continue;
        if (ratedA <= allowedRatingA * (1 + 1e-9)) continue;
        yield {
          subject: { run: run.id },
          figures: {
            device: listOf([device, ...beside].toSorted(compareMarks).map(callOf)),
            ratedA,
            run: callOf(run.run),
            allowedA: run.ampacity.allowedA,
            allowedRatingA,
          },
          message:
            beside.length === 0
              ? undefined
              : '{device} side by side pass {ratedA} before they open; {run} carries {allowedA}, so no more than {allowedRatingA} may stand ahead of it.',
          remedies: remediesFor(proof, run, device, beside.length + others.length > 0, allowedRatingA),
        };
      }
    }
  },
});

/** What is new is changed before what exists. */
function remediesFor(
  proof: Proof,
  run: ProvedRun,
  device: Device,
  isOneOfMany: boolean,
  allowedRatingA: number,
): Remedy[] {
  const ways: { readonly isNew: boolean; readonly remedy: Remedy }[] = [];
  const fittingA = nextRatingDown(familyOf(device), allowedRatingA);
  if (!isOneOfMany && fittingA !== undefined && fittingA >= leastRatingA(proof, device.id) && mayChange(device)) {
    ways.push({ isNew: workOf(device) === 'new', remedy: useRating(device, fittingA) });
  }
  const size = run.recommendedSize ?? (run.isSignal ? null : smallestByAmpacity(run.sizing));
  if (size !== null && mayChange(run.run)) {
    ways.push({ isNew: workOf(run.run) === 'new', remedy: useSize(proof, run, size) });
  }
  return [...ways.filter((way) => way.isNew), ...ways.filter((way) => !way.isNew)].map((way) => way.remedy);
}
