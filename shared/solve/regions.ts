import type { FullBasis } from '#shared/model/defaults.ts';
import type { Device, EntityId, Run } from '#shared/model/design.ts';

import { canConduct, type Bank, type Circuits } from './circuits.ts';
import { otherEnd, type ContactEdge, type Network, type NetworkEdge } from './network.ts';
import { amountOf, ratingsOf } from './ratings.ts';
import { Union } from './union.ts';

/**
 * What lies on one side of a run, up to the first protective devices. A region is what conductors and switches
 * join with no protective device between; protection is judged region by region, each run by its two sides.
 */
export interface Side {
  /** The nearest source of fault current that nothing protects on the way. */
  readonly source?: Reach;
  /** The nearest protective device, whichever way it feeds. */
  readonly nearest?: Reach;
  /** The first devices of greatest rating: all of them, and those that feed this region. */
  readonly largest?: Guard;
  readonly feeding?: Guard;
  readonly feeders?: readonly Guard[];
  /** The nearest of those that feed it. */
  readonly feeder?: Reach;
  /** A battery that stands on another with its negative here: the link between them is inside their bank. */
  readonly stacked?: Bank;
  readonly hasBattery: boolean;
  readonly hasStarter: boolean;
}

/** What has to open before a fault is cut off: a protective device, and those that stand side by side with it. */
export interface Guard {
  readonly device: Device;
  readonly beside: readonly Device[];
  /** Of all of them together; undefined where one does not say. */
  readonly ratedA: number | undefined;
}

/** A way along the conductors. */
export interface Reach {
  readonly device: Device;
  readonly lengthM: number;
  /** Lengths that nobody has told yet count as nothing and are marked here. */
  readonly isLengthKnown: boolean;
  readonly covering: Covering;
  readonly bank?: Bank;
  readonly way: Way | undefined;
  /** Of a source reached along a cranking path, which is exempt: the way from the stud where it is left. */
  readonly tap?: Reach;
}

/** Worst first. */
export type Covering = 'bare' | 'untold' | 'enclosed';

export interface Way {
  readonly run: Run;
  readonly beyond: Way | undefined;
}

export interface Regions {
  /** What lies on the two sides of a run: beyond its `from` end and beyond its `to` end. */
  sidesOf(run: EntityId): { readonly from: Side; readonly to: Side } | undefined;
  /** Whether a protective device is the first one in series with a battery. */
  isMain(device: EntityId): boolean;
  /** The one device through which all current comes that can reach a device; undefined where there are more ways. */
  onlyOneAhead(device: EntityId): Guard | undefined;
  /** Protective devices ahead of a device, the nearest first, as far as one feeds the other. */
  upstreamOf(device: EntityId): readonly EntityId[];
}

const NOTHING: Side = { hasBattery: false, hasStarter: false };

