import type { FaultAnalysis, ModeAnalysis } from '#shared/model/analysis.ts';
import { basisOf, workOf, type FullBasis } from '#shared/model/defaults.ts';
import { BUILT_IN_MODES, type Design, type Device, type EntityId, type Run } from '#shared/model/design.ts';
import type { Size } from '#shared/model/size.ts';
import { CONTINUOUS_LOAD_HOURS } from '#shared/tables/protection.ts';

import { canConduct, circuitsOf, type Circuits } from './circuits.ts';
import { ampacityOf, warmestC, zonesOf, type Ampacity } from './conductor.ts';
import { considerSources, designCurrents, type ContactCurrent, type DesignCurrent, type LeftOut } from './current.ts';
import { loadDemandOf, type LoadDemand } from './demand.ts';
import { loadDrops, type DropMode, type LoadDrop } from './drop.ts';
import { feederDrops, type FeederDrop } from './feeders.ts';
import { flowOf, type Flow } from './flow.ts';
import { networkOf, type NetworkEdge, type RunEdge, type SourceEdge } from './network.ts';
import { leastResistance, type Paths } from './paths.ts';
import { isCrankingRun, protectionOf, type EndProtection } from './protection.ts';
import { amountOf, ratingsOf } from './ratings.ts';
import { regionsOf, type Regions } from './regions.ts';
import { shortsOf, type Shorts } from './shorts.ts';
import { minimumSizeOf, recommendedSizeOf, smallestSizeOf, type SizingCase } from './sizes.ts';
import { solveFaults } from './solve-faults.ts';
import { solveMode } from './solve-mode.ts';

/** A design worked out: all that the rules judge and the analysis tells. */
export interface Proof {
  readonly design: Design;
  readonly basis: FullBasis;
  readonly circuits: Circuits;
  readonly regions: Regions;
  /** In service, by id: not what the job removes. */
  readonly devices: readonly Device[];
  readonly runs: readonly ProvedRun[];
  readonly runOf: ReadonlyMap<EntityId, ProvedRun>;
  /** By protective device: the runs whose protection it is, alone or side by side with others. */
  readonly guardedBy: ReadonlyMap<EntityId, readonly { readonly run: ProvedRun; readonly end: EndProtection }[]>;
  /** By run: those whose unprotected way to the source begins with it. */
  readonly runsBehind: ReadonlyMap<EntityId, readonly EntityId[]>;
  readonly shorts: Shorts;
  readonly loads: readonly LoadDemand[];
  readonly drops: readonly LoadDrop[];
  readonly feeders: readonly FeederDrop[];
  readonly modes: ReadonlyMap<EntityId, ModeAnalysis>;
  readonly faults: Readonly<Record<EntityId, FaultAnalysis>>;
  /** The greatest design current through a switch or protective device. */
  currentThrough(device: EntityId): ContactCurrent;
  /** Of that, what loads that are on for hours take. */
  longLoadThrough(device: EntityId): number;
}

export interface ProvedRun {
  readonly id: EntityId;
  readonly run: Run;
  readonly edge: RunEdge;
  /** Signal and data runs are outside the ampacity and drop rules. */
  readonly isSignal: boolean;
  /** On the path between a battery and a starter, out or back. */
  readonly isCranking: boolean;
  readonly nominalV: number;
  readonly ampacity: Ampacity;
  readonly designCurrentA: number;
  readonly governingMode: EntityId | null;
  readonly protection: readonly EndProtection[];
  /** The load it serves whose drop is worst against its limit. */
  readonly worstDrop: LoadDrop | undefined;
  readonly minimum: Size | undefined;
  readonly sizing: SizingCase;
  readonly smallestSize: Size | null;
  readonly recommendedSize: Size | null;
}

/** Loads that are electronics, whose wires may be thin (E-11, 33 CFR 183.425(g)). */
const ELECTRONICS: ReadonlySet<string> = new Set(['radio', 'instrument']);

