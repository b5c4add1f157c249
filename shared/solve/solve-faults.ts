import type { BatteryElement } from '#shared/kinds/element.ts';
import type { FaultAnalysis } from '#shared/model/analysis.ts';
import { conductorOf } from '#shared/model/defaults.ts';
import type { Design, Device, EntityId, Run } from '#shared/model/design.ts';
import { isMetric } from '#shared/model/size.ts';
import { COPPER_OHM_SQUARE_MM_PER_METRE_AT_20_C, squareMmOf } from '#shared/tables/copper.ts';

import { batteryBehind, resistanceFrom, type BatteryCase } from './battery.ts';
import { prepareCircuit, solveCircuit, type Circuit, type StiffBranch } from './circuit.ts';
import { runOhmAt } from './conductor.ts';
import { factorise, probe, type Factor } from './laplacian.ts';
import { networkOf, walkFrom, type ContactEdge, type Network, type NetworkEdge } from './network.ts';
import { amountOf } from './ratings.ts';

/**
 * What every fuse and breaker must break, and what must still open it. Greatest: copper at 20 °C, batteries full
 * and of least resistance, a bolted short just on either side of the device. Least: copper as hot as its insulation
 * allows, batteries old and nearly empty, the short at the far end of what the device protects. Every switch and
 * selector is closed, as it may be at the worst moment. In the greatest fault a protective device counts with the
 * resistance somebody entered or with none: a guess may not stand between a battery and what has to break its current.
 */
export function solveFaults(design: Design, network = networkOf(design, 'all-on')): Record<EntityId, FaultAnalysis> {
  const greatest = stageOf(network, 'greatest');
  const least = stageOf(network, 'least');
  const bases = basesOf(network, greatest);
  const faults: Record<EntityId, FaultAnalysis> = {};
  for (const edge of network.edges) {
    if (!isProtective(edge)) continue;
    const strong = strongestAt(greatest, edge);
    const weakA = weakestBeyond(network, least, edge, strong.fedSides);
    const before = faults[edge.device.id];
    faults[edge.device.id] = {
      greatestA: Math.max(strong.throughA, before?.greatestA ?? 0),
      nodeA: Math.max(strong.nodeA, before?.nodeA ?? 0),
      leastA: before ? Math.min(weakA, before.leastA) : weakA,
      basis: bases.get(greatest?.circuit.partOf(edge.a) ?? -1) ?? 'No battery reaches it.',
    };
  }
  return faults;
}

/** Ideal sources and devices without resistance would divide by nothing: what is left of them, Ω. */
const LEAST_SOURCE_OHM = 1e-6;
const LEAST_DEVICE_OHM = 1e-9;

interface Stage {
  readonly circuit: Circuit;
  readonly factor: Factor;
  /** Without a fault: by node, and by edge of the network. */
  readonly potentials: Float64Array;
  readonly stiffAt: Int32Array;
  readonly stiffA: Float64Array;
  /** Poles of batteries, the places a short returns to; by part of the network. */
  readonly poles: ReadonlyMap<number, readonly number[]>;
}

function stageOf(network: Network, batteryCase: BatteryCase): Stage | null {
  const stiff: StiffBranch[] = [];
  const stiffAt = new Int32Array(network.edges.length).fill(-1);
  for (const edge of network.edges) {
    const behind = branchOf(edge, batteryCase);
    if (!behind || !(behind.ohm >= 0 && Number.isFinite(behind.ohm) && Number.isFinite(behind.emfV))) continue;
    stiffAt[edge.index] = stiff.push({ a: edge.a, b: edge.b, ...behind }) - 1;
  }
  const circuit = prepareCircuit(network.nodes.length, stiff, []);
  const solution = solveCircuit(circuit, [], []);
  const factor = factorise(
    circuit.pattern,
    circuit.resistive.map((index) => 1 / stiff[index]!.ohm),
  );
  if (!solution || !factor) return null;
  const poles = new Map<number, number[]>();
  for (const edge of network.edges) {
    if (edge.type !== 'source' || edge.element.type !== 'battery') continue;
    for (const node of [edge.b, edge.a]) {
      const known = poles.get(circuit.partOf(node)) ?? [];
      poles.set(circuit.partOf(node), known);
      const isNew = !known.some((pole) => circuit.groups[pole] === circuit.groups[node]);
      if (isNew && known.length < MOST_POLES) known.push(node);
    }
  }
  return { circuit, factor, potentials: solution.potentials, stiffAt, stiffA: solution.stiffA, poles };
}

