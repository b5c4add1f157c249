import type { FullBasis } from '#shared/model/defaults.ts';
import type { EntityId, Run } from '#shared/model/design.ts';

import { canConduct, type Circuits } from './circuits.ts';
import type { LoadDemand } from './demand.ts';
import type { Flow } from './flow.ts';
import { isConducting, type Network, type SourceEdge } from './network.ts';
import { leastResistance, ohmOf, type Paths, type PathStep } from './paths.ts';

/** The drop of one load in the mode where it is worst. */
export interface LoadDrop {
  readonly load: LoadDemand;
  readonly mode: EntityId;
  /** Over the conductors of its path and back. */
  readonly volts: number;
  /** With switches, fuses and contacts. */
  readonly totalV: number;
  /** The conductors once more, with the momentary loads of others counted. */
  readonly withMomentaryV: number;
  readonly fraction: number;
  readonly limit: number;
  readonly dropClass: 'critical' | 'general';
  readonly path: readonly Run[];
  /** What each run of the path adds, in the order of the path. */
  readonly voltsOf: readonly number[];
  /** The way from the source to the load, and from the source's other pole to it. */
  readonly feed: readonly PathStep[];
  readonly back: readonly PathStep[];
  /** A path with a run whose length is not known has no verdict. */
  readonly isKnown: boolean;
}

export interface DropMode {
  readonly mode: EntityId;
  readonly flow: Flow;
  /** With the contacts as they stand in this mode. */
  readonly network: Network;
  readonly circuits: Circuits;
}

/** Cranking may take 10 % of nominal. */
export const CRANKING_LIMIT = 0.1;

/** The worst drop of every load that a source can reach. */
export function loadDrops(loads: readonly LoadDemand[], modes: readonly DropMode[], basis: FullBasis): LoadDrop[] {
  const worst = new Map<EntityId, LoadDrop>();
  for (const mode of modes) {
    const sources = strongestSources(mode);
    const momentary = momentaryOn(mode, loads);
    for (const load of loads) {
      const drop = dropOf(load, mode, sources, momentary, basis);
      if (!drop) continue;
      const before = worst.get(load.device.id);
      if (!before || drop.fraction / drop.limit > before.fraction / before.limit) worst.set(load.device.id, drop);
    }
  }
  return loads.flatMap((load) => worst.get(load.device.id) ?? []);
}

interface Supply {
  readonly feed: Paths;
  readonly back: Paths;
  /** The same with every switch as it can stand, for a load that the mode leaves off. */
  widerFeed(): Paths;
  widerBack(): Paths;
}

/** Of every island, the source that gives most; from its whole string, where it stands in one. */
function strongestSources({ network, circuits, flow }: DropMode): Map<number, Supply> {
  const strongest = new Map<number, { source: SourceEdge; givesA: number }>();
  for (const source of circuits.network.edges) {
    if (source.type !== 'source') continue;
    const island = circuits.islandOf(circuits.netOf(source.a));
    const givesA = -flow.currentOf(source);
    const before = strongest.get(island);
    const isStronger = !before || givesA > before.givesA + 1e-9;
    if (isStronger && (source.element.type === 'battery' || givesA > 1e-9)) strongest.set(island, { source, givesA });
  }
  return new Map([...strongest].map(([island, { source }]) => [island, supplyFrom(source, network, circuits)]));
}

function supplyFrom(source: SourceEdge, network: Network, circuits: Circuits): Supply {
  const [top, bottom] = stringEnds(source, circuits);
  let widerFeed: Paths | undefined;
  let widerBack: Paths | undefined;
  return {
    feed: leastResistance(network, top, isConducting),
    back: leastResistance(network, bottom, isConducting),
    widerFeed: () => (widerFeed ??= leastResistance(network, top, canConduct)),
    widerBack: () => (widerBack ??= leastResistance(network, bottom, canConduct)),
  };
}

/** The positive of the highest and the negative of the lowest battery of a string. */
function stringEnds(source: SourceEdge, circuits: Circuits): [number, number] {
  const climb = (start: SourceEdge, side: 'a' | 'b') => {
    let at = start;
    const seen = new Set([start.index]);
    for (;;) {
      const net = circuits.netOf(at[side]);
      const next: SourceEdge | undefined = (side === 'a' ? net.negatives : net.positives).find(
        (each) => each.element.type === 'battery' && !seen.has(each.index),
      );
      if (!next) return at[side];
      seen.add(next.index);
      at = next;
    }
  };
  return [climb(source, 'a'), climb(source, 'b')];
}

