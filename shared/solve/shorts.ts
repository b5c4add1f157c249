import type { Device, EntityId } from '#shared/model/design.ts';

import { canConduct, type Circuits } from './circuits.ts';
import type { RunEdge, SourceEdge } from './network.ts';
import { leastResistance } from './paths.ts';
import { Union } from './union.ts';

/** A way of metal from the positive of a source round to the negative of it or of one that stands against it. */
export interface DirectShort {
  readonly source: Device;
  readonly voltsRound: number;
  /** Its runs, from the positive on. */
  readonly runs: readonly EntityId[];
  /** A switch or selector on the way that makes it only when closed. */
  readonly closing: Device | undefined;
}

/** What a short circuit takes with it: figures and findings that it alone is the cause of. */
export interface Shorts {
  readonly all: readonly DirectShort[];
  /** The sources that feed this node are shorted: what is solved there are the figures of the short. */
  isShorted(node: number): boolean;
  /** The run is fed only by way of the short: without it, it is a return or dead. */
  isFedByShort(edge: RunEdge): boolean;
}

export function shortsOf(circuits: Circuits): Shorts {
  const all = directShortsOf(circuits);
  if (all.length === 0) return { all, isShorted: () => false, isFedByShort: () => false };
  const { network } = circuits;
  const islands = new Set<number>();
  const fed = new Set<number>();
  const onWay = new Set(all.flatMap(({ runs }) => runs));
  const without = new Union(network.nodes.length);
  for (const edge of network.edges) {
    const isOnWay = edge.type === 'run' && onWay.has(edge.run.id);
    if (canConduct(edge) && !isOnWay) without.join(edge.a, edge.b);
  }
  const shorted = new Set(all.map(({ source }) => source.id));
  for (const edge of network.edges) {
    if (edge.type !== 'source') continue;
    fed.add(without.rootOf(edge.a));
    if (shorted.has(edge.device.id)) islands.add(circuits.islandOf(circuits.netOf(edge.a)));
  }
  const isShorted = (node: number) => islands.has(circuits.islandOf(circuits.netOf(node)));
  return {
    all,
    isShorted,
    isFedByShort: ({ a, b, run }) =>
      isShorted(a) && !onWay.has(run.id) && ![a, b].some((node) => fed.has(without.rootOf(node))),
  };
}

/** A difference above this share of the smaller source is a reversed or a shorted one, not a mismatch of systems. */
const SHORT_FROM = 1.5;

/** One a net: the sources that a single wrong wire shorts are one cause. */
function directShortsOf(circuits: Circuits): DirectShort[] {
  return circuits.nets.flatMap((net) => {
    const batteries = net.positives.filter((edge) => edge.element.type === 'battery');
    const own = batteries.find((battery) => circuits.netOf(battery.b) === net);
    if (own) return [shortBetween(circuits, own, own.a, own.b, voltsOf(own))];
    const crossed = batteries.flatMap((one) => {
      const against = net.negatives.find((other) => {
        if (other === one || other.element.type !== 'battery') return false;
        return circuits.netOf(other.a) === circuits.netOf(one.b);
      });
      return against ? [{ one, against }] : [];
    })[0];
    if (!crossed) return [];
    const { one, against } = crossed;
    const volts = voltsOf(one) + voltsOf(against);
    const isFirst = circuits.netOf(one.a).index < circuits.netOf(one.b).index;
    const isShort = isFirst && volts >= SHORT_FROM * Math.min(voltsOf(one), voltsOf(against));
    return isShort ? [shortBetween(circuits, one, one.a, against.b, volts)] : [];
  });
}

function voltsOf({ element }: SourceEdge): number {
  return element.type === 'battery' ? element.nominalV : element.regulatedV;
}

function shortBetween(
  circuits: Circuits,
  source: SourceEdge,
  from: number,
  to: number,
  voltsRound: number,
): DirectShort {
  const steps = leastResistance(circuits.network, from, canConduct).to(to);
  const open = steps.find(({ edge }) => edge.type === 'contact' && !edge.element.closed)?.edge;
  return {
    source: source.device,
    voltsRound,
    runs: steps.flatMap(({ edge }) => (edge.type === 'run' ? [edge.run.id] : [])),
    closing: open?.type === 'contact' ? open.device : undefined,
  };
}
