import { prepareCircuit, solveCircuit, type Circuit, type LoadBranch, type StiffBranch } from './circuit.ts';

/** What is to be solved: branches that obey Ohm's law, loads that do not, charging sources with their limits. */
export interface Task {
  readonly nodeCount: number;
  readonly stiff: readonly StiffBranch[];
  /** Of `stiff`, the loads that are resistances; they shrink with the share of load that can be held. */
  readonly resistanceLoads: ReadonlySet<number>;
  readonly loads: readonly NonlinearLoad[];
  readonly charging: readonly ChargingSource[];
}

export interface NonlinearLoad extends LoadBranch {
  readonly model: 'current' | 'power';
  readonly amount: number;
}

export interface ChargingSource extends LoadBranch {
  readonly maxA: number;
  readonly regulatedV: number;
  readonly atRated: boolean;
}

interface Posed extends Task {
  /** By charging source: whether its current has anywhere to go. */
  readonly hasWay: readonly boolean[];
}

/** Steady: holds its voltage. Limited: gives its most. Idle: something else holds a higher voltage. */
export type ChargingState = 'steady' | 'limited' | 'idle';

export interface OperatingPoint {
  readonly circuit: Circuit;
  readonly potentials: Float64Array;
  readonly stiffA: Float64Array;
  readonly loadA: Float64Array;
  /** Current into the source, so negative. */
  readonly chargingA: Float64Array;
  readonly chargingStates: readonly ChargingState[];
  readonly loadVolts: Float64Array;
}

export interface Outcome {
  readonly converged: boolean;
  readonly heldFraction: number;
  readonly point: OperatingPoint | null;
}

/** Ohm that stand for none where ideal sources contradict each other, so that there are figures to show at all. */
const CONTRADICTION_OHM = 1e-6;
const NO_LOAD = 1e-6;
const HALVINGS = 30;

/**
 * The working point at full load, or where there is none the point of the greatest share of the load that can be
 * held: beyond it the voltage collapses.
 */
export function findOperatingPoint(asked: Task): Outcome {
  const alone = prepareCircuit(asked.nodeCount, asked.stiff, []);
  const broken = new Set(alone.contradictions);
  const stiff =
    broken.size === 0 ? asked.stiff : asked.stiff.map((s, i) => (broken.has(i) ? { ...s, ohm: CONTRADICTION_OHM } : s));
  // One that gives its rated current gives it into what it reaches; one that nothing closes the way round of is idle.
  const hasWay = asked.charging.map(({ a, b, atRated }) => !atRated || alone.partOf(a) === alone.partOf(b));
  const task = { ...asked, stiff, hasWay };

  const whole = solveAt(task, 1, null);
  if (whole) return { converged: broken.size === 0, heldFraction: broken.size === 0 ? 1 : 0, point: whole };

  let held = 0;
  let point = solveAt(task, NO_LOAD, null);
  let lost = 1;
  for (let halving = 0; point && halving < HALVINGS; halving++) {
    const share = (held + lost) / 2;
    const next = solveAt(task, share, null) ?? solveAt(task, share, point);
    if (next) [held, point] = [share, next];
    else lost = share;
  }
  return { converged: false, heldFraction: held, point };
}

/**
 * A point at a share of the load. The states of the charging sources are found by trying: first all that are wrong
 * change at once; then only the first of them, a rule that can't go round in a circle.
 */
function solveAt(task: Posed, share: number, near: OperatingPoint | null): OperatingPoint | null {
  const states: ChargingState[] = near
    ? [...near.chargingStates]
    : task.charging.map((_, i) => (task.hasWay[i] ? 'steady' : 'idle'));
  const stiff = task.stiff.map((branch, i) =>
    task.resistanceLoads.has(i) ? { ...branch, ohm: branch.ohm / share } : branch,
  );
  const most = 20 + 10 * task.charging.length;
  for (let attempt = 0; attempt < most; attempt++) {
    const point = solveInStates(task, stiff, states, share, near);
    if (!point) return null;
    const wrong = task.charging.flatMap((source, i) => {
      const right = task.hasWay[i] ? rightState(source, states[i]!, point, i) : 'idle';
      return right === states[i] ? [] : [{ i, right }];
    });
    if (wrong.length === 0) return point;
    for (const { i, right } of attempt < 8 ? wrong : wrong.slice(0, 1)) states[i] = right;
  }
  return null;
}

const SLACK = 1e-10;

function rightState(source: ChargingSource, state: ChargingState, point: OperatingPoint, i: number): ChargingState {
  const volts = point.potentials[source.a]! - point.potentials[source.b]!;
  const isMet = point.circuit.partOf(source.a) === point.circuit.partOf(source.b);
  if (source.atRated) return state === 'steady' && point.chargingA[i] === 0 && !isMet ? state : 'limited';
  const slackV = SLACK * Math.abs(source.regulatedV);
  if (state === 'limited') return volts > source.regulatedV + slackV ? 'steady' : state;
  if (state === 'idle') return isMet && volts < source.regulatedV - slackV ? 'steady' : state;
  const givenA = -point.chargingA[i]!;
  if (givenA > source.maxA * (1 + SLACK)) return 'limited';
  return givenA < -SLACK * source.maxA ? 'idle' : state;
}

