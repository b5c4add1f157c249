import type { Remedy } from '#shared/model/analysis.ts';
import type { Device, EntityId } from '#shared/model/design.ts';
import type { Patch } from '#shared/model/patch.ts';
import type { Size } from '#shared/model/size.ts';
import type { Proof, ProvedRun } from '#shared/solve/proof.ts';
import { amountOf, callOf, ratingsOf } from '#shared/solve/ratings.ts';
import { formatA } from '#shared/units/current.ts';

/** What may be changed by a remedy: nothing that is locked. */
export function mayChange(entity: { readonly locked?: boolean }): boolean {
  return entity.locked !== true;
}

export function useSize(proof: Proof, run: ProvedRun, size: Size): Remedy {
  return useSizeFor(proof, [run], size);
}

export function useSizeFor(proof: Proof, runs: readonly ProvedRun[], size: Size): Remedy {
  return {
    title: `Use ${size} for ${listOf(runs.map(({ run }) => callOf(run)))}`,
    patch: runs.flatMap((run) => sizePatches(proof, run, size)),
  };
}

/** The cores of a cable change together: they lie in one jacket. */
export function sizePatches(proof: Proof, run: ProvedRun, size: Size): Patch[] {
  const { cable } = run.run;
  const cores = cable === undefined ? [run] : proof.runs.filter((each) => each.run.cable === cable);
  return cores.map((core) => ({ op: 'set', path: ['runs', core.id, 'conductor', 'size'], value: size }));
}

/** A part is of one rating, so a device that gets another no longer is that part. */
export function useRating(device: Device, ratedA: number): Remedy {
  const patch: Patch[] = [{ op: 'set', path: ['devices', device.id, 'ratings', 'ratedA'], value: ratedA }];
  if (device.partId !== undefined) patch.push({ op: 'remove', path: ['devices', device.id, 'partId'] });
  return { title: `Use ${formatA(ratedA)} for ${callOf(device)}`, patch };
}

/** `W1`, `W1 and W2`, `W1, W2 and W3`. */
export function listOf(names: readonly string[]): string {
  if (names.length < 2) return names.join('');
  return `${names.slice(0, -1).join(', ')} and ${names.at(-1)}`;
}

/** The runs a device protects, with what the profile lets it be rated ahead of each: less what stands beside it. */
export function guardedBy(proof: Proof, device: EntityId): { run: ProvedRun; allowedRatingA: number }[] {
  return (proof.guardedBy.get(device) ?? []).map(({ run, end }) => {
    const besideA = [end.device!, ...(end.beside ?? [])]
      .filter(({ id }) => id !== device)
      .reduce((sum, each) => sum + (amountOf(ratingsOf(each), 'ratedA') ?? 0), 0);
    return { run, allowedRatingA: end.allowedRatingA! - besideA };
  });
}
