import type { Device, EntityId } from '#shared/model/design.ts';

import { canConduct, type Circuits } from './circuits.ts';
import type { SourceEdge } from './network.ts';
import { leastResistance } from './paths.ts';

/** A way of metal from the positive of a source round to the negative of it or of one that stands against it. */
export interface DirectShort {
  readonly source: Device;
  readonly voltsRound: number;
  /** Its runs, from the positive on. */
  readonly runs: readonly EntityId[];
  /** A switch or selector on the way that makes it only when closed. */
  readonly closing: Device | undefined;
}

/** A difference above this share of the smaller source is a reversed or a shorted one, not a mismatch of systems. */
const SHORT_FROM = 1.5;

/** One a net: the sources that a single wrong wire shorts are one cause. */
export function directShortsOf(circuits: Circuits): DirectShort[] {
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