export function regionsOf(circuits: Circuits, basis: FullBasis): Regions {
  const { network } = circuits;
  const regions = new Union(network.nodes.length);
  const inner = network.edges.filter(isInner).toSorted((a, b) => lengthOf(a) - lengthOf(b) || a.index - b.index);
  const isBranch = new Set<number>();
  for (const edge of inner) if (regions.join(edge.a, edge.b)) isBranch.add(edge.index);

  const gates = network.edges
    .filter((edge) => isGate(edge))
    .filter((gate) => regions.rootOf(gate.a) !== regions.rootOf(gate.b));
  const gatesAt = new Map<number, ContactEdge[]>();
  const gatesOf = new Map<EntityId, ContactEdge[]>();
  for (const gate of gates) {
    for (const node of [gate.a, gate.b]) pushTo(gatesAt, node, gate);
    pushTo(gatesOf, gate.device.id, gate);
  }
  const guards = guardsOf(gates, regions);
  const sourcesAt = (node: number) => unprotectedSourcesAt(circuits, basis, node);
  const feeds = feedingGates(network.nodes.length, regions, gates, sourcesAt);

  const ownSide = (node: number): Side => {
    let side: Side = NOTHING;
    for (const source of sourcesAt(node)) side = merge(side, source);
    for (const gate of gatesAt.get(node) ?? []) {
      const reach: Reach = {
        device: gate.device,
        lengthM: 0,
        isLengthKnown: true,
        covering: 'enclosed',
        way: undefined,
      };
      const guard = guards.get(gate.index)!;
      const feeding = feeds.has(feedKey(gate, regions.rootOf(node))) ? guard : undefined;
      side = merge(side, {
        nearest: reach,
        largest: guard,
        feeding,
        feeders: feeding && [feeding],
        feeder: feeding && reach,
        hasBattery: false,
        hasStarter: false,
      });
    }
    for (const edge of network.edgesAt(node)) {
      if (edge.type === 'source' && edge.b === node && circuits.netOf(node).side === 'fed') {
        side = merge(side, { ...NOTHING, stacked: circuits.bankOf(edge.device.id) });
      }
      if (edge.type === 'load' && edge.device.kind === 'starter') side = merge(side, { ...NOTHING, hasStarter: true });
      if (edge.type === 'source' && edge.element.type === 'battery' && circuits.netOf(node).side === 'return') {
        side = merge(side, { ...NOTHING, hasBattery: true });
      }
    }
    return side;
  };

  const literally = passMessages(circuits, isBranch, ownSide, new Set());
  const cranking = new Set(circuits.runs.filter((edge) => isOnCrankingPath(sidesIn(literally, edge))));
  const messages = cranking.size === 0 ? literally : passMessages(circuits, isBranch, ownSide, cranking);
  const mains = new Set<EntityId>();
  for (const gate of gates) {
    const besideBattery = [gate.a, gate.b].some((node) => messages.whole(node).source?.bank !== undefined);
    if (besideBattery) mains.add(gate.device.id);
  }

  return {
    sidesOf(runId) {
      const edge = messages.edgeOf.get(runId);
      return edge && sidesIn(messages, edge);
    },
    isMain: (device) => mains.has(device),
    onlyOneAhead(deviceId) {
      const [gate, ...poles] = gatesOf.get(deviceId) ?? [];
      if (!gate || poles.length > 0) return undefined;
      const behind = [gate.a, gate.b].filter((node) => !feeds.has(feedKey(gate, regions.rootOf(node))));
      const side = behind.length === 1 ? messages.whole(behind[0]!) : NOTHING;
      const [only, ...more] = (side.feeders ?? []).filter(({ device }) => device.id !== deviceId);
      return side.source || more.length > 0 ? undefined : only;
    },
    upstreamOf(deviceId) {
      const ahead: EntityId[] = [];
      const seen = new Set([deviceId]);
      let gate = gatesOf.get(deviceId)?.[0];
      while (gate) {
        const before: Device | undefined = [gate.a, gate.b]
          .map((node) => messages.whole(node).feeding?.device)
          .find((device) => device && !seen.has(device.id));
        if (!before) break;
        seen.add(before.id);
        ahead.push(before.id);
        gate = gatesOf.get(before.id)?.[0];
      }
      return ahead;
    },
  };
}

function sidesIn(messages: Messages, edge: NetworkEdge): { readonly from: Side; readonly to: Side } {
  return { from: messages.side(edge, edge.a), to: messages.side(edge, edge.b) };
}

/** On the path from a battery, over switches and selectors, to a starter, or on the way back. */
export function isOnCrankingPath({ from, to }: { readonly from: Side; readonly to: Side }): boolean {
  return (from.hasStarter && to.hasBattery) || (to.hasStarter && from.hasBattery);
}

function pushTo<Key, Item>(lists: Map<Key, Item[]>, key: Key, item: Item): void {
  const list = lists.get(key);
  if (list) list.push(item);
  else lists.set(key, [item]);
}

function isInner(edge: NetworkEdge): boolean {
  return canConduct(edge) && !isGate(edge);
}

function isGate(edge: NetworkEdge): edge is ContactEdge {
  return edge.type === 'contact' && edge.element.protective;
}

function lengthOf(edge: NetworkEdge): number {
  return edge.type === 'run' ? (edge.run.lengthM ?? 0) : 0;
}

/** Devices that join the same two regions share the current, and only together open the way: their ratings add. */
function guardsOf(gates: readonly ContactEdge[], regions: Union): ReadonlyMap<number, Guard> {
  const together = new Map<string, ContactEdge[]>();
  for (const gate of gates) {
    const ends = [regions.rootOf(gate.a), regions.rootOf(gate.b)].toSorted((a, b) => a - b).join(' ');
    pushTo(together, ends, gate);
  }
  const guards = new Map<number, Guard>();
  for (const group of together.values()) {
    const devices = [...new Set(group.map(({ device }) => device))];
    const ratings = devices.map((device) => amountOf(ratingsOf(device), 'ratedA'));
    const ratedA = ratings.reduce((sum, each) => (sum === undefined || each === undefined ? undefined : sum + each), 0);
    for (const gate of group) {
      const beside = devices.filter((device) => device !== gate.device);
      guards.set(gate.index, { device: gate.device, beside, ratedA });
    }
  }
  return guards;
}

