import type { ModeAnalysis } from '#shared/model/analysis.ts';

import type { Circuits } from './circuits.ts';
import { otherEnd, type LoadEdge, type Network, type NetworkEdge } from './network.ts';

/**
 * Whose current flows where, in a solved mode. The current that meets at a node is taken to leave it mixed: each
 * way towards the sources carries of every load behind it the share that it carries of the whole. In a tree that
 * is exact; between sources in parallel, and round a ring, it is what each carries.
 */
export interface Flow {
  /** From `a` to `b`, A. */
  currentOf(edge: NetworkEdge): number;
  /** For each edge, by index: what the loads behind it come to, each taken at `amountOf`, added or the greatest. */
  spread(amountOf: (load: LoadEdge) => number, combine?: 'sum' | 'max'): Float64Array;
  /** The same for each node: what the loads come to that are fed from it. */
  gather(amountOf: (load: LoadEdge) => number, combine?: 'sum' | 'max'): Float64Array;
}

const LEAST_A = 1e-9;

export function flowOf(network: Network, solved: ModeAnalysis, circuits: Circuits): Flow {
  const currents = edgeCurrents(network, solved);
  const order = loadsFirst(network, currents, circuits);
  return {
    currentOf: (edge) => currents[edge.index]!,
    spread: (amountOf, combine = 'sum') => spread(network, circuits, currents, order, amountOf, combine).onEdge,
    gather: (amountOf, combine = 'sum') => spread(network, circuits, currents, order, amountOf, combine).atNode,
  };
}

function edgeCurrents(network: Network, solved: ModeAnalysis): Float64Array {
  const currents = new Float64Array(network.edges.length);
  const intoTerminal = (device: string, terminal: string) => solved.devices[device]?.terminals[terminal]?.currentA ?? 0;
  for (const edge of network.edges) {
    if (edge.type === 'run') currents[edge.index] = solved.runs[edge.run.id]?.currentA ?? 0;
    else if (edge.type === 'contact') currents[edge.index] = intoTerminal(edge.device.id, edge.element.a);
    else if (edge.type !== 'mount') currents[edge.index] = intoTerminal(edge.device.id, edge.element.pos);
  }
  // What flows into a mounted terminal and does not come by a run comes from the stud.
  for (const edge of network.edges) {
    if (edge.type !== 'mount') continue;
    const byRuns = network.edgesAt(edge.a).reduce((sum, each) => {
      if (each.type !== 'run') return sum;
      return sum + (each.b === edge.a ? currents[each.index]! : -currents[each.index]!);
    }, 0);
    currents[edge.index] = -(intoTerminal(edge.device.id, edge.terminal) - byRuns);
  }
  return currents;
}

/** +1 where the edge leads from this node towards a source, -1 from it towards loads, 0 where nothing flows. */
function wayUp(edge: NetworkEdge, node: number, current: number, circuits: Circuits): -1 | 0 | 1 {
  if (edge.type === 'load' || edge.type === 'source' || edge.a === edge.b || Math.abs(current) < LEAST_A) return 0;
  const flowsIn = (edge.b === node) === current > 0;
  const isReturn = circuits.netOf(node).side === 'return';
  return flowsIn !== isReturn ? 1 : -1;
}

/** Nodes in an order in which all that a node feeds comes before it. A ring left over by rounding comes last. */
function loadsFirst(network: Network, currents: Float64Array, circuits: Circuits): number[] {
  const waiting = network.nodes.map(
    ({ index }) =>
      network.edgesAt(index).filter((edge) => wayUp(edge, index, currents[edge.index]!, circuits) === -1).length +
      seriesBelow(network, index, currents, circuits).length,
  );
  const order = network.nodes.filter(({ index }) => waiting[index] === 0).map(({ index }) => index);
  const isIn = network.nodes.map(({ index }) => waiting[index] === 0);
  const release = (node: number) => {
    waiting[node]! -= 1;
    if (waiting[node] !== 0 || isIn[node]) return;
    isIn[node] = true;
    order.push(node);
  };
  for (const node of order) {
    for (const edge of network.edgesAt(node)) {
      if (wayUp(edge, node, currents[edge.index]!, circuits) === 1) release(otherEnd(edge, node));
    }
    for (const battery of givingAt(network, node, currents)) {
      if (circuits.netOf(battery.b).side === 'fed') release(battery.b);
    }
  }
  return [...order, ...network.nodes.map(({ index }) => index).filter((index) => !isIn[index])];
}

/** Sources that give current into this node. */
function givingAt(network: Network, node: number, currents: Float64Array) {
  return network
    .edgesAt(node)
    .filter((edge) => edge.type === 'source' && edge.a === node && currents[edge.index]! < -LEAST_A);
}

/** Batteries whose negative is this node of a fed net: the next rung of a string stands on it. */
function seriesBelow(network: Network, node: number, currents: Float64Array, circuits: Circuits) {
  if (circuits.netOf(node).side !== 'fed') return [];
  return network
    .edgesAt(node)
    .filter((edge) => edge.type === 'source' && edge.b === node && currents[edge.index]! < -LEAST_A);
}

function spread(
  network: Network,
  circuits: Circuits,
  currents: Float64Array,
  order: readonly number[],
  amountOf: (load: LoadEdge) => number,
  combine: 'sum' | 'max',
): { onEdge: Float64Array; atNode: Float64Array } {
  const add = combine === 'sum' ? (a: number, b: number) => a + b : Math.max;
  const atNode = new Float64Array(network.nodes.length);
  for (const edge of network.edges) {
    if (edge.type !== 'load') continue;
    const amount = amountOf(edge);
    for (const node of new Set([edge.a, edge.b])) atNode[node] = add(atNode[node]!, amount);
  }
  const onEdge = new Float64Array(network.edges.length);
  for (const node of order) {
    const ways = network.edgesAt(node).filter((edge) => wayUp(edge, node, currents[edge.index]!, circuits) === 1);
    const isFed = circuits.netOf(node).side !== 'return';
    const giving = isFed ? givingAt(network, node, currents) : [];
    const total = [...ways, ...giving].reduce((sum, edge) => sum + Math.abs(currents[edge.index]!), 0);
    if (total < LEAST_A) continue;
    for (const edge of ways) {
      const share = (atNode[node]! * Math.abs(currents[edge.index]!)) / total;
      onEdge[edge.index] = share;
      const to = otherEnd(edge, node);
      atNode[to] = add(atNode[to]!, share);
    }
    for (const battery of giving) {
      if (circuits.netOf(battery.b).side !== 'fed') continue;
      const share = (atNode[node]! * Math.abs(currents[battery.index]!)) / total;
      atNode[battery.b] = add(atNode[battery.b]!, share);
    }
  }
  return { onEdge, atNode };
}
