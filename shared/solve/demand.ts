import type { Device } from '#shared/model/design.ts';

import type { LoadEdge } from './network.ts';
import { amountOf, ratingsOf, type Ratings } from './ratings.ts';

export type Demand = 'continuous' | 'intermittent' | 'momentary' | 'cranking';

/** What a load asks of the conductors that serve it. */
export interface LoadDemand {
  readonly edge: LoadEdge;
  readonly device: Device;
  readonly demand: Demand;
  readonly nominalV: number;
  /** What it takes at nominal voltage, A. */
  readonly workingA: number;
  /** What counts for ampacity and ratings: a constant-power consumer at its low cut-out. */
  readonly heldA: number;
  readonly dropClass: 'critical' | 'general';
  readonly minV: number | undefined;
  readonly onMinutes: number;
}

/** Of a 12 V consumer that does not say at what voltage it gives up. */
const LOW_CUT_OUT_PER_NOMINAL_V = 10.5 / 12;
/** The longest that a load counts as momentary, and what counts where nobody says how long. */
const MOST_MOMENTARY_MINUTES = 10;

export function loadDemandOf(edge: LoadEdge): LoadDemand {
  const { device, element } = edge;
  const ratings = ratingsOf(device);
  const nominalV = amountOf(ratings, 'nominalV') ?? 12;
  const minV = amountOf(ratings, 'minV');
  const workingA = currentAt(element, nominalV);
  const toldMinutes = amountOf(ratings, 'onMinutes') ?? 0;
  const onMinutes = toldMinutes > 0 ? toldMinutes : MOST_MOMENTARY_MINUTES;
  return {
    edge,
    device,
    demand: demandOf(device, ratings, onMinutes),
    nominalV,
    workingA,
    heldA: element.model === 'power' ? currentAt(element, cutOutV(minV, nominalV)) : workingA,
    dropClass: ratings.dropClass === 'critical' ? 'critical' : 'general',
    minV,
    onMinutes,
  };
}

function cutOutV(minV: number | undefined, nominalV: number): number {
  return minV !== undefined && minV > 0 ? minV : nominalV * LOW_CUT_OUT_PER_NOMINAL_V;
}

function currentAt({ model, amount }: LoadEdge['element'], volts: number): number {
  if (model === 'current') return amount;
  const amperes = model === 'power' ? amount / volts : volts / amount;
  return Number.isFinite(amperes) ? amperes : 0;
}

function demandOf(device: Device, ratings: Ratings, onMinutes: number): Demand {
  if (device.kind === 'starter') return 'cranking';
  if (ratings.demand === 'momentary') return onMinutes <= MOST_MOMENTARY_MINUTES ? 'momentary' : 'continuous';
  return ratings.demand === 'intermittent' ? 'intermittent' : 'continuous';
}