/** Batteries, and charging sources that say they are not self-limiting. */
function unprotectedSourcesAt(circuits: Circuits, basis: FullBasis, node: number): Side[] {
  return circuits.network.edgesAt(node).flatMap((edge): Side[] => {
    if (edge.type !== 'source') return [];
    const isUngroundedReturn = basis.dcSystem === 'ungrounded' && edge.b === node;
    if (edge.a !== node && !isUngroundedReturn) return [];
    const isBattery = edge.element.type === 'battery';
    if (!isBattery && ratingsOf(edge.device).selfLimiting !== false) return [];
    const bank = isBattery ? circuits.bankOf(edge.device.id) : undefined;
    const source: Reach = {
      device: edge.device,
      lengthM: 0,
      isLengthKnown: true,
      covering: 'enclosed',
      bank,
      way: undefined,
    };
    return [{ source, hasBattery: isBattery, hasStarter: false }];
  });
}

function feedKey(gate: ContactEdge, intoRegion: number): string {
  return `${gate.index}>${intoRegion}`;
}

/** Through which protective devices, and into which region, current can come from a source. */
function feedingGates(
  nodeCount: number,
  regions: Union,
  gates: readonly ContactEdge[],
  sourcesAt: (node: number) => readonly Side[],
): ReadonlySet<string> {
  const gatesOf = new Map<number, ContactEdge[]>();
  for (const gate of gates) {
    for (const node of [gate.a, gate.b]) {
      const region = regions.rootOf(node);
      pushTo(gatesOf, region, gate);
    }
  }
  const feeds = new Set<string>();
  const queue: { region: number; by: ContactEdge | undefined }[] = [];
  const seen = new Set<number>();
  for (let node = 0; node < nodeCount; node++) {
    const region = regions.rootOf(node);
    if (seen.has(region) || sourcesAt(node).length === 0) continue;
    seen.add(region);
    queue.push({ region, by: undefined });
  }
  const arrivals = new Map<number, number>();
  for (const { region, by } of queue) {
    const before = arrivals.get(region) ?? 0;
    if (before >= 2) continue; // all its devices have been told by then
    arrivals.set(region, before + 1);
    for (const gate of gatesOf.get(region) ?? []) {
      if (gate === by) continue;
      const beyond = regions.rootOf(regions.rootOf(gate.a) === region ? gate.b : gate.a);
      const key = feedKey(gate, beyond);
      if (feeds.has(key)) continue;
      feeds.add(key);
      queue.push({ region: beyond, by: gate });
    }
  }
  return feeds;
}

interface Messages {
  readonly edgeOf: ReadonlyMap<EntityId, NetworkEdge>;
  /** What lies beyond an edge on the side of one of its ends. */
  side(edge: NetworkEdge, end: number): Side;
  /** All that the region holds, seen from a node. */
  whole(node: number): Side;
}

/** Two passes over the spanning trees of the regions: inwards to the root and out again. Linear in the network. */
function passMessages(
  circuits: Circuits,
  isBranch: ReadonlySet<number>,
  ownSide: (node: number) => Side,
  cranking: ReadonlySet<NetworkEdge>,
): Messages {
  const { network } = circuits;
  const devices = cranking.size === 0 ? undefined : devicesOf(network);
  const extend = (side: Side, edge: NetworkEdge, to: number): Side => {
    const extended = extendAlong(side, edge);
    const { source } = extended;
    if (!source || edge.type !== 'run' || !cranking.has(edge)) return extended;
    const stud = devices!.get((edge.b === to ? edge.run.to : edge.run.from).device) ?? source.device;
    const tap: Reach = { device: stud, lengthM: 0, isLengthKnown: true, covering: 'enclosed', way: undefined };
    return { ...extended, source: { ...source, tap } };
  };
  const order: number[] = [];
  const parentEdge: (NetworkEdge | undefined)[] = network.nodes.map(() => undefined);
  const seen = network.nodes.map(() => false);
  for (const { index: root } of network.nodes) {
    if (seen[root]) continue;
    seen[root] = true;
    const start = order.push(root) - 1;
    for (let at = start; at < order.length; at++) {
      for (const edge of network.edgesAt(order[at]!)) {
        const to = otherEnd(edge, order[at]!);
        if (!isBranch.has(edge.index) || seen[to]) continue;
        seen[to] = true;
        parentEdge[to] = edge;
        order.push(to);
      }
    }
  }

  const own = network.nodes.map(({ index }) => ownSide(index));
  // Below: what a node's own subtree holds. Above: what all the rest of the region holds, seen from the node's parent.
  const below: Side[] = [...own];
  for (const node of order.toReversed()) {
    const edge = parentEdge[node];
    if (!edge) continue;
    const parent = otherEnd(edge, node);
    below[parent] = merge(below[parent]!, extend(below[node]!, edge, parent));
  }
  const above: Side[] = network.nodes.map(() => NOTHING);
  for (const node of order) {
    const up = parentEdge[node];
    const children = network
      .edgesAt(node)
      .filter((edge) => isBranch.has(edge.index) && edge !== up && parentEdge[otherEnd(edge, node)] === edge);
    const fromAbove = up ? extend(above[node]!, up, node) : NOTHING;
    const parts = children.map((edge) => extend(below[otherEnd(edge, node)]!, edge, node));
    const after: Side[] = [NOTHING];
    for (const part of parts.toReversed()) after.push(merge(part, after.at(-1)!));
    let before = merge(own[node]!, fromAbove);
    children.forEach((edge, i) => {
      above[otherEnd(edge, node)] = merge(before, after[parts.length - 1 - i]!);
      before = merge(before, parts[i]!);
    });
  }

  const whole = (node: number): Side => {
    const up = parentEdge[node];
    return up ? merge(below[node]!, extend(above[node]!, up, node)) : below[node]!;
  };
  return {
    edgeOf: new Map(circuits.runs.map((edge) => [edge.run.id, edge])),
    whole,
    side(edge, end) {
      const isLower = parentEdge[end] === edge;
      if (isLower) return below[end]!;
      const other = otherEnd(edge, end);
      if (parentEdge[other] === edge) return above[other]!;
      return whole(end); // a run that closes a ring: all of the region lies on either side
    },
  };
}

