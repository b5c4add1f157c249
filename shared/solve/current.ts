import { conductorOf, type FullBasis } from '#shared/model/defaults.ts';
import type { Design, EntityId } from '#shared/model/design.ts';
import { squareMmOf } from '#shared/tables/copper.ts';

import type { Circuits } from './circuits.ts';
import { runOhmAt, warmestC, type Ampacity } from './conductor.ts';
import type { LoadDemand } from './demand.ts';
import type { Flow } from './flow.ts';
import type { NetworkEdge, RunEdge, SourceEdge } from './network.ts';
import { otherWays, type OtherWay } from './other-ways.ts';
import { amountOf, ratingsOf } from './ratings.ts';

/** What a run must be fit to carry, and in which mode that is. */
export interface DesignCurrent {
  readonly designCurrentA: number;
  readonly governingMode: EntityId | null;
}

/** What flows through a contact, by the same reckoning but for the momentary loads, which stand apart. */
export interface ContactCurrent {
  readonly lastingA: number;
  readonly momentaryA: number;
}

export interface SolvedFlow {
  readonly mode: EntityId;
  readonly flow: Flow;
}

/** What the conductors must be able to feed although the built-in mode, taken literally, leaves it off. */
export interface LeftOut {
  readonly load: LoadDemand;
  /** From the nearest source to the load and back. */
  readonly edges: readonly NetworkEdge[];
}

/** Of the sum of the intermittent loads, where the largest of them is not more (E-11 load worksheet, from memory). */
const SHARE_OF_INTERMITTENT = 0.1;
const JOULE_PER_KELVIN_CM3 = 3.45;

/**
 * The worst over the design's modes, taken literally, and over the built-in ones with demand: all continuous loads
 * and the greater of the largest and a tenth of the intermittent ones; momentary ones by the heat they make.
 * A way that carries nothing as the boat is left carries what a switch can lead over it. A starter is never counted: its path is exempt and its drop judged. Never less than what a source can give.
 */
export function designCurrents(
  design: Design,
  basis: FullBasis,
  circuits: Circuits,
  loads: readonly LoadDemand[],
  leftOut: readonly LeftOut[],
  allOn: Flow,
  charging: Flow,
  own: readonly SolvedFlow[],
  ampacities: ReadonlyMap<EntityId, Ampacity>,
): {
  runs: Map<EntityId, DesignCurrent>;
  contactAt(edge: NetworkEdge): ContactCurrent;
  /** What the loads behind an edge ask for when all that lasts is on. */
  demandOn(edge: NetworkEdge): number;
} {
  const worst = new Map<EntityId, DesignCurrent>();
  const consider = (run: EntityId, amperes: number, mode: EntityId) => {
    const before = worst.get(run);
    if (before && before.designCurrentA >= amperes) return;
    worst.set(run, { designCurrentA: amperes, governingMode: mode });
  };
  const byEdge = new Map(loads.map((load) => [load.edge.index, load]));
  const heating = (edge: RunEdge, amperes: number, minutes: number) =>
    amperes * heatingShare(edge, minutes, ampacities.get(edge.run.id), basis, design);

  const demanded = demandOn(byEdge, leftOut, allOn, otherWays(circuits, loads, leftOut, allOn));
  for (const edge of circuits.runs) {
    worst.set(edge.run.id, { designCurrentA: 0, governingMode: null });
    const momentary = demanded.momentary.reduce((sum, { minutes, onEdge }) => {
      return sum + heating(edge, onEdge[edge.index]!, minutes);
    }, 0);
    consider(edge.run.id, lastingOn(demanded, edge) + momentary, 'all-on');
    consider(edge.run.id, Math.abs(charging.currentOf(edge)), 'all-charging');
  }
  const literal = own.map(({ mode, flow }) => ({ mode, ...takenLiterally(byEdge, flow) }));
  for (const { mode, lastingAt, momentary } of literal) {
    for (const edge of circuits.runs) {
      const short = momentary.reduce((sum, each) => sum + heating(edge, each.onEdge[edge.index]!, each.minutes), 0);
      consider(edge.run.id, lastingAt(edge) + short, mode);
    }
  }
  return {
    runs: worst,
    demandOn: (edge) => lastingOn(demanded, edge),
    contactAt(edge) {
      const lasting = literal.map(({ lastingAt }) => lastingAt(edge));
      const short = [demanded, ...literal].map(({ momentary }) => sumAt(momentary, edge));
      return {
        lastingA: Math.max(lastingOn(demanded, edge), Math.abs(charging.currentOf(edge)), ...lasting),
        momentaryA: Math.max(...short),
      };
    },
  };
}

function lastingOn(demanded: Demanded, { index }: NetworkEdge): number {
  const tenth = SHARE_OF_INTERMITTENT * demanded.intermittent[index]!;
  return demanded.continuous[index]! + Math.max(demanded.largest[index]!, tenth);
}

function sumAt(momentary: Demanded['momentary'], { index }: NetworkEdge): number {
  return momentary.reduce((sum, { onEdge }) => sum + onEdge[index]!, 0);
}

interface Demanded {
  readonly continuous: Float64Array;
  readonly intermittent: Float64Array;
  readonly largest: Float64Array;
  readonly momentary: readonly { readonly minutes: number; readonly onEdge: Float64Array }[];
}

