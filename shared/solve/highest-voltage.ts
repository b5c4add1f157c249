import type { Device } from '#shared/model/design.ts';

import type { Net } from './circuits.ts';
import type { SourceEdge } from './network.ts';
import type { Proof } from './proof.ts';
import { amountOf, ratingsOf } from './ratings.ts';

/** While it is charged, a battery that does not say its charge voltage stands at 1.2 times its nominal one. */
const CHARGING_PER_NOMINAL_V = 1.2;

/** The highest voltage that a device can see: of what is charged and what charges, whatever the switches. */
export function highestVoltageAt(proof: Proof, device: Device): number {
  const { circuits } = proof;
  const nets = circuits.network.edges
    .filter((edge) => edge.type === 'contact' && edge.device.id === device.id)
    .map((edge) => circuits.netOf(edge.a));
  return Math.max(0, ...nets.map(highestOn), ...nets.map((net) => nominalOf(proof, net)));
}

function highestOn(net: Net): number {
  return Math.max(0, ...[...net.positives, ...net.negatives].map(chargingV));
}

/** A string of batteries stands higher than any one of them. */
function nominalOf({ circuits }: Proof, net: Net): number {
  const node = net.positives[0]?.a ?? net.negatives[0]?.b;
  return node === undefined ? 0 : circuits.nominalVOf(node) * CHARGING_PER_NOMINAL_V;
}

function chargingV({ device, element }: SourceEdge): number {
  if (element.type === 'charging') return element.regulatedV;
  const ratings = ratingsOf(device);
  const told = ['equaliseV', 'chargeV'].map((name) => amountOf(ratings, name) ?? 0);
  return Math.max(...told, element.nominalV * CHARGING_PER_NOMINAL_V);
}