export function proveDesign(design: Design): Proof {
  const basis = basisOf(design);
  const modeIds = [...BUILT_IN_MODES, ...ownModes(design)];
  const networks = new Map(modeIds.map((mode) => [mode, networkOf(design, mode)] as const));
  const modes = new Map(modeIds.map((mode) => [mode, solveMode(design, mode, networks.get(mode))] as const));
  const network = networks.get('all-on')!;
  const circuits = circuitsOf(network, design, basis);
  const regions = regionsOf(circuits, basis);
  const loads = network.edges.flatMap((edge) => (edge.type === 'load' ? [loadDemandOf(edge)] : []));

  const flows = new Map(modeIds.map((mode) => [mode, flowOf(network, modes.get(mode)!, circuits)] as const));
  const supplies = suppliesOf(circuits);
  const allOn = flows.get('all-on')!;
  const leftOut = loads
    .filter((load) => load.demand !== 'cranking' && allOn.currentOf(load.edge) <= 1e-9)
    .flatMap((load): LeftOut[] => {
      const edges = supplies.toLoad(load);
      return edges.length > 0 ? [{ load, edges }] : [];
    });

  const bundled = bundledConductors(circuits);
  const ampacities = new Map(
    circuits.runs.map(({ run, a, b }) => [
      run.id,
      ampacityOf(run, basis, design.zones ?? {}, bundled(run), circuitV(circuits, a, b)),
    ]),
  );
  const own = ownModes(design).map((mode) => ({ mode, flow: flows.get(mode)! }));
  const charging = flows.get('all-charging')!;
  const reckoned = designCurrents(design, basis, circuits, loads, leftOut, allOn, charging, own, ampacities);
  const currents = reckoned.runs;
  considerSources(circuits, charging, supplies.ofSource, currents);

  const judged = own.map(({ mode }) => mode);
  const dropModes = (ids: readonly EntityId[]): DropMode[] =>
    ids.map((mode) => ({
      mode,
      flow: flows.get(mode)!,
      network: networks.get(mode)!,
      circuits,
    }));
  const byOwnModes = loadDrops(loads, dropModes(judged), basis);
  const judgedLoads = new Set(byOwnModes.map((drop) => drop.load.device.id));
  const others = loads.filter((load) => !judgedLoads.has(load.device.id));
  // A load that no mode of the design turns on is still judged, as all-on has it.
  const drops = [...byOwnModes, ...loadDrops(others, dropModes(['all-on']), basis)];

  const electronics = electronicRuns(supplies, loads);
  const byRun = dropsByRun(drops);
  const runs = circuits.runs.map((edge) =>
    proveRun(edge, design, basis, circuits, regions, ampacities, currents, byRun, bundled, electronics),
  );
  const longByEdge = new Map(
    loads.filter((load) => isLong(load, design, flows)).map((load) => [load.edge.index, load.heldA]),
  );
  const longLoad = allOn.spread((edge) => longByEdge.get(edge.index) ?? 0);
  const runOf = new Map(runs.map((run) => [run.id, run]));
  return {
    design,
    basis,
    circuits,
    regions,
    devices: inService(design),
    runs,
    runOf,
    guardedBy: guardedByDevice(runs),
    runsBehind: runsBehind(runs),
    shorts: shortsOf(circuits),
    loads,
    drops,
    feeders: feederDrops(drops, circuits, basis, reckoned.demandOn),
    modes,
    faults: solveFaults(design, network),
    currentThrough: (device) => {
      const through = network.contactsOf(device).map((edge) => reckoned.contactAt(edge));
      return {
        lastingA: Math.max(0, ...through.map(({ lastingA }) => lastingA)),
        momentaryA: Math.max(0, ...through.map(({ momentaryA }) => momentaryA)),
      };
    },
    longLoadThrough: (device) => Math.max(0, ...network.contactsOf(device).map((edge) => longLoad[edge.index]!)),
  };
}