function solveInStates(
  task: Task,
  stiff: readonly StiffBranch[],
  states: ChargingState[],
  share: number,
  near: OperatingPoint | null,
): OperatingPoint | null {
  // The highest voltage first: a lower one that it contradicts then knows which way.
  const order = task.charging
    .map((_, i) => i)
    .toSorted((i, j) => task.charging[j]!.regulatedV - task.charging[i]!.regulatedV);
  let circuit: Circuit;
  let steady: number[];
  do {
    steady = order.filter((i) => states[i] === 'steady');
    const holding = steady.map((i) => ({ ...ends(task.charging[i]!), ohm: 0, emfV: task.charging[i]!.regulatedV }));
    const limited = task.charging.filter((_, i) => states[i] === 'limited');
    circuit = prepareCircuit(task.nodeCount, [...stiff, ...holding], [...task.loads, ...limited.map(ends)]);
    for (const at of circuit.contradictions) {
      const i = steady[at - stiff.length];
      if (i === undefined) return null;
      const { a, b, regulatedV } = task.charging[i]!;
      states[i] = circuit.aboveV[a]! - circuit.aboveV[b]! < regulatedV ? 'limited' : 'idle';
    }
  } while (circuit.contradictions.length > 0);

  const limitedIndexes = task.charging.flatMap((_, i) => (states[i] === 'limited' ? [i] : []));
  const hasNoReturn = limitedIndexes.some(
    (i) => circuit.partOf(task.charging[i]!.a) !== circuit.partOf(task.charging[i]!.b),
  );
  if (hasNoReturn) return null;
  const limitsA = limitedIndexes.map((i) => -task.charging[i]!.maxA);
  const found = settleLoads(circuit, task.loads, limitsA, share, near?.loadVolts ?? null);
  if (!found) return null;

  const chargingA = new Float64Array(task.charging.length);
  steady.forEach((i, at) => (chargingA[i] = found.stiffA[stiff.length + at]!));
  limitedIndexes.forEach((i, at) => (chargingA[i] = limitsA[at]!));
  return {
    circuit,
    potentials: found.potentials,
    stiffA: found.stiffA.slice(0, stiff.length),
    loadA: found.loadA.slice(0, task.loads.length),
    chargingA,
    chargingStates: [...states],
    loadVolts: voltsOf(task.loads, found.potentials),
  };
}

function ends({ a, b }: LoadBranch): LoadBranch {
  return { a, b };
}

const ROUNDS = 100;

/**
 * Newton's method from the voltages without load, downward. A load takes what it takes in the direction its
 * voltage has without load; where there is none it takes nothing. Null where the loads pull the voltage down to
 * nothing or past the point of collapse.
 */
function settleLoads(
  circuit: Circuit,
  loads: readonly NonlinearLoad[],
  limitsA: readonly number[],
  share: number,
  nearVolts: Float64Array | null,
) {
  const nothing = new Float64Array(loads.length);
  const fixed = new Float64Array(limitsA.length);
  const unloaded = solveCircuit(circuit, [...nothing, ...fixed], [...nothing, ...limitsA]);
  if (!unloaded) return null;
  const unloadedV = voltsOf(loads, unloaded.potentials);
  const highest = Math.max(...unloaded.potentials.map(Math.abs), 0);
  const directions = loads.map((load, i) =>
    circuit.partOf(load.a) !== circuit.partOf(load.b) || Math.abs(unloadedV[i]!) <= 1e-9 * highest
      ? 0
      : Math.sign(unloadedV[i]!),
  );
  if (directions.every((direction) => direction === 0)) return unloaded;
  const isLinear = loads.every((load, i) => load.model === 'current' || directions[i] === 0);

  let volts: Float64Array = nearVolts ?? unloadedV;
  let lastStep = Number.POSITIVE_INFINITY;
  for (let round = 0; round < ROUNDS; round++) {
    const conductances = loads.map(({ model, amount }, i) =>
      model === 'power' && directions[i] !== 0 ? (-share * amount) / volts[i]! ** 2 : 0,
    );
    const currentsA = loads.map(({ model, amount }, i) =>
      directions[i] === 0 ? 0 : share * amount * (model === 'power' ? 2 / volts[i]! : directions[i]!),
    );
    const found = solveCircuit(circuit, [...conductances, ...fixed], [...currentsA, ...limitsA]);
    if (!found) return null;
    const next = voltsOf(loads, found.potentials);
    const isReversed = loads.some(
      ({ model }, i) => next[i]! * directions[i]! < 0 || (model === 'power' && directions[i] !== 0 && next[i] === 0),
    );
    if (isReversed) return null;
    if (isLinear) return found;
    const step = Math.max(...next.map((v, i) => (directions[i] === 0 ? 0 : Math.abs(v - volts[i]!) / Math.abs(v))));
    if (step <= 1e-15 || (step <= 1e-9 && step >= lastStep / 2)) return found;
    volts = next;
    lastStep = step;
  }
  return null;
}

function voltsOf(branches: readonly LoadBranch[], potentials: Float64Array): Float64Array {
  return Float64Array.from(branches, ({ a, b }) => potentials[a]! - potentials[b]!);
}
