import { kindOf } from '#shared/kinds/index.ts';
import type { FullBasis } from '#shared/model/defaults.ts';
import type { Design, Device, End, EntityId, Run } from '#shared/model/design.ts';

import { otherEnd, type Network, type NetworkEdge, type RunEdge, type SourceEdge } from './network.ts';
import { amountOf, ratingsOf } from './ratings.ts';
import { Union } from './union.ts';

/**
 * What hangs together in a design, with every switch and selector as it can stand: nets of conductors, which of
 * them are fed and which lead back, the banks, and the voltage of each circuit.
 */
export interface Circuits {
  readonly network: Network;
  readonly runs: readonly RunEdge[];
  /** The net of a node: what metal, switches and protective devices can join. */
  netOf(node: number): Net;
  readonly nets: readonly Net[];
  readonly banks: readonly Bank[];
  bankOf(battery: EntityId): Bank | undefined;
  /** Signal and data runs are outside the ampacity and drop rules. */
  isSignal(run: Run): boolean;
  nominalVOf(node: number): number;
  /** Nets that sources join: what has no source in it is dead. */
  islandOf(net: Net): number;
}

/** `fed` from the positive of a source, `return` to its negative, `dead` where there is no source. */
export interface Net {
  readonly index: number;
  side: 'fed' | 'return' | 'dead';
  /** A battery's positive and its own negative, or a series link. */
  readonly positives: SourceEdge[];
  readonly negatives: SourceEdge[];
}

/** Batteries joined by runs with no switch or protection between. */
export interface Bank {
  readonly batteries: readonly Device[];
  readonly capacityAh: number;
  readonly nominalV: number;
  /** Strings add, units in series do not; null where one is not known or the chemistry has none. */
  readonly ccaA: number | null;
  /** Of the battery's maker; null where one is not told. */
  readonly shortCircuitA: number | null;
}

export function circuitsOf(network: Network, design: Design, _basis: FullBasis): Circuits {
  const count = network.nodes.length;
  const joined = new Union(count);
  const wired = new Union(count);
  for (const edge of network.edges) {
    if (isWire(edge)) wired.join(edge.a, edge.b);
    if (canConduct(edge)) joined.join(edge.a, edge.b);
  }

  const netByRoot = new Map<number, Net>();
  const nets: Net[] = [];
  const netOfNode = network.nodes.map((_, node) => {
    const root = joined.rootOf(node);
    let net = netByRoot.get(root);
    if (!net) {
      net = { index: nets.length, side: 'dead', positives: [], negatives: [] };
      netByRoot.set(root, net);
      nets.push(net);
    }
    return net;
  });
  const sources = network.edges.filter((edge) => edge.type === 'source');
  for (const edge of sources) {
    netOfNode[edge.a]!.positives.push(edge);
    netOfNode[edge.b]!.negatives.push(edge);
  }
  for (const net of nets) {
    if (net.positives.length > 0) net.side = 'fed';
    else if (net.negatives.length > 0) net.side = 'return';
  }

  const islands = new Union(nets.length);
  for (const edge of sources) islands.join(netOfNode[edge.a]!.index, netOfNode[edge.b]!.index);
  const voltages = nominalVoltages(nets, sources, (node) => netOfNode[node]!.index, islands);
  const banks = banksOf(sources, wired);
  const bankByBattery = new Map(banks.flatMap((bank) => bank.batteries.map((battery) => [battery.id, bank] as const)));
  const signals = new Map<string, ReadonlySet<string>>();
  // Where runs go on from a signal terminal it is a joint, and what it joins may carry anything.
  const landings = new Map<string, number>();
  for (const edge of network.edges) {
    if (edge.type !== 'run') continue;
    for (const end of [edge.run.from, edge.run.to]) landings.set(endKey(end), (landings.get(endKey(end)) ?? 0) + 1);
  }

  return {
    network,
    runs: network.edges.filter((edge) => edge.type === 'run'),
    netOf: (node) => netOfNode[node]!,
    nets,
    banks,
    bankOf: (battery) => bankByBattery.get(battery),
    isSignal: (run) =>
      [run.from, run.to].some(
        (end) => signalTerminals(design, end.device, signals).has(end.terminal) && landings.get(endKey(end)) === 1,
      ),
    nominalVOf: (node) => voltages[netOfNode[node]!.index]!,
    islandOf: (net) => islands.rootOf(net.index),
  };
}

function endKey({ device, terminal }: End): string {
  return `${device} ${terminal}`;
}

/** A conductor, with nothing in it that opens. */
export function isWire(edge: NetworkEdge): boolean {
  return edge.type === 'run' || edge.type === 'mount';
}

