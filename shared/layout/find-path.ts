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
 * The corners of the cheapest square path between two nodes. The sheet is swept by turns along its rows and its
 * columns; after each sweep all paths with one bend more are known, so paths of few bends are found at once, and the
 * search ends when a sweep finds nothing cheaper. The same grid gives the same path.
 */
export function findPath(grid: RouteGrid, from: PathEnd, to: PathEnd): number[] {
  if (from.node === to.node) return [from.node];
  const nearby = search(grid, from, to, windowOf(grid, from.node, to.node, NEAR), NEVER);
  if (nearby.cost < CROWDED) return nearby.nodes;
  const further = search(grid, from, to, windowOf(grid, from.node, to.node, FAR), nearby.cost);
  return further.cost < nearby.cost ? further.nodes : nearby.nodes;
}

interface Window {
  readonly left: number;
  readonly top: number;
  readonly right: number;
  readonly bottom: number;
}

/** Squares round the straight box of two ends that are searched first; most runs need no more. */
const NEAR = 12;
/** And when all ways there are barred. */
const FAR = 40;
/** A path that costs as much goes over or through something. */
const CROWDED = COST.overlap;
const MAX_SWEEPS = 16;
/** Once the goal is reached, so many more bends are tried for a cheaper way. */
const MORE_BENDS = 4;
/** More than any path costs. */
const NEVER = 1e9;

function windowOf({ columns, rows }: RouteGrid, from: number, to: number, reach: number): Window {
  const [fromColumn, toColumn] = [from % columns, to % columns];
  const [fromRow, toRow] = [Math.floor(from / columns), Math.floor(to / columns)];
  return {
    left: Math.max(0, Math.min(fromColumn, toColumn) - reach),
    top: Math.max(0, Math.min(fromRow, toRow) - reach),
    right: Math.min(columns - 1, Math.max(fromColumn, toColumn) + reach),
    bottom: Math.min(rows - 1, Math.max(fromRow, toRow) + reach),
  };
}

function search(
  grid: RouteGrid,
  from: PathEnd,
  to: PathEnd,
  window: Window,
  below: number,
): { nodes: number[]; cost: number } {
  const known = beginSearch(grid, window);
  const kept = [grid.turn[from.node]!, grid.enterLevel[to.node]!, grid.enterUpright[to.node]!] as const;
  // no turn on the spot at the start, no way on through the goal
  grid.turn[from.node] = NEVER;
  grid.enterLevel[to.node] = NEVER;
  grid.enterUpright[to.node] = NEVER;
  for (const heading of HEADINGS) {
    if (from.arrived !== undefined && heading === (from.arrived + 2) % 4) continue;
    const turned = from.arrived !== undefined && heading !== from.arrived ? COST.bend : 0;
    known.spent[heading]![from.node] = turned + exitCost(from, heading);
    known.start[heading]![from.node] = from.node;
  }
  const startRow = Math.floor(from.node / grid.columns);
  known.dirtyRow[startRow] = 1;
  known.dirtyColumn[from.node % grid.columns] = 1;

  let best: Arrival = { cost: below, heading: 0, node: -1, isTurn: false };
  for (let sweep = 0, idle = 0; sweep < MAX_SWEEPS && idle < MORE_BENDS; sweep++) {
    const sweepLines = sweep % 2 === 0 ? sweepRows : sweepColumns;
    const found = sweepLines(grid, known, window, best.cost);
    const better = arrive(grid, known, window, from, to, best);
    idle = better === best && best.node !== -1 ? idle + 1 : 0;
    best = better;
    if (!found && sweep > 0) break;
  }
  grid.turn[from.node] = kept[0];
  grid.enterLevel[to.node] = kept[1];
  grid.enterUpright[to.node] = kept[2];
  if (best.node === -1) return { nodes: [from.node, to.node], cost: NEVER };
  return { nodes: trace(known, from.node, to.node, best), cost: best.cost };
}

const HEADINGS: readonly Direction[] = [0, 1, 2, 3];

interface Arrival {
  readonly cost: number;
  readonly heading: Direction;
  /** The last node before the goal. */
  readonly node: number;
  /** The path turns there. */
  readonly isTurn: boolean;
}

/** All rows that a column reached since: to the right, then to the left. */
function sweepRows(grid: RouteGrid, known: Known, window: Window, below: number): boolean {
  const { columns, enterLevel, shareLevel, turn } = grid;
  const { spent, start, dirtyRow, dirtyColumn } = known;
  const [rightward, down, leftward, up] = spent;
  const [rightStart, , leftStart] = start;
  let found = false;
  for (let row = window.top; row <= window.bottom; row++) {
    if (dirtyRow[row] === 0) continue;
    dirtyRow[row] = 0;
    const first = row * columns + window.left;
    const last = row * columns + window.right;
    for (let node = first + 1; node <= last; node++) {
      const before = node - 1;
      const ahead = rightward[before]!;
      const turned = Math.min(down[before]!, up[before]!) + turn[before]!;
      const cost = Math.min(ahead, turned) + enterLevel[node]! + shareLevel[node]!;
      if (cost >= below || cost >= rightward[node]!) continue;
      rightward[node] = cost;
      rightStart[node] = turned < ahead ? before : rightStart[before]!;
      dirtyColumn[node - row * columns] = 1;
      found = true;
    }
    for (let node = last - 1; node >= first; node--) {
      const before = node + 1;
      const ahead = leftward[before]!;
      const turned = Math.min(down[before]!, up[before]!) + turn[before]!;
      const cost = Math.min(ahead, turned) + enterLevel[node]! + shareLevel[before]!;
      if (cost >= below || cost >= leftward[node]!) continue;
      leftward[node] = cost;
      leftStart[node] = turned < ahead ? before : leftStart[before]!;
      dirtyColumn[node - row * columns] = 1;
      found = true;
    }
  }
  return found;
}

