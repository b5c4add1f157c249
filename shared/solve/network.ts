import type { BatteryElement, ChargingElement, Condition, ContactElement, LoadElement } from '#shared/kinds/element.ts';
import { kindOf } from '#shared/kinds/index.ts';
import { basisOf, workOf } from '#shared/model/defaults.ts';
import type { Design, Device, End, EntityId, Run } from '#shared/model/design.ts';

import { runOhm } from './conductor.ts';
import { Union } from './union.ts';

/**
 * A design as nodes and edges: what is joined by metal is one node; runs and what stands between the terminals of
 * a device are edges. Open contacts, and loads and sources that are off, are edges too (they say so), so that the
 * same network answers both "what flows" and "what could be reached". Removed work is not in it, nor is a run
 * that has lost an end.
 */
export interface Network {
  readonly nodes: readonly NetworkNode[];
  readonly edges: readonly NetworkEdge[];
  /** The node of a terminal; undefined where there is no such terminal in the network. */
  nodeAt(device: EntityId, terminal: string): number | undefined;
  /** The names of a device's terminals, of one that is removed too. */
  terminalsOf(device: Device): readonly string[];
  /** Whether a device is a piece of metal and nothing else: a busbar, a block, a bond. */
  isJoin(device: EntityId): boolean;
  /** The ways through a switch, selector, fuse or breaker; none through anything else. */
  contactsOf(device: EntityId): readonly ContactEdge[];
  /** All edges that end on a node, once each. */
  edgesAt(node: number): readonly NetworkEdge[];
}

export interface NetworkNode {
  readonly index: number;
  /** In the order of the devices' ids, then of their terminals. */
  readonly terminals: readonly End[];
  /** The busbar, block or bond it is, where it is one. */
  readonly join: Device | undefined;
}

/** Between the nodes `a` and `b`; for a run from → to, for a source or load pos → neg, else as the kind names its ways. */
export type NetworkEdge = RunEdge | MountEdge | ContactEdge | SourceEdge | LoadEdge;

interface Between {
  readonly index: number;
  readonly a: number;
  readonly b: number;
}

export interface RunEdge extends Between {
  readonly type: 'run';
  readonly run: Run;
  /** 0 where neither length nor resistance is known. */
  readonly ohm: number;
}

/** Where a device sits on a stud with no wire between: `a` its own first terminal, `b` the stud. */
export interface MountEdge extends Between {
  readonly type: 'mount';
  readonly device: Device;
  readonly terminal: string;
  readonly stud: End;
}

export interface ContactEdge extends Between {
  readonly type: 'contact';
  readonly device: Device;
  readonly element: ContactElement;
}

export interface SourceEdge extends Between {
  readonly type: 'source';
  readonly device: Device;
  readonly element: BatteryElement | ChargingElement;
}

export interface LoadEdge extends Between {
  readonly type: 'load';
  readonly device: Device;
  readonly element: LoadElement;
}

/** The network in a mode, the built-in ones included. A mode the design does not have is `all-on`. */
export function networkOf(design: Design, modeId: EntityId): Network {
  const devices = [...inOrder(design.devices)].filter((device) => workOf(device) !== 'remove');
  const points = pointsOf(devices);

  const drafts: Draft[] = [];
  const joins = new Map<EntityId, Device>();
  for (const device of devices) {
    for (const element of kindOf(device)?.network(device, conditionOf(design, modeId, device.id)) ?? []) {
      if (element.type === 'join') {
        joins.set(device.id, device);
        const joined = element.terminals.flatMap((terminal) => points.at(device.id, terminal) ?? []);
        for (const point of joined) points.metal.join(joined[0]!, point);
        continue;
      }
      const [from, to] = element.type === 'contact' ? [element.a, element.b] : [element.pos, element.neg];
      const a = points.at(device.id, from);
      const b = points.at(device.id, to);
      if (a === undefined || b === undefined) continue;
      if (element.type === 'contact') drafts.push({ type: 'contact', device, element, a, b });
      else if (element.type === 'load') drafts.push({ type: 'load', device, element, a, b });
      else drafts.push({ type: 'source', device, element, a, b });
    }
    const mount = mountOf(device, points);
    if (mount) drafts.push(mount);
  }
  const basis = basisOf(design);
  for (const run of inOrder(design.runs)) {
    if (workOf(run) === 'remove' || !isReadable(run)) continue;
    const a = points.at(run.from.device, run.from.terminal);
    const b = points.at(run.to.device, run.to.terminal);
    if (a === undefined || b === undefined) continue;
    drafts.push({ type: 'run', run, ohm: runOhm(run, basis, design.zones ?? {}) ?? 0, a, b });
  }
  return finish(points, drafts, joins);
}

/** What a mode says of a device; see `Condition`. */
export function conditionOf(design: Design, modeId: EntityId, deviceId: EntityId): Condition {
  if (modeId === 'all-charging') return { mode: 'all-charging', state: {} };
  const mode = modeId === 'all-on' ? undefined : own(design.modes, modeId);
  if (!mode) return { mode: 'all-on', state: {} };
  return { mode: 'own', state: own(mode.states, deviceId) ?? {} };
}

export interface Step {
  readonly edge: NetworkEdge;
  readonly from: number;
  readonly to: number;
}

/**
 * Walks outward from a node, nearest first by edges, over those `passes` lets through; every edge once, those it
 * stops at included: a step is told before it is asked whether the walk goes on beyond it.
 */