interface MomentaryShare {
  /** What the momentary loads put on an edge, by its index. */
  readonly onEdge: Float64Array;
}

function momentaryOn({ flow }: DropMode, loads: readonly LoadDemand[]): MomentaryShare {
  const short = new Set(
    loads.filter((load) => load.demand === 'momentary' || load.demand === 'cranking').map((load) => load.edge.index),
  );
  if (short.size === 0) return { onEdge: new Float64Array(0) };
  return { onEdge: flow.spread((edge) => (short.has(edge.index) ? Math.max(0, flow.currentOf(edge)) : 0)) };
}

function dropOf(
  load: LoadDemand,
  mode: DropMode,
  sources: ReadonlyMap<number, Supply>,
  momentary: MomentaryShare,
  basis: FullBasis,
): LoadDrop | undefined {
  const { circuits, flow } = mode;
  const fedFrom = circuits.netOf(load.edge.a);
  const supply = sources.get(circuits.islandOf(fedFrom));
  if (!(load.nominalV > 0)) return undefined;
  if (!supply || fedFrom.side !== 'fed' || circuits.netOf(load.edge.b) === fedFrom) return undefined;
  const takenA = flow.currentOf(load.edge);
  const isOn = takenA > 1e-9;
  const isSwitchedIn = supply.feed.reaches(load.edge.a) && supply.back.reaches(load.edge.b);
  // A load that a mode of the design turns off is not judged there; one that no switch position of the built-in
  // mode feeds (a horn behind its button) is judged as if its switch were pressed.
  if (!isOn && mode.mode !== 'all-on') return undefined;
  if (isOn && !isSwitchedIn) return undefined;
  const [feed, back] = isSwitchedIn ? [supply.feed, supply.back] : [supply.widerFeed(), supply.widerBack()];
  if (!feed.reaches(load.edge.a) || !back.reaches(load.edge.b)) return undefined;

  const out = feed.to(load.edge.a);
  const home = back.to(load.edge.b);
  const steps: readonly (PathStep & { readonly sign: 1 | -1 })[] = [
    ...out.map((step) => ({ ...step, sign: 1 as const })),
    ...home.toReversed().map((step) => ({ ...step, sign: -1 as const })),
  ];
  const isShort = load.demand === 'momentary' || load.demand === 'cranking';
  const ownA = isOn ? takenA : load.workingA;
  const runs: Run[] = [];
  const voltsOf: number[] = [];
  let [contactV, momentaryV, isKnown] = [0, 0, true];
  for (const { edge, from, sign } of steps) {
    const along = sign * (edge.a === from ? 1 : -1);
    const shortA = momentary.onEdge[edge.index] ?? 0;
    const solvedA = along * flow.currentOf(edge);
    const sharedA = load.demand === 'cranking' ? 0 : solvedA - Math.sign(solvedA) * Math.min(shortA, Math.abs(solvedA));
    const addsA = isOn ? (isShort ? Math.min(ownA, shortA) : 0) : ownA;
    const volts = (sharedA + addsA) * ohmOf(edge);
    if (edge.type !== 'run') {
      contactV += volts;
      continue;
    }
    runs.push(edge.run);
    voltsOf.push(volts);
    momentaryV += (solvedA + (isOn ? 0 : ownA)) * edge.ohm;
    isKnown &&= isOhmKnown(edge.run);
  }
  const volts = voltsOf.reduce((sum, each) => sum + each, 0);
  const dropClass =
    load.dropClass === 'critical' || runs.some((run) => run.dropClass === 'critical') ? 'critical' : 'general';
  return {
    load,
    mode: mode.mode,
    volts,
    totalV: volts + contactV,
    withMomentaryV: momentaryV,
    fraction: volts / load.nominalV,
    limit: limitOf(load, dropClass, basis),
    dropClass,
    path: runs,
    voltsOf,
    feed: out,
    back: home,
    isKnown,
  };
}

/** A momentary load's own path: the general limit, and what its own lowest voltage leaves if that is less. */
function limitOf(load: LoadDemand, dropClass: 'critical' | 'general', basis: FullBasis): number {
  if (load.demand === 'cranking') return CRANKING_LIMIT;
  if (load.demand !== 'momentary') return basis.dropLimits[dropClass];
  const { minV, nominalV } = load;
  if (minV === undefined || !(minV > 0 && minV < nominalV)) return basis.dropLimits.general;
  return Math.min(basis.dropLimits.general, (nominalV - minV) / nominalV);
}

function isOhmKnown(run: Run): boolean {
  return run.milliohm !== undefined || run.lengthM !== undefined;
}