export function canConduct(edge: NetworkEdge): boolean {
  return isWire(edge) || (edge.type === 'contact' && edge.element.closable);
}

/** Every edge from a node, with the node it leads to. */
export function neighbours(network: Network, node: number): { edge: NetworkEdge; to: number }[] {
  return network.edgesAt(node).map((edge) => ({ edge, to: otherEnd(edge, node) }));
}

function signalTerminals(
  design: Design,
  deviceId: string,
  known: Map<string, ReadonlySet<string>>,
): ReadonlySet<string> {
  const before = known.get(deviceId);
  if (before) return before;
  const device = design.devices[deviceId];
  const terminals = (device && kindOf(device)?.terminals(device)) ?? [];
  const names = new Set(
    terminals.filter(({ role }) => role === 'signal' || role === 'data').map((terminal) => terminal.name),
  );
  known.set(deviceId, names);
  return names;
}

/** Of each net: the height of its island's batteries stacked as they are joined. */
function nominalVoltages(
  nets: readonly Net[],
  sources: readonly SourceEdge[],
  netOf: (node: number) => number,
  islands: Union,
): number[] {
  const heights: (number | undefined)[] = nets.map(() => undefined);
  const edgesByNet: { to: number; volts: number }[][] = nets.map(() => []);
  for (const source of sources) {
    const volts = nominalVOfSource(source);
    edgesByNet[netOf(source.b)]!.push({ to: netOf(source.a), volts });
    edgesByNet[netOf(source.a)]!.push({ to: netOf(source.b), volts: -volts });
  }
  const least = new Map<number, number>();
  const greatest = new Map<number, number>();
  for (const net of nets) {
    if (heights[net.index] !== undefined) continue;
    heights[net.index] = 0;
    const queue = [net.index];
    for (const at of queue) {
      const island = islands.rootOf(at);
      const height = heights[at]!;
      least.set(island, Math.min(least.get(island) ?? 0, height));
      greatest.set(island, Math.max(greatest.get(island) ?? 0, height));
      for (const { to, volts } of edgesByNet[at]!) {
        if (heights[to] !== undefined) continue;
        heights[to] = height + volts;
        queue.push(to);
      }
    }
  }
  return nets.map((net) => {
    const island = islands.rootOf(net.index);
    const span = greatest.get(island)! - least.get(island)!;
    if (net.side !== 'fed') return span;
    return heights[net.index]! - least.get(island)! || span;
  });
}

/** An alternator's regulated 14.4 V belongs to a 12 V system. */
function nominalVOfSource({ element }: SourceEdge): number {
  return element.type === 'battery' ? element.nominalV : Math.round(element.regulatedV / 1.2);
}

function banksOf(sources: readonly SourceEdge[], wired: Union): Bank[] {
  const batteries = sources.filter((edge) => edge.element.type === 'battery');
  const together = new Union(batteries.length);
  const positiveAt = new Map<number, number>();
  batteries.forEach((battery, index) => {
    const place = wired.rootOf(battery.a);
    const before = positiveAt.get(place);
    if (before === undefined) positiveAt.set(place, index);
    else together.join(before, index);
  });
  batteries.forEach((battery, index) => {
    const below = positiveAt.get(wired.rootOf(battery.b));
    if (below !== undefined && below !== index) together.join(below, index);
  });

  const members = new Map<number, SourceEdge[]>();
  batteries.forEach((battery, index) => {
    const root = together.rootOf(index);
    members.set(root, [...(members.get(root) ?? []), battery]);
  });
  return [...members.values()].map((bank) => bankOf(bank, wired));
}

function bankOf(batteries: readonly SourceEdge[], wired: Union): Bank {
  const lowerEnds = new Set(batteries.map((battery) => wired.rootOf(battery.b)));
  const tops = batteries.filter((battery) => !lowerEnds.has(wired.rootOf(battery.a)));
  const strings = tops.length > 0 ? tops : batteries;
  const amounts = (name: string) => strings.map(({ device }) => amountOf(ratingsOf(device), name));
  const rungs = batteries.length / strings.length;
  const first = strings[0]!.device;
  return {
    batteries: batteries.map((battery) => battery.device),
    capacityAh: sumOf(amounts('capacityAh')) ?? 0,
    nominalV: (amountOf(ratingsOf(first), 'nominalV') ?? 0) * rungs,
    ccaA: strings.some(({ device }) => ratingsOf(device).chemistry === 'lifepo4') ? null : sumOf(amounts('ccaA')),
    shortCircuitA: sumOf(amounts('shortCircuitA')),
  };
}

function sumOf(amounts: readonly (number | undefined)[]): number | null {
  return amounts.reduce<number | null>((sum, each) => (sum === null || each === undefined ? null : sum + each), 0);
}