export function ownModes(design: Design): EntityId[] {
  return Object.keys(design.modes ?? {})
    .filter((id) => !BUILT_IN_MODES.some((builtIn) => builtIn === id))
    .toSorted();
}

/** By the hours that the load tells, else by those of the design's modes that hold it. */
function isLong({ device, edge }: LoadDemand, design: Design, flows: ReadonlyMap<EntityId, Flow>): boolean {
  const byModes = () =>
    ownModes(design)
      .filter((mode) => flows.get(mode)!.currentOf(edge) > 1e-9)
      .reduce((sum, mode) => sum + (design.modes[mode]?.hoursPerDay ?? 0), 0);
  return (amountOf(ratingsOf(device), 'hoursPerDay') ?? byModes()) >= CONTINUOUS_LOAD_HOURS;
}

function inService(design: Design): Device[] {
  return Object.keys(design.devices ?? {})
    .toSorted()
    .map((id) => design.devices[id]!)
    .filter((device) => workOf(device) !== 'remove');
}

function proveRun(
  edge: RunEdge,
  design: Design,
  basis: FullBasis,
  circuits: Circuits,
  regions: Regions,
  ampacities: ReadonlyMap<EntityId, Ampacity>,
  currents: ReadonlyMap<EntityId, DesignCurrent>,
  drops: ReadonlyMap<EntityId, RunDrops>,
  bundled: (run: Run) => number,
  electronics: ReadonlySet<EntityId>,
): ProvedRun {
  const { run } = edge;
  const isSignal = circuits.isSignal(run);
  const ampacity = ampacities.get(run.id)!;
  const current = currents.get(run.id) ?? { designCurrentA: 0, governingMode: null };
  const nominalV = circuitV(circuits, edge.a, edge.b);
  const protection = protectionOf(edge, circuits, regions, ampacities, basis);
  const isElectronics = electronics.has(run.id) && protection.some((end) => end.device !== undefined);
  const isReturn = circuits.netOf(edge.a).side === 'return';
  const minimum = isSignal
    ? undefined
    : minimumSizeOf({
        run,
        basis,
        nominalV,
        designCurrentA: current.designCurrentA,
        isElectronics: electronics.has(run.id) && (isElectronics || isReturn),
      });
  const served = drops.get(run.id);
  const sizing: SizingCase = {
    run,
    basis,
    zones: zonesOf(run, design.zones ?? {}),
    warmestC: warmestC(run, basis, design.zones ?? {}),
    bundled: bundled(run),
    nominalV,
    designCurrentA: current.designCurrentA,
    dropShare: served?.share ?? Infinity,
    protection,
    minimum,
  };
  return {
    id: run.id,
    run,
    edge,
    isSignal,
    isCranking: isCrankingRun(run.id, regions),
    nominalV,
    ampacity,
    ...current,
    protection,
    worstDrop: served?.worst,
    minimum,
    sizing,
    smallestSize: isSignal ? null : smallestSizeOf(sizing),
    recommendedSize: isSignal ? null : recommendedSizeOf(sizing),
  };
}

function guardedByDevice(runs: readonly ProvedRun[]) {
  const guarded = new Map<EntityId, { run: ProvedRun; end: EndProtection }[]>();
  for (const run of runs) {
    for (const end of run.protection) {
      if (!end.device || end.allowedRatingA === undefined) continue;
      for (const { id } of [end.device, ...(end.beside ?? [])]) {
        const before = guarded.get(id);
        if (before) before.push({ run, end });
        else guarded.set(id, [{ run, end }]);
      }
    }
  }
  return guarded;
}

function runsBehind(runs: readonly ProvedRun[]): ReadonlyMap<EntityId, readonly EntityId[]> {
  const behind = new Map<EntityId, EntityId[]>();
  for (const { id, protection } of runs) {
    for (const { ahead } of protection) {
      if (ahead === undefined) continue;
      const before = behind.get(ahead);
      if (before) before.push(id);
      else behind.set(ahead, [id]);
    }
  }
  return behind;
}

