import { factorise, findPattern, potentialsFor, type Pattern } from './laplacian.ts';

/**
 * Branches between nodes. A stiff branch obeys v(a) − v(b) = emfV + ohm · i; one without resistance is not divided
 * by: it makes its two nodes one, a fixed voltage apart. A load branch obeys i = conductance · (v(a) − v(b)) +
 * currentA, which is how anything not linear looks close to a working point.
 */
export interface StiffBranch {
  readonly a: number;
  readonly b: number;
  readonly ohm: number;
  readonly emfV: number;
}

export interface LoadBranch {
  readonly a: number;
  readonly b: number;
}

/** What the branches leave free and what they tie, worked out once for any number of solutions. */
export interface Circuit {
  readonly nodeCount: number;
  readonly stiff: readonly StiffBranch[];
  readonly loads: readonly LoadBranch[];
  /** The group of nodes without resistance between them, and how far a node stands above its group. */
  readonly groups: Int32Array;
  readonly aboveV: Float64Array;
  /** Branches that tie nodes of one group; `emfV` sums to zero round any ring of them. */
  readonly ties: readonly number[];
  /** Branches without resistance whose voltage contradicts that of others: no current satisfies them. */
  readonly contradictions: readonly number[];
  /** Branches with resistance, and the pattern of the groups they join (then the loads, in order). */
  readonly resistive: readonly number[];
  readonly pattern: Pattern;
  /** The pattern of the ties, over nodes. */
  readonly tiePattern: Pattern;
  /** The part of the network a node is in: parts that nothing stiff joins can't carry current to each other. */
  readonly partOf: (node: number) => number;
}

export interface Solution {
  readonly potentials: Float64Array;
  readonly stiffA: Float64Array;
  readonly loadA: Float64Array;
}

/** Below this, Ω, a resistance is none: it drops less than a nanovolt at any current a boat knows. */
const NO_OHM = 1e-15;
/** Each takes what rounding is left down by as much as the first; few are ever needed. */
const ROUNDS = 4;
/** Voltages nearer than this share of the greater are the same. */
const SAME = 1e-12;

export function prepareCircuit(
  nodeCount: number,
  stiff: readonly StiffBranch[],
  loads: readonly LoadBranch[],
): Circuit {
  const groups = Int32Array.from({ length: nodeCount }, (_, node) => node);
  const aboveV = new Float64Array(nodeCount);
  const ties: number[] = [];
  const contradictions: number[] = [];
  const resistive: number[] = [];
  stiff.forEach((branch, index) => {
    if (branch.ohm >= NO_OHM) resistive.push(index);
    else if (tie(branch, groups, aboveV)) ties.push(index);
    else contradictions.push(index);
  });
  const groupCount = number(groups, aboveV);

  const group = (node: number) => groups[node]!;
  const joined = resistive.map((index) => stiff[index]!);
  const alone = findPattern(
    groupCount,
    joined.map((branch) => group(branch.a)),
    joined.map((branch) => group(branch.b)),
  );
  const within = loads.filter((load) => alone.parts[group(load.a)] === alone.parts[group(load.b)]);
  const pattern =
    within.length === 0
      ? alone
      : findPattern(
          groupCount,
          [...joined, ...loads].map((branch) => group(branch.a)),
          [...joined, ...loads].map((branch, i) =>
            i < joined.length || alone.parts[group(branch.a)] === alone.parts[group(branch.b)]
              ? group(branch.b)
              : group(branch.a),
          ),
        );
  const tiePattern = findPattern(
    nodeCount,
    ties.map((index) => stiff[index]!.a),
    ties.map((index) => stiff[index]!.b),
  );
  return {
    nodeCount,
    stiff,
    loads,
    groups,
    aboveV,
    ties,
    contradictions,
    resistive,
    pattern,
    tiePattern,
    partOf: (node) => alone.parts[group(node)]!,
  };
}

/**
 * The solution for given load branches; null where it has no stable one. Currents are worked out with the
 * potentials, not from their differences: what Kirchhoff's law still lacks is solved again until it is rounding.
 * A load between two parts carries nothing.
 */
