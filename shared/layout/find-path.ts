import type { Side } from '#shared/kinds/kind.ts';

import { COST, type RouteGrid } from './route-grid.ts';

/** Where a leg of a run begins or ends: a terminal with the sides it may be left by, or a bend a person put. */
export interface PathEnd {
  readonly node: number;
  readonly sides?: readonly Side[];
  /** The way the leg before arrived, which the run may not turn straight back on. */
  readonly arrived?: Direction;
}

/** 0 right, 1 down, 2 left, 3 up. */
export type Direction = 0 | 1 | 2 | 3;

export const SIDE_DIRECTION: Readonly<Record<Side, Direction>> = { right: 0, bottom: 1, left: 2, top: 3 };

/**
 * The cheapest square path between two nodes (A*, one state a node and heading). The same grid gives the same path:
 * ties fall by the order in which states were reached.
 */
export function findPath(grid: RouteGrid, from: PathEnd, to: PathEnd): number[] {
  if (from.node === to.node) return [from.node];
  const nearby = search(grid, from, to, windowOf(grid, from.node, to.node));
  if (nearby.cost < CROWDED) return nearby.nodes;
  const anywhere = search(grid, from, to, { left: 0, top: 0, right: grid.columns - 1, bottom: grid.rows - 1 });
  return anywhere.cost < nearby.cost ? anywhere.nodes : nearby.nodes;
}