/** More batteries than this on one network are taken by the first of them. */
const MOST_POLES = 16;

function branchOf(edge: NetworkEdge, batteryCase: BatteryCase): { ohm: number; emfV: number } | undefined {
  if (edge.type === 'mount') return { ohm: 0, emfV: 0 };
  if (edge.type === 'run') {
    const ohm = batteryCase === 'greatest' ? coldOhm(edge.run) : runOhmAt(edge.run, conductorOf(edge.run).insulationC);
    return { ohm: ohm ?? 0, emfV: 0 };
  }
  if (edge.type === 'contact') {
    if (!edge.element.closable) return undefined;
    const { element, device } = edge;
    if (!element.protective) return { ohm: element.ohm, emfV: 0 };
    const isGuessed = batteryCase === 'greatest' && !isOhmTold(device);
    return { ohm: Math.max(isGuessed ? 0 : element.ohm, LEAST_DEVICE_OHM), emfV: 0 };
  }
  if (edge.type !== 'source' || edge.element.type !== 'battery') return undefined;
  const { ohm, emfV } = batteryBehind(edge.element, batteryCase);
  return { ohm: Math.max(ohm, LEAST_SOURCE_OHM), emfV };
}

/** The least resistance a run can have: solid copper at 20 °C for an AWG size, the class of an mm² size. */
function coldOhm(run: Run): number | null {
  const { size, parallel } = conductorOf(run);
  const isKnown = run.milliohm !== undefined || isMetric(size);
  if (isKnown || run.lengthM === undefined) return runOhmAt(run, 20);
  const solid = (COPPER_OHM_SQUARE_MM_PER_METRE_AT_20_C * run.lengthM) / squareMmOf(size) / parallel;
  return Number.isFinite(solid) && solid >= 0 ? solid : null;
}

function isProtective(edge: NetworkEdge): edge is ContactEdge {
  return edge.type === 'contact' && edge.element.protective;
}

function isOhmTold(device: Device): boolean {
  // What the kind fills in is a guess too.
  return amountOf(device.ratings, 'coldMilliohm') !== undefined;
}

interface Short {
  readonly totalA: number;
  readonly throughA: number;
}

/** A bolted short between two nodes: what flows into it, and how much of that through an edge. */
function short(stage: Stage, edge: ContactEdge, at: number, to: number): Short {
  const { circuit, factor, potentials, stiffAt, stiffA } = stage;
  const [s, t, a, b] = [at, to, edge.a, edge.b].map((node) => circuit.groups[node]!) as [
    number,
    number,
    number,
    number,
  ];
  if (s === t || circuit.partOf(at) !== circuit.partOf(to)) return { totalA: 0, throughA: 0 };
  const fed = [
    [s, 1],
    [t, -1],
  ] as const;
  const [vs, vt, va, vb] = probe(factor, fed, [s, t, a, b]) as [number, number, number, number];
  const totalA = (potentials[at]! - potentials[to]!) / (vs - vt);
  const index = stiffAt[edge.index]!;
  const throughA = stiffA[index]! - (totalA * (va - vb)) / circuit.stiff[index]!.ohm;
  const isFinite = Number.isFinite(totalA) && Number.isFinite(throughA);
  return isFinite ? { totalA: Math.abs(totalA), throughA: Math.abs(throughA) } : { totalA: 0, throughA: 0 };
}

