import type { Remedy } from '#shared/model/analysis.ts';
import { conductorOf, workOf } from '#shared/model/defaults.ts';
import type { Device, EntityId } from '#shared/model/design.ts';
import { compareMarks } from '#shared/rules/marks.ts';
import { listOf, mayChange, useRating, useSizeFor } from '#shared/rules/mending.ts';
import { defineRule } from '#shared/rules/rule.ts';
import { leastRatingA } from '#shared/rules/protection-load.ts';
import type { Proof, ProvedRun } from '#shared/solve/proof.ts';
import { familyOf } from '#shared/solve/protection.ts';
import { callOf } from '#shared/solve/ratings.ts';
import { smallestByAmpacity } from '#shared/solve/sizes.ts';
import { squareMmOf } from '#shared/tables/copper.ts';
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
      for (const { device, beside = [], others = [], fedBy, ratedA, allowedRatingA } of run.protection) {
        if (!device || ratedA === undefined || allowedRatingA === undefined || run.ampacity.allowedA <= 0) continue;
        if (ratedA <= allowedRatingA * (1 + 1e-9) || isFoundEarlier(proof, run, fedBy)) continue;
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

/** Runs in a row of the same conductor, behind the same device, are one cause: it is said of the first. */
function isFoundEarlier(proof: Proof, run: ProvedRun, fedBy: EntityId | undefined): boolean {
  const before = fedBy === undefined ? undefined : proof.runOf.get(fedBy);
  return before !== undefined && isSameConductor(before, run) && endAbove(before) !== undefined;
}

function isSameConductor(one: ProvedRun, other: ProvedRun): boolean {
  return (
    conductorOf(one.run).size === conductorOf(other.run).size &&
    one.ampacity.allowedA === other.ampacity.allowedA &&
    !one.isCranking
  );
}

function endAbove(run: ProvedRun) {
  if (run.ampacity.allowedA <= 0) return undefined;
  return run.protection.find(
    ({ ratedA, allowedRatingA }) =>
      ratedA !== undefined && allowedRatingA !== undefined && ratedA > allowedRatingA * (1 + 1e-9),
  );
}

/** The run, and those behind it that are found with it. */
function rowFrom(proof: Proof, run: ProvedRun): ProvedRun[] {
  const row = [run];
  for (const head of row) {
    for (const next of proof.runs) {
      const { fedBy } = endAbove(next) ?? {};
      if (fedBy === head.id && isSameConductor(head, next) && !row.includes(next)) row.push(next);
    }
  }
  return row;
}

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
  const row = rowFrom(proof, run);
  const sizes = row.map((each) => each.recommendedSize ?? (each.isSignal ? null : smallestByAmpacity(each.sizing)));
  const told = sizes.filter((size) => size !== null);
  if (told.length === row.length && row.every((each) => mayChange(each.run))) {
    const size = told.reduce((a, b) => (squareMmOf(a) >= squareMmOf(b) ? a : b));
    ways.push({ isNew: row.every((each) => workOf(each.run) === 'new'), remedy: useSizeFor(proof, row, size) });
  }
  return [...ways.filter((way) => way.isNew), ...ways.filter((way) => !way.isNew)].map((way) => way.remedy);
}
