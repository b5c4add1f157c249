import { kindOf } from '#shared/kinds/index.ts';
import type { ModeAnalysis, SolvedDevice, SolvedRun, SolvedState } from '#shared/model/analysis.ts';
import { workOf } from '#shared/model/defaults.ts';
import type { Design, Device, EntityId } from '#shared/model/design.ts';

import { batteryBehind } from './battery.ts';
import { networkOf, type Network, type NetworkEdge } from './network.ts';
import { findOperatingPoint, type ChargingSource, type NonlinearLoad, type Outcome } from './operating-point.ts';
import type { StiffBranch } from './circuit.ts';

/**
 * A design solved in one mode, built-in or its own. It never throws and every number is finite, whatever the
 * design: what can't be worked out is zero, and `converged` is false.
 */
export function solveMode(design: Design, modeId: EntityId, network = networkOf(design, modeId)): ModeAnalysis {
  const plan = planOf(network);
  const outcome = findOperatingPoint(plan);
  const flows = flowsOf(network, plan, outcome);
  if (!flows) return present(design, network, emptyFlows(network), false, 0);
  return present(design, network, flows, outcome.converged, outcome.heldFraction);
}

/** Where each edge of the network went in what is solved; -1 where it is not in it. */
interface Plan {
  readonly nodeCount: number;
  readonly stiff: StiffBranch[];
  readonly resistanceLoads: Set<number>;
  readonly loads: NonlinearLoad[];
  readonly charging: ChargingSource[];
  readonly stiffAt: Int32Array;
  readonly loadAt: Int32Array;
  readonly chargingAt: Int32Array;
}

function planOf(network: Network): Plan {
  const absent = () => new Int32Array(network.edges.length).fill(-1);
  const plan: Plan = {
    nodeCount: network.nodes.length,
    stiff: [],
    resistanceLoads: new Set(),
    loads: [],
    charging: [],
    stiffAt: absent(),
    loadAt: absent(),
    chargingAt: absent(),
  };
  for (const edge of network.edges) planEdge(plan, edge);
  return plan;
}

function planEdge(plan: Plan, edge: NetworkEdge): void {
  const { a, b, index } = edge;
  const stiffen = (ohm: number, emfV = 0) => {
    if (Number.isFinite(ohm) && ohm >= 0 && Number.isFinite(emfV))
      plan.stiffAt[index] = plan.stiff.push({ a, b, ohm, emfV }) - 1;
  };
  if (edge.type === 'run') stiffen(edge.ohm);
  if (edge.type === 'mount') stiffen(0);
  if (edge.type === 'contact' && edge.element.closed) stiffen(edge.element.ohm);
  if (edge.type === 'source' && edge.element.type === 'battery') {
    const { ohm, emfV } = batteryBehind(edge.element, 'working');
    stiffen(ohm, emfV);
  }
  if (edge.type === 'source' && edge.element.type === 'charging') {
    const { on, maxA, regulatedV, atRated } = edge.element;
    if (on && maxA > 0 && regulatedV > 0)
      plan.chargingAt[index] = plan.charging.push({ a, b, maxA, regulatedV, atRated }) - 1;
  }
  if (edge.type === 'load' && edge.element.on && edge.element.fraction > 0) {
    const { model, amount, fraction } = edge.element;
    if (model === 'resistance') {
      stiffen(amount / fraction);
      if (plan.stiffAt[index] !== -1) plan.resistanceLoads.add(plan.stiffAt[index]!);
    } else plan.loadAt[index] = plan.loads.push({ a, b, model, amount: amount * fraction }) - 1;
  }
}

/** By edge: current from `a` to `b`, and what the edge takes; by node: potential, and whether anything feeds it. */
interface Flows {
  readonly amps: Float64Array;
  readonly watts: Float64Array;
  readonly volts: Float64Array;
  readonly potentials: Float64Array;
  readonly isLive: (node: number) => boolean;
  readonly isLimited: (edge: number) => boolean;
}

function emptyFlows(network: Network): Flows {
  const edges = () => new Float64Array(network.edges.length);
  const potentials = new Float64Array(network.nodes.length);
  return { amps: edges(), watts: edges(), volts: edges(), potentials, isLive: () => false, isLimited: () => false };
}

/** Undefined where a figure is not finite. */
function flowsOf(network: Network, plan: Plan, { point }: Outcome): Flows | undefined {
  if (!point) return undefined;
  const { partOf } = point.circuit;
  const flows = emptyFlows(network);
  const references = new Map<number, number>();
  const live = new Set<number>();
  for (const edge of network.edges) {
    if (edge.type !== 'source') continue;
    if (!references.has(partOf(edge.b))) references.set(partOf(edge.b), edge.b);
    const charging = plan.chargingAt[edge.index]!;
    const stiff = plan.stiff[plan.stiffAt[edge.index]!];
    if (charging !== -1 ? point.chargingStates[charging] !== 'idle' : stiff !== undefined && stiff.emfV !== 0) {
      live.add(partOf(edge.a)).add(partOf(edge.b));
    }
  }
  network.nodes.forEach((_, node) => {
    const reference = references.get(partOf(node));
    if (!live.has(partOf(node)) || reference === undefined) return;
    flows.potentials[node] = point.potentials[node]! - point.potentials[reference]!;
  });
  for (const { index, a, b } of network.edges) {
    const stiff = plan.stiffAt[index]!;
    const load = plan.loadAt[index]!;
    const charging = plan.chargingAt[index]!;
    if (stiff !== -1) {
      const { ohm, emfV } = point.circuit.stiff[stiff]!;
      flows.amps[index] = point.stiffA[stiff]!;
      flows.volts[index] = emfV + ohm * flows.amps[index];
    } else {
      flows.amps[index] = load !== -1 ? point.loadA[load]! : charging !== -1 ? point.chargingA[charging]! : 0;
      flows.volts[index] = point.potentials[a]! - point.potentials[b]!;
    }
    flows.watts[index] = flows.volts[index] * flows.amps[index] || 0;
  }
  const isFinite = [flows.amps, flows.watts, flows.volts, flows.potentials].every((all) => all.every(Number.isFinite));
  if (!isFinite) return undefined;
  return {
    ...flows,
    isLive: (node) => live.has(partOf(node)),
    isLimited: (edge) => point.chargingStates[plan.chargingAt[edge]!] === 'limited',
  };
}

