import type { Network, NetworkEdge } from './network.ts';
import { otherEnd } from './network.ts';

/** The ways of least resistance from one node to all others, over the edges that `passes` lets through. */
export interface Paths {
  reaches(node: number): boolean;
  /** The edges from the start to a node, in that order, each with the node it sets out from. */
  to(node: number): PathStep[];
}

export interface PathStep {
  readonly edge: NetworkEdge;
  readonly from: number;
}

export function leastResistance(network: Network, start: number, passes: (edge: NetworkEdge) => boolean): Paths {
  const ohms = network.nodes.map(() => Infinity);
  const by: (PathStep | undefined)[] = network.nodes.map(() => undefined);
  const heap = new Heap();
  ohms[start] = 0;
  heap.push(0, start);
  for (let next = heap.pop(); next; next = heap.pop()) {
    const [distance, node] = next;
    if (distance > ohms[node]!) continue;
    for (const edge of network.edgesAt(node)) {
      if (!passes(edge)) continue;
      const to = otherEnd(edge, node);
      const through = distance + ohmOf(edge);
      if (!(through < ohms[to]!)) continue;
      ohms[to] = through;
      by[to] = { edge, from: node };
      heap.push(through, to);
    }
  }
  return {
    reaches: (node) => ohms[node]! < Infinity,
    to(node) {
      const steps: PathStep[] = [];
      for (let step = by[node]; step; step = by[step.from]) steps.push(step);
      return steps.reverse();
    },
  };
}

export function ohmOf(edge: NetworkEdge): number {
  if (edge.type === 'run') return edge.ohm;
  return edge.type === 'contact' ? edge.element.ohm : 0;
}

/** A binary heap of (key, node), smallest key first. */
class Heap {
  private readonly items: [number, number][] = [];

  push(key: number, node: number): void {
    const items = this.items;
    let at = items.push([key, node]) - 1;
    while (at > 0) {
      const parent = (at - 1) >> 1;
      if (items[parent]![0] <= items[at]![0]) break;
      [items[parent], items[at]] = [items[at]!, items[parent]!];
      at = parent;
    }
  }

  pop(): [number, number] | undefined {
    const items = this.items;
    const top = items[0];
    const last = items.pop();
    if (!top || !last || items.length === 0) return top;
    items[0] = last;
    let at = 0;
    for (;;) {
      const left = 2 * at + 1;
      if (left >= items.length) break;
      const right = left + 1;
      const least = right < items.length && items[right]![0] < items[left]![0] ? right : left;
      if (items[at]![0] <= items[least]![0]) break;
      [items[at], items[least]] = [items[least]!, items[at]!];
      at = least;
    }
    return top;
  }
}