function demandOn(
  byEdge: ReadonlyMap<number, LoadDemand>,
  leftOut: readonly LeftOut[],
  allOn: Flow,
  ways: readonly OtherWay[],
): Demanded {
  const held = (demand: LoadDemand['demand']) => (edge: { readonly index: number }) => {
    const load = byEdge.get(edge.index);
    return load?.demand === demand ? load.heldA : 0;
  };
  const minutes = new Set([...byEdge.values()].filter(isMomentary).map((load) => load.onMinutes));
  const demanded: Demanded = {
    continuous: allOn.spread(held('continuous')),
    intermittent: allOn.spread(held('intermittent')),
    largest: allOn.spread(held('intermittent'), 'max'),
    momentary: [...minutes].map((each) => ({
      minutes: each,
      onEdge: allOn.spread((edge) => {
        const load = byEdge.get(edge.index);
        return load && isMomentary(load) && load.onMinutes === each ? load.heldA : 0;
      }),
    })),
  };
  for (const { load, edges } of leftOut) {
    for (const { index } of edges) {
      if (load.demand === 'continuous') demanded.continuous[index]! += load.heldA;
      if (load.demand === 'intermittent') {
        demanded.intermittent[index]! += load.heldA;
        demanded.largest[index] = Math.max(demanded.largest[index]!, load.heldA);
      }
      const momentary = demanded.momentary.find((each) => each.minutes === load.onMinutes);
      if (isMomentary(load) && momentary) momentary.onEdge[index]! += load.heldA;
    }
  }
  const continuousA = (load: LoadDemand) => (load.demand === 'continuous' ? load.heldA : 0);
  const intermittentA = (load: LoadDemand) => (load.demand === 'intermittent' ? load.heldA : 0);
  const momentaryA = demanded.momentary.map(({ minutes: each, onEdge }) => ({
    onEdge,
    of: (load: LoadDemand) => (isMomentary(load) && load.onMinutes === each ? load.heldA : 0),
  }));
  for (const { edges, behind } of ways) {
    const raise = (onEdge: Float64Array, amount: number) => {
      for (const { index } of edges) onEdge[index] = Math.max(onEdge[index]!, amount);
    };
    raise(demanded.continuous, behind(continuousA));
    raise(demanded.intermittent, behind(intermittentA));
    raise(demanded.largest, behind(intermittentA, 'max'));
    for (const { onEdge, of } of momentaryA) raise(onEdge, behind(of));
  }
  return demanded;
}

function isMomentary(load: LoadDemand): boolean {
  return load.demand === 'momentary';
}

/** As solved, but with constant power at its low cut-out, momentary loads by their heat and no starter. */
function takenLiterally(
  byEdge: ReadonlyMap<number, LoadDemand>,
  flow: Flow,
): { lastingAt(edge: NetworkEdge): number; momentary: Demanded['momentary'] } {
  const takenBy = (edge: NetworkEdge) => Math.max(0, flow.currentOf(edge));
  const extra = flow.spread((edge) => {
    const load = byEdge.get(edge.index);
    const taken = takenBy(edge);
    if (!load || taken === 0) return 0;
    if (load.demand === 'momentary' || load.demand === 'cranking') return -taken;
    return edge.element.model === 'power' ? load.heldA * edge.element.fraction - taken : 0;
  });
  const minutes = new Set([...byEdge.values()].filter(isMomentary).map((load) => load.onMinutes));
  return {
    lastingAt: (edge) => Math.max(0, Math.abs(flow.currentOf(edge)) + extra[edge.index]!),
    momentary: [...minutes].map((each) => ({
      minutes: each,
      onEdge: flow.spread((edge) => {
        const load = byEdge.get(edge.index);
        return load && isMomentary(load) && load.onMinutes === each ? takenBy(edge) : 0;
      }),
    })),
  };
}

/**
 * The share of its current that a short load counts with: a conductor that takes it for `minutes` is warmed as by
 * I √(1 − e^(−t/τ)) for good, τ = ΔT · 3.45 · S / (Iz² · R). Only the copper's own heat is counted, so it is safe.
 */
function heatingShare(
  edge: RunEdge,
  minutes: number,
  ampacity: Ampacity | undefined,
  basis: FullBasis,
  design: Design,
): number {
  const { size, insulationC, parallel } = conductorOf(edge.run);
  const carriedA = (ampacity?.allowedA ?? 0) / parallel;
  const risesK = insulationC - warmestC(edge.run, basis, design.zones ?? {});
  const ohmPerMetre = runOhmAt({ ...edge.run, milliohm: undefined, lengthM: 1 }, insulationC)! * parallel;
  const seconds = (risesK * JOULE_PER_KELVIN_CM3 * squareMmOf(size)) / (carriedA ** 2 * ohmPerMetre);
  if (!(seconds > 0) || !Number.isFinite(seconds)) return 1;
  return Math.sqrt(1 - Math.exp((-minutes * 60) / seconds));
}

/** Sources that may run together add, on the way from each to the nearest battery and back. */
export function considerSources(
  circuits: Circuits,
  charging: Flow,
  wayOf: (source: SourceEdge) => readonly NetworkEdge[],
  currents: Map<EntityId, DesignCurrent>,
): void {
  const together = new Map<EntityId, number>();
  for (const source of circuits.network.edges) {
    if (source.type !== 'source' || source.element.type !== 'charging') continue;
    const maxA = amountOf(ratingsOf(source.device), 'maxA') ?? 0;
    const givenA = -charging.currentOf(source);
    for (const edge of wayOf(source)) {
      if (edge.type !== 'run') continue;
      // Of two ways side by side each carries its part; where nothing was solved the whole counts.
      const carriedA = Math.abs(charging.currentOf(edge));
      const share = givenA > 0 && carriedA > 0 ? Math.min(1, carriedA / givenA) : 1;
      together.set(edge.run.id, (together.get(edge.run.id) ?? 0) + maxA * share);
    }
  }
  for (const [run, amperes] of together) {
    const before = currents.get(run);
    if (before && before.designCurrentA < amperes) {
      currents.set(run, { designCurrentA: amperes, governingMode: 'all-charging' });
    }
  }
}
