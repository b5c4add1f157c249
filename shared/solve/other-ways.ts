import { canConduct, type Circuits } from './circuits.ts';
import type { LeftOut } from './current.ts';
import type { LoadDemand } from './demand.ts';
import type { Flow } from './flow.ts';
import { otherEnd, type NetworkEdge } from './network.ts';

/** Edges that carry nothing as the boat is left, and what loads come to that a switch can lead over them. */
export interface OtherWay {
  readonly edges: readonly NetworkEdge[];
  /** What of a load, taken at `amountOf`, stands behind the way; or the greatest of them. */
  behind(amountOf: (load: LoadDemand) => number, combine?: 'sum' | 'max'): number;
}

/** What the loads behind each node come to, by index. */
type AtNodes = (amountOf: (load: LoadDemand) => number, combine: 'sum' | 'max') => Float64Array;

const LEAST_A = 1e-9;

/**
 * A load that is fed one way has to be carried in full by every other way that a switch, push button or selector can
 * open to it. What carries nothing in all-on falls into parts between the nodes that do carry something; a part with
 * an open contact in it leads from each of them that a source reaches to the others, or from a battery in it that
 * is not on. All behind the far end then flows through it.
 */
export function otherWays(
  circuits: Circuits,
  loads: readonly LoadDemand[],
  leftOut: readonly LeftOut[],
  allOn: Flow,
): OtherWay[] {
  const { network } = circuits;
  const isUsed = usedEdges(circuits, leftOut, allOn);
  const isLive = network.nodes.map(({ index }) => network.edgesAt(index).some((edge) => isUsed[edge.index]));
  const atNodes = atNodesOf(loads, leftOut, allOn);
  return idleParts(circuits, isUsed, isLive).flatMap((part) => {
    if (!part.some((edge) => edge.type === 'contact' && !edge.element.closed)) return [];
    const ends = [...new Set(part.flatMap(({ a, b }) => [a, b]))].filter((node) => isLive[node]);
    if (part.some((edge) => edge.type === 'source')) {
      // Out of its positive to the loads, and from their returns into its negative.
      const fed = ends.filter((node) => circuits.netOf(node).side === 'fed');
      return fed.length === 0 ? [] : [wayTo(between(part, ends), fed, atNodes)];
    }
    return ends.flatMap((end) =>
      ends
        .filter((other) => other !== end && isSupplied(circuits, other, end))
        .map((other) => wayTo(between(part, [end, other]), [end], atNodes)),
    );
  });
}

function usedEdges(circuits: Circuits, leftOut: readonly LeftOut[], allOn: Flow): boolean[] {
  const used = circuits.network.edges.map((edge) => Math.abs(allOn.currentOf(edge)) > LEAST_A);
  for (const { edges } of leftOut) for (const { index } of edges) used[index] = true;
  return used;
}

/** Found once for each kind of load that is asked for. */
function atNodesOf(loads: readonly LoadDemand[], leftOut: readonly LeftOut[], allOn: Flow): AtNodes {
  const byEdge = new Map(loads.map((load) => [load.edge.index, load]));
  const known = new Map<(load: LoadDemand) => number, Map<string, Float64Array>>();
  return (amountOf, combine) => {
    const before = known.get(amountOf)?.get(combine);
    if (before) return before;
    const found = allOn.gather((edge) => {
      const load = byEdge.get(edge.index);
      return load ? amountOf(load) : 0;
    }, combine);
    for (const { load, edges } of leftOut) {
      const amount = amountOf(load);
      // The nodes of the load itself hold it already.
      const held = new Set([load.edge.a, load.edge.b]);
      for (const node of new Set(edges.flatMap(({ a, b }) => [a, b]))) {
        if (held.has(node)) continue;
        found[node] = combine === 'sum' ? found[node]! + amount : Math.max(found[node]!, amount);
      }
    }
    known.set(amountOf, (known.get(amountOf) ?? new Map<string, Float64Array>()).set(combine, found));
    return found;
  };
}

/** What hangs together of idle conductors, contacts and batteries, cut wherever a node carries something. */
function idleParts(circuits: Circuits, isUsed: readonly boolean[], isLive: readonly boolean[]): NetworkEdge[][] {
  const { network } = circuits;
  const isIdle = (edge: NetworkEdge) =>
    !isUsed[edge.index] &&
    edge.a !== edge.b &&
    (canConduct(edge) || (edge.type === 'source' && edge.element.type === 'battery'));
  const seen = new Set<number>();
  return network.edges.filter(isIdle).flatMap((start) => {
    if (seen.has(start.index)) return [];
    seen.add(start.index);
    const part = [start];
    for (const edge of part) {
      for (const node of [edge.a, edge.b]) {
        if (isLive[node]) continue;
        for (const next of network.edgesAt(node)) {
          if (seen.has(next.index) || !isIdle(next)) continue;
          seen.add(next.index);
          part.push(next);
        }
      }
    }
    return [part];
  });
}

/** Of a part what leads from one of the ends to another: dead ends are taken off until none is left. */
function between(part: readonly NetworkEdge[], ends: readonly number[]): NetworkEdge[] {
  const at = new Map<number, Set<NetworkEdge>>();
  for (const edge of part) {
    for (const node of [edge.a, edge.b]) at.set(node, (at.get(node) ?? new Set()).add(edge));
  }
  const kept = new Set(part);
  const loose = [...at.keys()].filter((node) => at.get(node)!.size === 1 && !ends.includes(node));
  for (const node of loose) {
    const [last] = at.get(node)!;
    if (!last) continue;
    kept.delete(last);
    const to = otherEnd(last, node);
    for (const each of [node, to]) at.get(each)!.delete(last);
    if (at.get(to)!.size === 1 && !ends.includes(to)) loose.push(to);
  }
  return [...kept];
}

/** Whether a battery reaches a node, or its return does, otherwise than by way of another. */
function isSupplied({ network }: Circuits, node: number, without: number): boolean {
  const seen = new Set([node, without]);
  const queue = [node];
  for (const at of queue) {
    for (const edge of network.edgesAt(at)) {
      if (edge.type === 'source' && edge.element.type === 'battery') return true;
      const to = otherEnd(edge, at);
      if (!canConduct(edge) || seen.has(to)) continue;
      seen.add(to);
      queue.push(to);
    }
  }
  return false;
}

function wayTo(edges: readonly NetworkEdge[], ends: readonly number[], atNodes: AtNodes): OtherWay {
  return {
    edges,
    behind: (amountOf, combine = 'sum') => Math.max(...ends.map((end) => atNodes(amountOf, combine)[end]!)),
  };
}