/** A share of a fault below this is the rounding of none. */
const NO_SHARE = 1e-6;

function strongestAt(stage: Stage | null, edge: ContactEdge) {
  const strongest = { throughA: 0, nodeA: 0, fedSides: [] as number[] };
  if (!stage || stage.stiffAt[edge.index] === -1) return strongest;
  for (const side of new Set([edge.a, edge.b])) {
    let sideA = 0;
    for (const pole of stage.poles.get(stage.circuit.partOf(side)) ?? []) {
      const { totalA, throughA } = short(stage, edge, side, pole);
      strongest.nodeA = Math.max(strongest.nodeA, totalA);
      if (throughA > NO_SHARE * totalA) sideA = Math.max(sideA, throughA);
    }
    strongest.throughA = Math.max(strongest.throughA, sideA);
    if (sideA > 0) strongest.fedSides.push(side);
  }
  return strongest;
}

/** The least current through a device for a short anywhere beyond it, up to the next device: its loads, and its conductors' ends. */
function weakestBeyond(network: Network, stage: Stage | null, edge: ContactEdge, fedSides: readonly number[]): number {
  let weakestA = Number.POSITIVE_INFINITY;
  if (!stage || stage.stiffAt[edge.index] === -1) return 0;
  const consider = (at: number, to: number) => {
    const { totalA, throughA } = short(stage, edge, at, to);
    if (throughA > NO_SHARE * totalA && throughA > 0) weakestA = Math.min(weakestA, throughA);
  };
  for (const side of fedSides) {
    const back = returnOf(stage, edge, side);
    if (back === undefined) continue;
    consider(side, back);
    const seen = new Set([side]);
    const steps = walkFrom(
      network,
      side,
      ({ edge: way }) => way.type !== 'source' && way.type !== 'load' && !isProtective(way),
    );
    for (const { edge: way, to } of steps) {
      if (way.type === 'load') consider(way.a, way.b);
      if (way.type === 'source' || way.type === 'load' || isProtective(way) || seen.has(to)) continue;
      seen.add(to);
      consider(to, back);
      if (seen.size > MOST_PLACES) break;
    }
  }
  return Number.isFinite(weakestA) ? weakestA : 0;
}

/** A circuit with more places than this is judged by the nearest of them. */
const MOST_PLACES = 2000;

/** The pole of a battery that a short there drives the most current through the device to. */
function returnOf(stage: Stage, edge: ContactEdge, side: number): number | undefined {
  const poles = stage.poles.get(stage.circuit.partOf(side)) ?? [];
  const found = poles.map((pole) => ({ pole, amps: short(stage, edge, side, pole).throughA }));
  return found.toSorted((p, q) => q.amps - p.amps)[0]?.pole;
}

const FROM: Readonly<Record<ReturnType<typeof resistanceFrom>, string>> = {
  maker: "by its maker's short-circuit current",
  entered: 'by its internal resistance',
  usual: 'by the usual resistance of its chemistry (from memory)',
};

/** What the figures rest on, in a sentence for each part of the network. */
function basesOf(network: Network, stage: Stage | null): ReadonlyMap<number, string> {
  const batteries = new Map<number, string[]>();
  for (const edge of stage ? network.edges : []) {
    if (edge.type !== 'source' || edge.element.type !== 'battery') continue;
    const part = stage!.circuit.partOf(edge.a);
    const names = batteries.get(part) ?? [];
    batteries.set(part, names);
    names.push(nameOf(edge.device, edge.element));
  }
  const say = (names: readonly string[]) =>
    `Batteries full (${names.join('; ')}), copper at 20 °C, every switch closed; charging sources, which limit themselves, are not counted.`;
  return new Map([...batteries].map(([part, names]) => [part, say(names)]));
}

function nameOf(device: Device, element: BatteryElement): string {
  return `${device.mark ?? device.name ?? device.id} ${FROM[resistanceFrom(element)]}`;
}
