/**
 * Conductances between nodes, factored sparsely. Only differences of potential count, so the matrix is a Laplacian:
 * it is kept as its edges, and a node is taken out by joining its neighbours with what leads through it. With
 * positive conductances nothing is ever subtracted, so accuracy does not suffer however far apart they lie.
 */
export interface Pattern {
  readonly size: number;
  /** Which part a node belongs to; parts share no edge. */
  readonly parts: Int32Array;
  readonly partCount: number;
  /** Place of a node in the order of taking out, and back. */
  readonly places: Int32Array;
  readonly nodes: Int32Array;
  /** Column of place `k`: `rows[starts[k] .. starts[k + 1]]`, later places, rising. */
  readonly starts: Int32Array;
  readonly rows: Int32Array;
  /** Where an edge stands in `rows`; -1 for one from a node to itself. */
  readonly slots: Int32Array;
}

/** The factors, in the pattern of `rows`: shares of what leads on, and what a place leads in all (0 at a part's last). */
export interface Factor {
  readonly pattern: Pattern;
  readonly shares: Float64Array;
  readonly pivots: Float64Array;
}

/** The order in which to take nodes out (least neighbours first) and what that fills in. */
export function findPattern(size: number, from: ArrayLike<number>, to: ArrayLike<number>): Pattern {
  const neighbours: Set<number>[] = Array.from({ length: size }, () => new Set());
  for (let edge = 0; edge < from.length; edge++) {
    const [a, b] = [from[edge]!, to[edge]!];
    if (a === b) continue;
    neighbours[a]!.add(b);
    neighbours[b]!.add(a);
  }
  const { parts, partCount } = findParts(size, neighbours);

  const places = new Int32Array(size).fill(-1);
  const nodes = new Int32Array(size);
  const columns: number[][] = [];
  const waiting: number[][] = [];
  const wait = (node: number) => (waiting[neighbours[node]!.size] ??= []).push(node);
  for (let node = size - 1; node >= 0; node--) wait(node);
  for (let least = 0; least < waiting.length; least++) {
    const bucket = waiting[least] ?? [];
    while (bucket.length > 0) {
      const node = bucket.pop()!;
      const around = neighbours[node]!;
      if (places[node] !== -1 || around.size !== least) continue;
      places[node] = columns.length;
      nodes[columns.length] = node;
      const column = [...around];
      columns.push(column);
      for (const other of column) takeOut(node, other, column, neighbours);
      for (const other of column) wait(other);
      if (least > 0 && column.length > 0) {
        least = Math.max(-1, least - 2);
        break;
      }
    }
  }
  return { size, parts, partCount, places, nodes, ...lay(columns, places, from, to) };
}

function takeOut(node: number, other: number, column: readonly number[], neighbours: readonly Set<number>[]): void {
  const around = neighbours[other]!;
  around.delete(node);
  for (const third of column) if (third !== other) around.add(third);
}

function findParts(size: number, neighbours: readonly ReadonlySet<number>[]) {
  const parts = new Int32Array(size).fill(-1);
  let partCount = 0;
  for (let start = 0; start < size; start++) {
    if (parts[start] !== -1) continue;
    parts[start] = partCount;
    const queue = [start];
    for (const node of queue) {
      for (const other of neighbours[node]!) {
        if (parts[other] !== -1) continue;
        parts[other] = partCount;
        queue.push(other);
      }
    }
    partCount++;
  }
  return { parts, partCount };
}

function lay(columns: number[][], places: Int32Array, from: ArrayLike<number>, to: ArrayLike<number>) {
  const starts = new Int32Array(columns.length + 1);
  columns.forEach((column, place) => (starts[place + 1] = starts[place]! + column.length));
  const rows = new Int32Array(starts[columns.length]!);
  columns.forEach((column, place) => {
    const sorted = Int32Array.from(column, (node) => places[node]!).sort();
    rows.set(sorted, starts[place]!);
  });
  const slots = new Int32Array(from.length);
  for (let edge = 0; edge < from.length; edge++) {
    const [p, q] = [places[from[edge]!]!, places[to[edge]!]!];
    slots[edge] = p === q ? -1 : findRow(rows, starts, Math.min(p, q), Math.max(p, q));
  }
  return { starts, rows, slots };
}