interface RunDrops {
  readonly worst: LoadDrop;
  readonly share: number;
}

/** Of each run the worst load it serves, and how much of its own resistance the loads would let it keep. */
function dropsByRun(drops: readonly LoadDrop[]): Map<EntityId, RunDrops> {
  const byRun = new Map<EntityId, RunDrops>();
  for (const drop of drops) {
    if (!drop.isKnown) continue;
    const spareV = drop.limit * drop.load.nominalV - drop.volts;
    drop.path.forEach((run, i) => {
      const volts = drop.voltsOf[i]!;
      const share = volts > 1e-12 ? Math.max(0, (volts + spareV) / volts) : Infinity;
      const before = byRun.get(run.id);
      const isWorse = !before || drop.fraction / drop.limit > before.worst.fraction / before.worst.limit;
      byRun.set(run.id, {
        worst: isWorse ? drop : before.worst,
        share: Math.min(share, before?.share ?? Infinity),
      });
    });
  }
  return byRun;
}

function circuitV(circuits: Circuits, a: number, b: number): number {
  return Math.max(circuits.nominalVOf(a), circuits.nominalVOf(b));
}

/** The loaded cores of a cable count with what the run says itself; a protective conductor carries nothing. */
function bundledConductors(circuits: Circuits): (run: Run) => number {
  const cores = new Map<EntityId, number>();
  for (const { run } of circuits.runs) {
    if (run.cable === undefined || circuits.isSignal(run) || run.colour?.startsWith('green')) continue;
    cores.set(run.cable, (cores.get(run.cable) ?? 0) + 1);
  }
  return (run) => Math.max(run.conductor?.bundled ?? 1, cores.get(run.cable ?? '') ?? 1);
}

interface Supplies {
  toLoad(load: LoadDemand): NetworkEdge[];
  ofSource(source: SourceEdge): NetworkEdge[];
}

/** The ways of least resistance from batteries, with every switch as it can stand, found once a battery. */
function suppliesOf(circuits: Circuits): Supplies {
  const { network } = circuits;
  const batteries = network.edges.filter((edge) => edge.type === 'source' && edge.element.type === 'battery');
  const known = new Map<number, Paths>();
  const from = (node: number) => {
    const paths = known.get(node) ?? leastResistance(network, node, canConduct);
    known.set(node, paths);
    return paths;
  };
  const way = (pos: number, neg: number): NetworkEdge[] => {
    for (const battery of batteries) {
      if (circuits.netOf(battery.a) !== circuits.netOf(pos)) continue;
      const feed = from(battery.a);
      if (!feed.reaches(pos)) continue;
      const back = batteries.map((each) => from(each.b)).find((paths) => paths.reaches(neg));
      if (back) return [...feed.to(pos), ...back.to(neg)].map((step) => step.edge);
    }
    return [];
  };
  return {
    toLoad: (load) => way(load.edge.a, load.edge.b),
    ofSource: (source) => way(source.a, source.b),
  };
}

/** Runs that serve nothing but electronics: of every load's way, those on the way of no other load. */
function electronicRuns(supplies: Supplies, loads: readonly LoadDemand[]): ReadonlySet<EntityId> {
  const electronics = loads.filter((load) => ELECTRONICS.has(load.device.symbol ?? ''));
  if (electronics.length === 0) return new Set();
  const serves = (some: readonly LoadDemand[]) =>
    new Set(
      some.flatMap((load) => supplies.toLoad(load)).flatMap((edge) => (edge.type === 'run' ? [edge.run.id] : [])),
    );
  const byOthers = serves(loads.filter((load) => !electronics.includes(load)));
  return new Set([...serves(electronics)].filter((run) => !byOthers.has(run)));
}