/** All columns that a row reached since: down, then up. */
function sweepColumns(grid: RouteGrid, known: Known, window: Window, below: number): boolean {
  const { columns, enterUpright, shareUpright, turn } = grid;
  const { spent, start, dirtyRow, dirtyColumn } = known;
  const [rightward, down, leftward, up] = spent;
  const [, downStart, , upStart] = start;
  let found = false;
  for (let column = window.left; column <= window.right; column++) {
    if (dirtyColumn[column] === 0) continue;
    dirtyColumn[column] = 0;
    for (let row = window.top + 1; row <= window.bottom; row++) {
      const node = row * columns + column;
      const before = node - columns;
      const ahead = down[before]!;
      const turned = Math.min(rightward[before]!, leftward[before]!) + turn[before]!;
      const cost = Math.min(ahead, turned) + enterUpright[node]! + shareUpright[node]!;
      if (cost >= below || cost >= down[node]!) continue;
      down[node] = cost;
      downStart[node] = turned < ahead ? before : downStart[before]!;
      dirtyRow[row] = 1;
      found = true;
    }
    for (let row = window.bottom - 1; row >= window.top; row--) {
      const node = row * columns + column;
      const before = node + columns;
      const ahead = up[before]!;
      const turned = Math.min(rightward[before]!, leftward[before]!) + turn[before]!;
      const cost = Math.min(ahead, turned) + enterUpright[node]! + shareUpright[before]!;
      if (cost >= below || cost >= up[node]!) continue;
      up[node] = cost;
      upStart[node] = turned < ahead ? before : upStart[before]!;
      dirtyRow[row] = 1;
      found = true;
    }
  }
  return found;
}

/** The cheapest of the four last steps onto the goal, when it is cheaper than the best so far. */
function arrive(
  grid: RouteGrid,
  { spent }: Known,
  window: Window,
  from: PathEnd,
  to: PathEnd,
  before: Arrival,
): Arrival {
  const { columns } = grid;
  const column = to.node % columns;
  const row = Math.floor(to.node / columns);
  let best = before;
  for (const heading of HEADINGS) {
    if (heading === 0 && column === window.left) continue;
    if (heading === 1 && row === window.top) continue;
    if (heading === 2 && column === window.right) continue;
    if (heading === 3 && row === window.bottom) continue;
    const isLevel = heading === 0 || heading === 2;
    const node = to.node - (heading === 0 ? 1 : heading === 1 ? columns : heading === 2 ? -1 : -columns);
    const shared = isLevel ? grid.shareLevel[Math.max(node, to.node)]! : grid.shareUpright[Math.max(node, to.node)]!;
    const ahead = spent[heading][node]!;
    const [one, other] = isLevel ? [spent[1], spent[3]] : [spent[0], spent[2]];
    const turned = node === from.node ? NEVER : Math.min(one[node]!, other[node]!) + grid.turn[node]!;
    const cost = Math.min(ahead, turned) + 1 + shared + exitCost(to, ((heading + 2) % 4) as Direction);
    if (cost < best.cost) best = { cost, heading, node, isTurn: turned < ahead };
  }
  return best;
}

function trace({ spent, start }: Known, from: number, to: number, last: Arrival): number[] {
  const nodes = [to];
  let at = last.isTurn ? last.node : start[last.heading][last.node]!;
  let isLevel = last.heading % 2 === 1;
  // every step back is to a state that costs less
  while (at !== from && nodes.length < 64) {
    nodes.push(at);
    const [one, other] = isLevel ? ([0, 2] as const) : ([1, 3] as const);
    const heading = spent[one][at]! <= spent[other][at]! ? one : other;
    at = start[heading][at]!;
    isLevel = !isLevel;
  }
  nodes.push(from);
  return nodes.reverse();
}

function exitCost(end: PathEnd, heading: Direction): number {
  if (end.sides === undefined) return 0;
  if (end.sides.some((side) => SIDE_DIRECTION[side] === heading)) return 0;
  return end.sides.some((side) => SIDE_DIRECTION[side] === (heading + 2) % 4) ? COST.backwards : COST.sideways;
}

/** What the sweeps know of each node by heading: the cheapest way there, and where its last straight began. */
interface Known {
  spent: readonly [Float32Array, Float32Array, Float32Array, Float32Array];
  start: readonly [Int32Array, Int32Array, Int32Array, Int32Array];
  /** Reached across since they were last swept. */
  dirtyRow: Uint8Array;
  dirtyColumn: Uint8Array;
}

/** Kept between searches: a drag makes hundreds of them a second. */
let scratch = makeKnown(0, 0, 0);

function makeKnown(size: number, columns: number, rows: number): Known {
  const floats = () => new Float32Array(size);
  const integers = () => new Int32Array(size);
  return {
    spent: [floats(), floats(), floats(), floats()],
    start: [integers(), integers(), integers(), integers()],
    dirtyRow: new Uint8Array(rows),
    dirtyColumn: new Uint8Array(columns),
  };
}

function beginSearch({ columns, rows }: RouteGrid, { left, top, right, bottom }: Window): Known {
  const { spent, dirtyRow, dirtyColumn } = scratch;
  if (spent[0].length < columns * rows || dirtyRow.length < rows || dirtyColumn.length < columns) {
    scratch = makeKnown(columns * rows, columns, rows);
  }
  for (const costs of scratch.spent) {
    for (let row = top; row <= bottom; row++) costs.fill(NEVER, row * columns + left, row * columns + right + 1);
  }
  scratch.dirtyRow.fill(0);
  scratch.dirtyColumn.fill(0);
  return scratch;
}