export function solveCircuit(
  circuit: Circuit,
  conductances: ArrayLike<number>,
  currentsA: ArrayLike<number>,
): Solution | null {
  const { stiff, loads, groups, aboveV, resistive, pattern } = circuit;
  const count = resistive.length + loads.length;
  const from = new Int32Array(count);
  const to = new Int32Array(count);
  const leads = new Float64Array(count);
  const flows = new Float64Array(count);
  const put = (i: number, { a, b }: LoadBranch, conductance: number, currentA: number) => {
    from[i] = groups[a]!;
    to[i] = groups[b]!;
    leads[i] = conductance;
    flows[i] = currentA + conductance * (aboveV[a]! - aboveV[b]!);
  };
  resistive.forEach((index, i) => {
    const branch = stiff[index]!;
    put(i, branch, 1 / branch.ohm, -branch.emfV / branch.ohm);
  });
  loads.forEach((load, i) => {
    const carries = circuit.partOf(load.a) === circuit.partOf(load.b);
    put(resistive.length + i, load, carries ? conductances[i]! : 0, carries ? currentsA[i]! : 0);
  });
  const factor = factorise(pattern, leads);
  if (!factor) return null;

  const groupV = new Float64Array(pattern.size);
  for (let round = 0; round < ROUNDS; round++) {
    const lacking = new Float64Array(pattern.size);
    let largest = 0;
    for (let i = 0; i < count; i++) {
      lacking[from[i]!]! -= flows[i]!;
      lacking[to[i]!]! += flows[i]!;
      largest = Math.max(largest, Math.abs(flows[i]!));
    }
    if (round > 1 && lacking.every((amps) => Math.abs(amps) <= 4e-16 * largest)) break;
    const more = potentialsFor(factor, lacking);
    for (let i = 0; i < count; i++) flows[i]! += leads[i]! * (more[from[i]!]! - more[to[i]!]!);
    for (let group = 0; group < more.length; group++) groupV[group]! += more[group]!;
  }

  const stiffA = new Float64Array(stiff.length);
  resistive.forEach((index, i) => (stiffA[index] = flows[i]!));
  const loadA = flows.slice(resistive.length);
  const potentials = Float64Array.from(groups, (group, node) => groupV[group]! + aboveV[node]!);
  shareAmongTies(circuit, stiffA, loadA);
  return { potentials, stiffA, loadA };
}

/** The currents of branches without resistance: what their nodes must pass on, in the least sum of squares. */
function shareAmongTies(circuit: Circuit, stiffA: Float64Array, loadA: Float64Array): void {
  const { stiff, loads, ties, tiePattern, resistive, nodeCount } = circuit;
  if (ties.length === 0) return;
  const factor = factorise(tiePattern, new Float64Array(ties.length).fill(1));
  if (!factor) return;
  const arriving = new Float64Array(nodeCount);
  const pass = ({ a, b }: LoadBranch, amps: number) => {
    arriving[a]! -= amps;
    arriving[b]! += amps;
  };
  for (const index of resistive) pass(stiff[index]!, stiffA[index]!);
  loads.forEach((load, i) => pass(load, loadA[i]!));
  for (let round = 0; round < 2; round++) {
    const potentials = potentialsFor(factor, arriving);
    for (const index of ties) {
      const branch = stiff[index]!;
      const amps = potentials[branch.a]! - potentials[branch.b]!;
      stiffA[index]! += amps;
      pass(branch, amps);
    }
  }
}

/** Joins the groups of a branch's nodes; false where they are one already and a different voltage apart. */
function tie({ a, b, emfV }: StiffBranch, groups: Int32Array, aboveV: Float64Array): boolean {
  const [rootA, rootB] = [rootOf(a, groups, aboveV), rootOf(b, groups, aboveV)];
  const [aboveA, aboveB] = [rootA === a ? 0 : aboveV[a]!, rootB === b ? 0 : aboveV[b]!];
  if (rootA === rootB) {
    const apart = aboveA - aboveB - emfV;
    return Math.abs(apart) <= SAME * Math.max(Math.abs(aboveA), Math.abs(aboveB), Math.abs(emfV));
  }
  groups[rootA] = rootB;
  aboveV[rootA] = aboveB + emfV - aboveA;
  return true;
}

/** The root of a node's group; on the way every node passed is hung below it, with its own height. */
function rootOf(node: number, groups: Int32Array, aboveV: Float64Array): number {
  const way: number[] = [];
  let at = node;
  while (groups[at] !== at) {
    way.push(at);
    at = groups[at]!;
  }
  for (let i = way.length - 2; i >= 0; i--) {
    aboveV[way[i]!]! += aboveV[way[i + 1]!]!;
    groups[way[i]!] = at;
  }
  return at;
}

/** Numbers the groups from 0, in place. */
function number(groups: Int32Array, aboveV: Float64Array): number {
  const roots = Int32Array.from(groups, (_, node) => rootOf(node, groups, aboveV));
  const numbers = new Map<number, number>();
  roots.forEach((root, node) => {
    if (!numbers.has(root)) numbers.set(root, numbers.size);
    groups[node] = numbers.get(root)!;
  });
  return numbers.size;
}