export function* walkFrom(
  network: Network,
  start: number,
  passes: (step: Step) => boolean,
): Generator<Step, void, undefined> {
  const seenNodes = new Set([start]);
  const seenEdges = new Set<number>();
  const queue = [start];
  for (const from of queue) {
    for (const edge of network.edgesAt(from)) {
      if (seenEdges.has(edge.index)) continue;
      seenEdges.add(edge.index);
      const step = { edge, from, to: otherEnd(edge, from) };
      yield step;
      if (seenNodes.has(step.to) || !passes(step)) continue;
      seenNodes.add(step.to);
      queue.push(step.to);
    }
  }
}

export function otherEnd(edge: NetworkEdge, node: number): number {
  return edge.a === node ? edge.b : edge.a;
}

/** Whether an edge is a conductor or a closed way: metal all through, of little resistance. */
export function isConducting(edge: NetworkEdge): boolean {
  if (edge.type === 'run' || edge.type === 'mount') return true;
  return edge.type === 'contact' && edge.element.closed;
}

type Unfinished<Edge> = Edge extends NetworkEdge ? Omit<Edge, 'index'> : never;
type Draft = Unfinished<NetworkEdge>;

/** Terminals, and which of them are one piece of metal. */
interface Points {
  readonly ends: readonly End[];
  readonly metal: Union;
  at(device: string, terminal: string): number | undefined;
  first(device: string): number | undefined;
  terminalsOf(device: string): readonly string[] | undefined;
}

function pointsOf(devices: readonly Device[]): Points {
  const ends: End[] = [];
  const byDevice = new Map<string, Map<string, number>>();
  for (const device of devices) {
    const terminals = new Map<string, number>();
    byDevice.set(device.id, terminals);
    for (const { name } of kindOf(device)?.terminals(device) ?? []) {
      terminals.set(name, ends.push({ device: device.id, terminal: name }) - 1);
    }
  }
  return {
    ends,
    metal: new Union(ends.length),
    at: (device, terminal) => byDevice.get(device)?.get(terminal),
    first: (device) => byDevice.get(device)?.values().next().value,
    terminalsOf: (device) => {
      const terminals = byDevice.get(device);
      return terminals && [...terminals.keys()];
    },
  };
}

function mountOf(device: Device, points: Points): Draft | undefined {
  const stud = device.mountedOn;
  const a = points.first(device.id);
  const b = stud && points.at(stud.device, stud.terminal);
  if (!stud || a === undefined || b === undefined || stud.device === device.id) return undefined;
  return { type: 'mount', device, terminal: points.ends[a]!.terminal, stud, a, b };
}

function finish(points: Points, drafts: readonly Draft[], joins: ReadonlyMap<EntityId, Device>): Network {
  const nodeOfRoot = new Map<number, number>();
  const terminals: End[][] = [];
  const nodeOfPoint = points.ends.map((end, point) => {
    const root = points.metal.rootOf(point);
    const node = nodeOfRoot.get(root) ?? terminals.push([]) - 1;
    nodeOfRoot.set(root, node);
    terminals[node]!.push(end);
    return node;
  });
  const edges = drafts.map(
    (draft, index) => ({ ...draft, index, a: nodeOfPoint[draft.a]!, b: nodeOfPoint[draft.b]! }) as NetworkEdge,
  );
  const edgesByNode: NetworkEdge[][] = terminals.map(() => []);
  for (const edge of edges) {
    edgesByNode[edge.a]!.push(edge);
    if (edge.b !== edge.a) edgesByNode[edge.b]!.push(edge);
  }
  const contacts = new Map<EntityId, ContactEdge[]>();
  for (const edge of edges) {
    if (edge.type !== 'contact') continue;
    const before = contacts.get(edge.device.id);
    if (before) before.push(edge);
    else contacts.set(edge.device.id, [edge]);
  }
  return {
    nodes: terminals.map((ends, index) => ({
      index,
      terminals: ends,
      join: ends.map(({ device }) => joins.get(device)).find((device) => device !== undefined),
    })),
    edges,
    nodeAt(device, terminal) {
      const point = points.at(device, terminal);
      return point === undefined ? undefined : nodeOfPoint[point];
    },
    terminalsOf: (device) =>
      points.terminalsOf(device.id) ??
      kindOf(device)
        ?.terminals(device)
        .map(({ name }) => name) ??
      [],
    isJoin: (device) => joins.has(device),
    contactsOf: (device) => contacts.get(device) ?? [],
    edgesAt: (node) => edgesByNode[node] ?? [],
  };
}

/** A document is checked before it gets here; one that was not may not stop the engine. */
function isReadable({ from, to, conductor }: Run): boolean {
  const isThere = [from, to, conductor].every((part) => part !== null && typeof part === 'object');
  return isThere && typeof conductor.size === 'string';
}

/** By id, so that the same design gives the same network whatever the order of its keys. */
function inOrder<T extends { readonly id: EntityId }>(entities: Readonly<Record<EntityId, T>> | undefined): T[] {
  return Object.keys(entities ?? {})
    .toSorted()
    .flatMap((id) => {
      const entity = entities![id];
      if (!entity || typeof entity !== 'object') return [];
      return [entity.id === id ? entity : { ...entity, id }];
    });
}

function own<T>(record: Readonly<Record<string, T>> | undefined, key: string): T | undefined {
  return record && Object.hasOwn(record, key) ? record[key] : undefined;
}
