import type { FullBasis } from '#shared/model/defaults.ts';
import { conductorOf } from '#shared/model/defaults.ts';
import type { Device, EntityId } from '#shared/model/design.ts';
import { DISTANCES, NEXT_STANDARD_CEILING, nextRatingUp } from '#shared/tables/protection.ts';

import type { Circuits } from './circuits.ts';
import type { Ampacity } from './conductor.ts';
import type { RunEdge } from './network.ts';
import { amountOf, ratingsOf } from './ratings.ts';
import {
  coveringOf,
  greater,
  isOnCrankingPath,
  worstCovering,
  type Covering,
  type Guard,
  type Regions,
  type Side,
  type Way,
} from './regions.ts';

/** What protects one end of a run, or that nothing does. */
export interface EndProtection {
  readonly fromEnd: 'from' | 'to';
  /** `near`: the device stands a way down the run itself, as the one at a battery does. */
  readonly how: 'upstream' | 'near' | 'none';
  readonly device?: Device;
  readonly beside?: readonly Device[];
  /** That feed it by other ways. */
  readonly others?: readonly Device[];
  readonly ratedA?: number;
  readonly allowedRatingA?: number;
  /** Of the stub that no device protects: from the source of its current to the first device. */
  readonly stub?: Stub;
  /** What the current would come from. */
  readonly source?: Device;
  /** The run next to this one on the way to the source; none where it starts at the source itself. */
  readonly ahead?: EntityId;
  /** The run next to this one on the way to the device ahead; none where it starts at the device itself. */
  readonly fedBy?: EntityId;
}

export interface Stub {
  readonly lengthM: number;
  readonly limitM: number;
  /** The limit once all of it is enclosed. */
  readonly enclosedLimitM: number;
  readonly isLengthKnown: boolean;
  readonly covering: Covering;
  readonly verdict: 'right' | 'not told' | 'too far';
  /** From the run outwards, all of the runs of the stub. */
  readonly runs: readonly EntityId[];
  /** Nearest to the source of them: the finding hangs on it. */
  readonly firstRun: EntityId;
  readonly device: Device;
}

/** The protection of a run that can be fed; an end that no fault current can come from has no line. */
export function protectionOf(
  edge: RunEdge,
  circuits: Circuits,
  regions: Regions,
  ampacities: ReadonlyMap<EntityId, Ampacity>,
  basis: FullBasis,
): EndProtection[] {
  const side = circuits.netOf(edge.a).side;
  const isUngrounded = side === 'fed' || (side === 'return' && basis.dcSystem === 'ungrounded');
  if (!isUngrounded || isCrankingRun(edge.run.id, regions)) return [];
  const sides = regions.sidesOf(edge.run.id);
  if (!sides) return [];
  return (['from', 'to'] as const).flatMap((fromEnd) => {
    const [here, there] = fromEnd === 'from' ? [sides.from, sides.to] : [sides.to, sides.from];
    return endProtection(edge, fromEnd, here, there, circuits, regions, ampacities, basis) ?? [];
  });
}

/** On the path from a battery, over switches and selectors, to a starter, or on the way back. */
export function isCrankingRun(run: EntityId, regions: Regions): boolean {
  const sides = regions.sidesOf(run);
  return sides !== undefined && isOnCrankingPath(sides);
}