function devicesOf(network: Network): ReadonlyMap<EntityId, Device> {
  const devices = new Map<EntityId, Device>();
  for (const { join } of network.nodes) if (join) devices.set(join.id, join);
  for (const edge of network.edges) if (edge.type !== 'run') devices.set(edge.device.id, edge.device);
  return devices;
}

function extendAlong(side: Side, edge: NetworkEdge): Side {
  if (edge.type === 'contact' && !carriesCranking(edge)) return { ...side, hasBattery: false, hasStarter: false };
  if (edge.type !== 'run') return side;
  return {
    ...side,
    source: along(side.source, edge.run),
    nearest: along(side.nearest, edge.run),
    feeder: along(side.feeder, edge.run),
  };
}

/** The way to a starter leads over selectors and battery switches; one that does not say what it is for may be one. */
function carriesCranking({ device }: ContactEdge): boolean {
  if (device.kind !== 'switch') return true;
  const { role } = device.ratings;
  if (role !== undefined) return role === 'battery' || role === 'emergencyParallel';
  return (amountOf(ratingsOf(device), 'continuousA') ?? 0) >= BATTERY_SWITCH_FROM_A;
}

/** No switch for a battery is made for less. */
const BATTERY_SWITCH_FROM_A = 100;

function along(reach: Reach | undefined, run: Run): Reach | undefined {
  if (!reach) return undefined;
  return {
    ...reach,
    lengthM: reach.lengthM + (run.lengthM ?? 0),
    isLengthKnown: reach.isLengthKnown && run.lengthM !== undefined,
    covering: worstCovering(reach.covering, coveringOf(run)),
    way: { run, beyond: reach.way },
    tap: along(reach.tap, run),
  };
}

/** A core of a cable lies in its jacket. A link is a part of the assembly it was bought with. */
export function coveringOf(run: Run): Covering {
  if (run.cable !== undefined || (run.enclosed !== undefined && run.enclosed !== 'none')) return 'enclosed';
  if (run.link && (run.lengthM ?? 0) === 0) return 'enclosed';
  return run.enclosed === 'none' ? 'bare' : 'untold';
}

export function worstCovering(a: Covering, b: Covering): Covering {
  if (a === 'bare' || b === 'bare') return 'bare';
  return a === 'untold' || b === 'untold' ? 'untold' : 'enclosed';
}

function merge(a: Side, b: Side): Side {
  if (a === NOTHING) return b;
  if (b === NOTHING) return a;
  return {
    source: nearer(a.source, b.source),
    nearest: nearer(a.nearest, b.nearest),
    largest: greater(a.largest, b.largest),
    feeding: greater(a.feeding, b.feeding),
    feeder: nearer(a.feeder, b.feeder),
    feeders: a.feeders && b.feeders ? [...a.feeders, ...b.feeders] : (a.feeders ?? b.feeders),
    stacked: a.stacked ?? b.stacked,
    hasBattery: a.hasBattery || b.hasBattery,
    hasStarter: a.hasStarter || b.hasStarter,
  };
}

function nearer(a: Reach | undefined, b: Reach | undefined): Reach | undefined {
  if (!a || !b) return a ?? b;
  const [toA, toB] = [(a.tap ?? a).lengthM, (b.tap ?? b).lengthM];
  if (toA !== toB) return toA < toB ? a : b;
  if (!a.tap !== !b.tap) return a.tap ? b : a;
  return a.device.id <= b.device.id ? a : b;
}

export function greater(a: Guard | undefined, b: Guard | undefined): Guard | undefined {
  if (!a || !b) return a ?? b;
  const [ofA, ofB] = [a.ratedA ?? Infinity, b.ratedA ?? Infinity];
  if (ofA !== ofB) return ofA > ofB ? a : b;
  return a.device.id <= b.device.id ? a : b;
}