function findRow(rows: Int32Array, starts: Int32Array, column: number, row: number): number {
  let low = starts[column]!;
  let high = starts[column + 1]! - 1;
  while (low < high) {
    const middle = (low + high) >> 1;
    if (rows[middle]! < row) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** A pivot below this share of what it is summed from is rounding, not conductance. */
const ROUNDING = 1e-13;

/**
 * The factors for conductances by edge; null where the network has no stable point: a conductance below zero (a load
 * that draws more as its voltage falls) outweighs what feeds it.
 */
export function factorise(pattern: Pattern, conductances: ArrayLike<number>): Factor | null {
  const { size, starts, rows, slots } = pattern;
  const shares = new Float64Array(rows.length);
  const pivots = new Float64Array(size);
  for (let edge = 0; edge < slots.length; edge++) {
    const slot = slots[edge]!;
    if (slot >= 0) shares[slot]! += conductances[edge]!;
  }
  for (let place = 0; place < size; place++) {
    const start = starts[place]!;
    const end = starts[place + 1]!;
    let pivot = 0;
    let whole = 0;
    for (let at = start; at < end; at++) {
      pivot += shares[at]!;
      whole += Math.abs(shares[at]!);
    }
    if (whole === 0) continue;
    if (!(pivot > ROUNDING * whole)) return null;
    pivots[place] = pivot;
    for (let at = start; at < end; at++) {
      const share = shares[at]! / pivot;
      let into = starts[rows[at]!]!;
      for (let later = at + 1; later < end; later++) {
        const row = rows[later]!;
        while (rows[into]! < row) into++;
        shares[into]! += share * shares[later]!;
      }
      shares[at] = share;
    }
  }
  return { pattern, shares, pivots };
}

/** Potentials for currents fed into the nodes, each against the last place of its part. */
export function potentialsFor(factor: Factor, fedA: ArrayLike<number>): Float64Array {
  const { pattern, shares, pivots } = factor;
  const { size, nodes, starts, rows } = pattern;
  const held = new Float64Array(size);
  for (let place = 0; place < size; place++) held[place] = fedA[nodes[place]!]!;
  for (let place = 0; place < size; place++) {
    const through = held[place]!;
    if (through === 0) continue;
    for (let at = starts[place]!; at < starts[place + 1]!; at++) held[rows[at]!]! += shares[at]! * through;
  }
  const potentials = new Float64Array(size);
  for (let place = size - 1; place >= 0; place--) {
    const pivot = pivots[place]!;
    let volts = pivot === 0 ? 0 : held[place]! / pivot;
    for (let at = starts[place]!; at < starts[place + 1]!; at++) volts += shares[at]! * held[rows[at]!]!;
    held[place] = volts;
    potentials[nodes[place]!] = volts;
  }
  return potentials;
}

/**
 * The potentials of a few nodes for currents fed into a few: only the way from them to the last place of their part
 * is worked through, so that asking at every device of a design stays cheap.
 */
export function probe(
  factor: Factor,
  fed: readonly (readonly [node: number, amps: number])[],
  asked: readonly number[],
): number[] {
  const { places } = factor.pattern;
  const held = new Map<number, number>();
  for (const [node] of fed) wayFrom(factor.pattern, places[node]!, held);
  for (const [node, amps] of fed) held.set(places[node]!, held.get(places[node]!)! + amps);
  const { starts, rows } = factor.pattern;
  for (const place of [...held.keys()].sort((p, q) => p - q)) {
    const through = held.get(place)!;
    if (through === 0) continue;
    for (let at = starts[place]!; at < starts[place + 1]!; at++) {
      held.set(rows[at]!, held.get(rows[at]!)! + factor.shares[at]! * through);
    }
  }
  for (const node of asked) wayFrom(factor.pattern, places[node]!, held);
  for (const place of [...held.keys()].sort((p, q) => q - p)) {
    const pivot = factor.pivots[place]!;
    let volts = pivot === 0 ? 0 : held.get(place)! / pivot;
    for (let at = starts[place]!; at < starts[place + 1]!; at++) volts += factor.shares[at]! * held.get(rows[at]!)!;
    held.set(place, volts);
  }
  return asked.map((node) => held.get(places[node]!)!);
}

/** Adds a place and all that its column leads to; the first row of a column is the next on the way. */
function wayFrom({ starts, rows }: Pattern, place: number, held: Map<number, number>): void {
  let at = place;
  while (!held.has(at)) {
    held.set(at, 0);
    if (starts[at] === starts[at + 1]) return;
    at = rows[starts[at]!]!;
  }
}