function endProtection(
  edge: RunEdge,
  fromEnd: 'from' | 'to',
  here: Side,
  there: Side,
  circuits: Circuits,
  regions: Regions,
  ampacities: ReadonlyMap<EntityId, Ampacity>,
  basis: FullBasis,
): EndProtection | undefined {
  const { source } = here;
  const ampacity = ampacities.get(edge.run.id)!;
  const feeding = feedingHere(here);
  if (source) {
    const leadsIntoBank =
      !there.nearest && source.bank !== undefined && [there.source?.bank, there.stacked].includes(source.bank);
    if (leadsIntoBank || isJumper(edge, circuits)) return undefined;
    if (!there.nearest) return { fromEnd, how: 'none', source: source.device, ahead: source.way?.run.id };
    return {
      fromEnd,
      how: 'near',
      source: (source.tap ?? source).device,
      stub: stubOf(edge, here, there, basis),
      ...ratingOf(there.largest, edge, ampacity, basis),
    };
  }
  if (!feeding) return undefined;
  const byUpstream = ratingOf(feeding, edge, ampacity, basis);
  if (isAllowed(byUpstream)) return { fromEnd, how: 'upstream', ...byUpstream };
  const byOneAhead = seriesRating(edge, here, regions, ampacity, basis);
  if (byOneAhead) return { fromEnd, how: 'upstream', ...byOneAhead };
  const others = (here.feeders ?? [])
    .map(({ device }) => device)
    .filter((device) => device !== feeding.device && !feeding.beside.includes(device));
  const fedBy = here.feeder?.way?.run;
  const upstream = {
    fromEnd,
    how: 'upstream',
    ...byUpstream,
    ...(others.length > 0 && { others }),
    ...(fedBy && { fedBy: fedBy.id }),
  } as const;
  if (!there.nearest) return upstream;
  // A smaller conductor tapped from a larger one: its own device stands for it, if it is near enough.
  const byOwn = ratingOf(there.largest, edge, ampacity, basis);
  if (!isAllowed(byOwn)) return upstream;
  const stub = stubOf(edge, here, there, basis);
  // What starts at the device itself, or goes on from a run that it does not protect either, is no tap.
  const isTap = fedBy && isAllowed(ratingOf(feeding, { run: fedBy }, ampacities.get(fedBy.id)!, basis));
  if (!isTap && stub.verdict === 'too far') return upstream;
  return { fromEnd, how: 'near', source: feeding.device, stub, ...byOwn };
}

/** Devices side by side pass what they pass together only where all of them stand on this side of the run. */
function feedingHere({ feeding, feeders = [] }: Side): Guard | undefined {
  if (feeders.every(({ beside }) => beside.length === 0)) return feeding;
  const here = new Set(feeders.map(({ device }) => device));
  return feeders
    .map((guard): Guard => {
      const beside = guard.beside.filter((device) => here.has(device));
      if (beside.length === guard.beside.length) return guard;
      const ratings = [guard.device, ...beside].map((device) => amountOf(ratingsOf(device), 'ratedA'));
      const isTold = ratings.every((each) => each !== undefined);
      return {
        device: guard.device,
        beside,
        ratedA: isTold ? ratings.reduce((sum: number, each) => sum + each!, 0) : undefined,
      };
    })
    .reduce<Guard | undefined>(greater, undefined);
}

/** Of devices in series, with no other way for current to come, the smallest protects what is behind all of them. */
function seriesRating(
  edge: RunEdge,
  { feeders = [] }: Side,
  regions: Regions,
  ampacity: Ampacity,
  basis: FullBasis,
): Rating | undefined {
  const seen = new Set<EntityId>();
  let ahead = feeders.length === 1 ? regions.onlyOneAhead(feeders[0]!.device.id) : undefined;
  while (ahead && !seen.has(ahead.device.id)) {
    seen.add(ahead.device.id);
    const rating = ratingOf(ahead, edge, ampacity, basis);
    if (isAllowed(rating)) return rating;
    ahead = regions.onlyOneAhead(ahead.device.id);
  }
  return undefined;
}

/** From a terminal of one battery straight to one of another in its bank, whatever else hangs there. */
function isJumper(edge: RunEdge, circuits: Circuits): boolean {
  const [one, other] = [edge.a, edge.b].map((node) =>
    circuits.network
      .edgesAt(node)
      .flatMap((each) => (each.type === 'source' ? (circuits.bankOf(each.device.id) ?? []) : [])),
  );
  return one!.some((bank) => other!.includes(bank));
}