interface Window {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** Squares round the straight box of two ends that are searched first; most runs need no more. */
const REACH = 12;
/** A path that costs as much goes through or over something: then the whole sheet is searched for a way round. */
const CROWDED = 900;
/** How much the search leans towards its goal; a little dearer paths for many fewer squares looked at. */
const LEAN = 1.3;

function windowOf({ columns, rows }: RouteGrid, from: number, to: number): Window {
  const [fromColumn, toColumn] = [from % columns, to % columns];
  const [fromRow, toRow] = [Math.floor(from / columns), Math.floor(to / columns)];
  return {
    left: Math.max(0, Math.min(fromColumn, toColumn) - REACH),
    top: Math.max(0, Math.min(fromRow, toRow) - REACH),
    right: Math.min(columns - 1, Math.max(fromColumn, toColumn) + REACH),
    bottom: Math.min(rows - 1, Math.max(fromRow, toRow) + REACH),
  };
}

function search(grid: RouteGrid, from: PathEnd, to: PathEnd, window: Window): { nodes: number[]; cost: number } {
  const { columns, rows } = grid;
  const { left, top, right, bottom } = window;
  const toColumn = to.node % columns;
  const toRow = Math.floor(to.node / columns);
  const frontier = beginSearch(columns * rows * 4);
  const strides = [1, columns, -1, -columns] as const;

  for (const heading of HEADINGS) {
    if (from.arrived !== undefined && heading === (from.arrived + 2) % 4) continue;
    const turned = from.arrived !== undefined && heading !== from.arrived ? COST.bend : 0;
    open(frontier, from.node * 4 + heading, turned + exitCost(from, heading), -1, estimate(from.node, heading));
  }
  for (;;) {
    const state = takeCheapest(frontier);
    if (state === -1) return { nodes: [from.node, to.node], cost: Infinity };
    if (frontier.closed[state] === frontier.stamp) continue;
    frontier.closed[state] = frontier.stamp;
    const node = state >> 2;
    const heading = (state & 3) as Direction;
    if (node === to.node) return { nodes: trace(frontier, state), cost: frontier.spent[state]! };
    const column = node % columns;
    const row = (node - column) / columns;
    const spent = frontier.spent[state]!;
    for (const next of HEADINGS) {
      if (next === (heading + 2) % 4) continue;
      if (node === from.node && next !== heading) continue;
      if ((next === 0 && column === right) || (next === 2 && column === left)) continue;
      if ((next === 1 && row === bottom) || (next === 3 && row === top)) continue;
      const turning = next !== heading;
      const ahead = node + strides[next];
      let cost = 1 + stepCost(grid, node, ahead, next, ahead === to.node);
      if (turning) cost += COST.bend + (grid.level[node]! + grid.upright[node]! > 0 ? COST.touch : 0);
      if (ahead === to.node) cost += exitCost(to, ((next + 2) % 4) as Direction);
      open(frontier, ahead * 4 + next, spent + cost, state, estimate(ahead, next));
    }
  }

  function estimate(node: number, heading: Direction): number {
    const dx = toColumn - (node % columns);
    const dy = toRow - Math.floor(node / columns);
    const distance = Math.abs(dx) + Math.abs(dy);
    const bends = dx !== 0 && dy !== 0 ? 1 : distance > 0 && !headsFor(heading, dx, dy) ? 2 : 0;
    return LEAN * (distance + bends * COST.bend);
  }
}

const HEADINGS: readonly Direction[] = [0, 1, 2, 3];

function headsFor(heading: Direction, dx: number, dy: number): boolean {
  return heading === 0 ? dx > 0 : heading === 2 ? dx < 0 : heading === 1 ? dy > 0 : dy < 0;
}

function exitCost(end: PathEnd, heading: Direction): number {
  if (end.sides === undefined) return 0;
  if (end.sides.some((side) => SIDE_DIRECTION[side] === heading)) return 0;
  return end.sides.some((side) => SIDE_DIRECTION[side] === (heading + 2) % 4) ? COST.backwards : COST.sideways;
}

function stepCost(grid: RouteGrid, node: number, ahead: number, heading: Direction, isEnd: boolean): number {
  const isLevel = heading === 0 || heading === 2;
  const along = isLevel ? grid.level : grid.upright;
  const across = isLevel ? grid.upright : grid.level;
  const beside = isLevel ? grid.columns : 1;
  let cost = 0;
  if (along[node]! > 0 && along[ahead]! > 0) cost += COST.overlap;
  if (isEnd) return cost;
  cost += grid.cost[ahead]!;
  if (grid.corner[ahead]! > 0) cost += COST.touch;
  else if (across[ahead]! > 0) cost += COST.crossing * across[ahead]!;
  if ((along[ahead - beside] ?? 0) > 0 || (along[ahead + beside] ?? 0) > 0) cost += COST.lane;
  return cost;
}

/** Kept between searches and stamped, not cleared: a drag makes hundreds of searches a second. */
interface Search {
  stamp: number;
  seen: Int32Array;
  closed: Int32Array;
  spent: Float64Array;
  before: Int32Array;
  heapState: Int32Array;
  heapKey: Float64Array;
  heapSize: number;
}

const scratch: Search = {
  stamp: 0,
  seen: new Int32Array(0),
  closed: new Int32Array(0),
  spent: new Float64Array(0),
  before: new Int32Array(0),
  heapState: new Int32Array(1024),
  heapKey: new Float64Array(1024),
  heapSize: 0,
};

function beginSearch(states: number): Search {
  if (scratch.seen.length < states) {
    scratch.seen = new Int32Array(states);
    scratch.closed = new Int32Array(states);
    scratch.spent = new Float64Array(states);
    scratch.before = new Int32Array(states);
    scratch.stamp = 0;
  }
  scratch.stamp++;
  scratch.heapSize = 0;
  return scratch;
}

function open(search: Search, state: number, spent: number, before: number, estimate: number): void {
  if (search.seen[state] === search.stamp && search.spent[state]! <= spent) return;
  search.seen[state] = search.stamp;
  search.spent[state] = spent;
  search.before[state] = before;
  push(search, state, spent + estimate);
}

function trace(search: Search, last: number): number[] {
  const nodes: number[] = [];
  for (let state = last; state !== -1; state = search.before[state]!) {
    if (nodes.at(-1) !== state >> 2) nodes.push(state >> 2);
  }
  return nodes.reverse();
}

function push(search: Search, state: number, key: number): void {
  if (search.heapSize === search.heapState.length) growHeap(search);
  const { heapState, heapKey } = search;
  let at = search.heapSize++;
  while (at > 0) {
    const parent = (at - 1) >> 1;
    if (heapKey[parent]! <= key) break;
    heapKey[at] = heapKey[parent]!;
    heapState[at] = heapState[parent]!;
    at = parent;
  }
  heapKey[at] = key;
  heapState[at] = state;
}

function takeCheapest(search: Search): number {
  if (search.heapSize === 0) return -1;
  const { heapState, heapKey } = search;
  const first = heapState[0]!;
  const size = --search.heapSize;
  const key = heapKey[size]!;
  const state = heapState[size]!;
  let at = 0;
  for (;;) {
    let child = 2 * at + 1;
    if (child >= size) break;
    if (child + 1 < size && heapKey[child + 1]! < heapKey[child]!) child++;
    if (heapKey[child]! >= key) break;
    heapKey[at] = heapKey[child]!;
    heapState[at] = heapState[child]!;
    at = child;
  }
  heapKey[at] = key;
  heapState[at] = state;
  return first;
}

function growHeap(search: Search): void {
  const heapState = new Int32Array(search.heapState.length * 2);
  const heapKey = new Float64Array(search.heapKey.length * 2);
  heapState.set(search.heapState);
  heapKey.set(search.heapKey);
  search.heapState = heapState;
  search.heapKey = heapKey;
}
