import { conductorOf, type FullBasis, type FullConductor } from '#shared/model/defaults.ts';
import type { Run, Zone } from '#shared/model/design.ts';
import { isMetric, seriesOf, type Size } from '#shared/model/size.ts';
import { ELECTRONICS_BELOW_A, ELECTRONICS_BELOW_V, MINIMUM_SIZE } from '#shared/tables/minimum-size.ts';

import { ampacityWith, workingOhmPerMetre, type Ampacity } from './conductor.ts';
import { allowedRatingA, familyOf, type EndProtection } from './protection.ts';

export interface SizingCase {
  readonly run: Run;
  readonly basis: FullBasis;
  readonly zones: readonly Zone[];
  readonly warmestC: number;
  readonly bundled: number;
  readonly nominalV: number;
  readonly designCurrentA: number;
  /** The share of its present resistance that the loads it serves leave it; above 1 where there is room. */
  readonly dropShare: number;
  readonly protection: readonly EndProtection[];
  readonly minimum: Size | undefined;
}

/** The thinnest conductor of the run's own series that carries its current and keeps every drop; null if none does. */
export function smallestSizeOf(sizing: SizingCase): Size | null {
  return seriesOf(conductorOf(sizing.run).size).find((size) => carries(size, sizing)) ?? null;
}

/** The thinnest that also is not below the profile's smallest and lets the protection ahead of it stand. */
export function recommendedSizeOf(sizing: SizingCase): Size | null {
  const series = seriesOf(conductorOf(sizing.run).size);
  const from = sizing.minimum ? series.indexOf(sizing.minimum) : 0;
  return series.slice(from).find((size) => carries(size, sizing) && letsProtectionStand(size, sizing)) ?? null;
}

/** The same without its drop, for a run whose drop it takes another run to mend. */
export function smallestByAmpacity(sizing: SizingCase): Size | null {
  return recommendedSizeOf({ ...sizing, dropShare: Infinity });
}

function carries(size: Size, sizing: SizingCase): boolean {
  const { run, basis, warmestC, designCurrentA, dropShare } = sizing;
  if (ampacityAt(size, sizing).allowedA < designCurrentA * (1 - 1e-9)) return false;
  if (run.milliohm !== undefined || dropShare === Infinity) return true;
  const ohm = (each: Size) => workingOhmPerMetre(each, warmestC, basis);
  return ohm(size) <= ohm(conductorOf(run).size) * dropShare * (1 + 1e-9);
}

export function ampacityAt(size: Size, sizing: SizingCase): Ampacity {
  const conductor: FullConductor = { ...conductorOf(sizing.run), size };
  return ampacityWith(conductor, sizing.zones, sizing.basis, sizing.bundled, sizing.nominalV);
}

function letsProtectionStand(size: Size, sizing: SizingCase): boolean {
  return sizing.protection.every(({ device, ratedA }) => {
    if (!device || ratedA === undefined) return true;
    return ratedA <= allowedRatingA(sizing, ampacityAt(size, sizing), familyOf(device), sizing.basis) * (1 + 1e-9);
  });
}

export interface MinimumCase {
  readonly run: Run;
  readonly basis: FullBasis;
  readonly nominalV: number;
  readonly designCurrentA: number;
  /** It serves nothing but communication, navigation or other electronics, behind a device of their own. */
  readonly isElectronics: boolean;
}

/** The smallest size the profile lets this run have; undefined where the run is exempt. */
export function minimumSizeOf({ run, basis, nominalV, designCurrentA, isElectronics }: MinimumCase): Size | undefined {
  const minimum = MINIMUM_SIZE[basis.profile];
  const isPigtail = run.lengthM !== undefined && run.lengthM < minimum.pigtailM - 1e-9;
  if (isPigtail || run.link || run.enclosed === 'enclosure') return undefined;
  if (isElectronics && designCurrentA < ELECTRONICS_BELOW_A && nominalV < ELECTRONICS_BELOW_V) return undefined;
  const { awg, metric } = isSheathed(run) ? minimum.sheathed : minimum.separate;
  return isMetric(conductorOf(run).size) ? metric : awg;
}

export function isSheathed(run: Run): boolean {
  return run.cable !== undefined || run.enclosed === 'sheath';
}

export function isThinner(size: Size, than: Size): boolean {
  return seriesOf(size).indexOf(size) < seriesOf(than).indexOf(than);
}