interface Rating {
  readonly device?: Device;
  /** That feed the same conductors side by side with it: all of them have to open. */
  readonly beside?: readonly Device[];
  readonly ratedA?: number;
  readonly allowedRatingA?: number;
}

function ratingOf(guard: Guard | undefined, edge: Pick<RunEdge, 'run'>, ampacity: Ampacity, basis: FullBasis): Rating {
  if (!guard) return {};
  const { device, beside, ratedA } = guard;
  return {
    device,
    ...(beside.length > 0 && { beside }),
    ratedA,
    allowedRatingA: allowedRatingA(edge, ampacity, familyOf(device), basis),
  };
}

export function familyOf(device: Device): string | undefined {
  const { family } = ratingsOf(device);
  return typeof family === 'string' ? family : undefined;
}

function isAllowed({ ratedA, allowedRatingA }: Rating): boolean {
  return ratedA !== undefined && allowedRatingA !== undefined && ratedA <= allowedRatingA * (1 + 1e-9);
}

/** The greatest rating the profile lets stand ahead of a run: its ampacity, the next standard rating, or 150 %. */
export function allowedRatingA(
  edge: Pick<RunEdge, 'run'>,
  ampacity: Ampacity,
  family: string | undefined,
  basis: FullBasis,
): number {
  const carriedA =
    basis.ratingOf === 'table' && ampacity.allowedA > 0
      ? ampacity.baseA * conductorOf(edge.run).parallel
      : ampacity.allowedA;
  const ceilingA = carriedA * NEXT_STANDARD_CEILING;
  if (basis.ratingAbove === '150-percent') return ceilingA;
  const nextA = nextRatingUp(family, carriedA);
  return nextA !== undefined && nextA <= ceilingA ? nextA : carriedA;
}

function stubOf(edge: RunEdge, here: Side, there: Side, basis: FullBasis): Stub {
  const { run } = edge;
  const { feeding } = here;
  const source = here.source?.tap ?? here.source;
  const device = there.nearest!;
  const distances = DISTANCES[basis.profile];
  const enclosedLimitM = source ? enclosedLimitOf(source.device, basis) : distances.enclosedElsewhereM;
  const lengthM = (source?.lengthM ?? 0) + (run.lengthM ?? 0) + device.lengthM;
  const covering = worstCovering(coveringOf(run), worstCovering(source?.covering ?? 'enclosed', device.covering));
  const outward = [...runsOf(source?.way)];
  const runs = [...outward.toReversed(), run.id, ...runsOf(device.way)];
  const isLengthKnown =
    (source?.isLengthKnown ?? feeding !== undefined) && run.lengthM !== undefined && device.isLengthKnown;
  const common = { lengthM, enclosedLimitM, isLengthKnown, covering, runs, firstRun: runs[0]!, device: device.device };
  const isWithin = (limitM: number) => lengthM <= limitM + 1e-9;
  if (isWithin(distances.bareM)) return { ...common, limitM: distances.bareM, verdict: 'right' };
  if (!isWithin(enclosedLimitM)) {
    return { ...common, limitM: covering === 'enclosed' ? enclosedLimitM : distances.bareM, verdict: 'too far' };
  }
  if (covering === 'enclosed') return { ...common, limitM: enclosedLimitM, verdict: 'right' };
  return { ...common, limitM: distances.bareM, verdict: covering === 'bare' ? 'too far' : 'not told' };
}

function enclosedLimitOf(source: Device, basis: FullBasis): number {
  const distances = DISTANCES[basis.profile];
  return source.kind === 'battery' ? distances.enclosedFromBatteryM : distances.enclosedElsewhereM;
}

/** The runs of a way, from its near end to its far one. */
function runsOf(way: Way | undefined): EntityId[] {
  const runs: EntityId[] = [];
  for (let at = way; at; at = at.beyond) runs.push(at.run.id);
  return runs;
}