function present(
  design: Design,
  network: Network,
  flows: Flows,
  converged: boolean,
  heldFraction: number,
): ModeAnalysis {
  const devices: Record<EntityId, SolvedDevice> = {};
  const runs: Record<EntityId, SolvedRun> = {};
  for (const id of Object.keys(design.runs ?? {})) runs[id] = { currentA: 0, voltageDropV: 0, lossW: 0 };
  const arriving = new Map<string, number>();
  const arrive = (device: string, terminal: string, amps: number) => {
    const key = `${device} ${terminal}`;
    arriving.set(key, (arriving.get(key) ?? 0) + amps);
  };
  const edgesByDevice = new Map<EntityId, NetworkEdge[]>();
  for (const edge of network.edges) {
    const amps = flows.amps[edge.index]!;
    if (edge.type === 'run') {
      arrive(edge.run.from.device, edge.run.from.terminal, -amps);
      arrive(edge.run.to.device, edge.run.to.terminal, amps);
      runs[edge.run.id] = {
        currentA: amps + 0,
        voltageDropV: flows.volts[edge.index]! + 0,
        lossW: flows.watts[edge.index]! + 0,
      };
    } else if (edge.type === 'mount') {
      arrive(edge.device.id, edge.terminal, -amps);
      arrive(edge.stud.device, edge.stud.terminal, amps);
    } else {
      const edges = edgesByDevice.get(edge.device.id) ?? [];
      edgesByDevice.set(edge.device.id, edges);
      edges.push(edge);
    }
  }
  for (const [id, device] of Object.entries(design.devices ?? {})) {
    if (!device || typeof device !== 'object') continue;
    devices[id] = presentDevice({ ...device, id }, edgesByDevice.get(id) ?? [], network, flows, arriving);
  }
  return { converged, heldFraction, devices, runs };
}

/** The terminal whose current is the device's, the first there is. */
const MAIN_TERMINALS = ['pos', 'a', 'inPos', 'batPos', 'common', 'l', 'acInL'];

function presentDevice(
  device: Device,
  edges: readonly NetworkEdge[],
  network: Network,
  flows: Flows,
  arriving: ReadonlyMap<string, number>,
): SolvedDevice {
  const isJoin =
    edges.length === 0 && kindOf(device)?.network(device, { mode: 'all-on', state: {} })[0]?.type === 'join';
  const into = new Map<string, number>();
  let powerW = 0;
  for (const edge of edges) {
    const [a, b] = terminalsOfEdge(edge);
    into.set(a, (into.get(a) ?? 0) + flows.amps[edge.index]!);
    into.set(b, (into.get(b) ?? 0) - flows.amps[edge.index]!);
    powerW += flows.watts[edge.index]!;
  }
  const terminals: Record<string, { potentialV: number; currentA: number }> = {};
  let inflowA = 0;
  for (const name of network.terminalsOf(device)) {
    const node = network.nodeAt(device.id, name);
    const currentA = (isJoin ? arriving.get(`${device.id} ${name}`) : into.get(name)) ?? 0;
    if (currentA > 0) inflowA += currentA;
    // Adding 0 turns -0 into 0.
    terminals[name] = { potentialV: (node === undefined ? 0 : flows.potentials[node]!) + 0, currentA: currentA + 0 };
  }
  const main = MAIN_TERMINALS.find((name) => name in terminals);
  const currentA = isJoin || main === undefined ? inflowA : terminals[main]!.currentA;
  return { terminals, currentA, powerW: powerW + 0, state: stateOf(device, edges, isJoin, network, flows) };
}

function terminalsOfEdge(edge: NetworkEdge): readonly [string, string] {
  if (edge.type === 'contact') return [edge.element.a, edge.element.b];
  if (edge.type === 'source' || edge.type === 'load') return [edge.element.pos, edge.element.neg];
  return ['', ''];
}

function stateOf(
  device: Device,
  edges: readonly NetworkEdge[],
  isJoin: boolean,
  network: Network,
  flows: Flows,
): SolvedState {
  if (workOf(device) === 'remove') return 'removed';
  if (isJoin) {
    const node = network.nodeAt(device.id, network.terminalsOf(device)[0] ?? '');
    return node !== undefined && flows.isLive(node) ? 'on' : 'dead';
  }
  const [edge] = edges;
  if (!edge) return kindOf(device) ? 'off' : 'dead';
  if (edge.type === 'contact')
    return edges.some((way) => way.type === 'contact' && way.element.closed) ? 'closed' : 'open';
  if (edge.type === 'load') {
    if (!edge.element.on || !(edge.element.fraction > 0)) return 'off';
    return flows.amps[edge.index] === 0 ? 'dead' : 'on';
  }
  if (edge.type === 'source' && edge.element.type === 'charging') {
    if (!edge.element.on) return 'off';
    return flows.isLimited(edge.index) ? 'limited' : 'on';
  }
  return 'on';
}
