import type { Device } from '#shared/model/design.ts';

import type { Net } from './circuits.ts';
import type { SourceEdge } from './network.ts';
import type { Proof } from './proof.ts';
import { amountOf, ratingsOf } from './ratings.ts';

/**
 * While it is charged, a battery that does not say its charge voltage stands at so many times its nominal one: lead
 * acid at 2.4 V a cell, LiFePO4 at the 3.65 V that a cell of 3.2 V may have.
 */
const CHARGING_PER_NOMINAL_V = 2.4 / 2;
const LIFEPO4_CHARGING_PER_NOMINAL_V = 3.65 / 3.2;

/** The highest voltage that a device can see: of what is charged and what charges, whatever the switches. */
export function highestVoltageAt(proof: Proof, device: Device): number {
  const { circuits } = proof;
  const nets = circuits.network.contactsOf(device.id).map((edge) => circuits.netOf(edge.a));
  return Math.max(0, ...nets.flatMap((net) => [highestOn(net), stackedOn(proof, net)]));
}

function highestOn(net: Net): number {
  return Math.max(0, ...[...net.positives, ...net.negatives].map(chargingV));
}

/** A string of batteries stands higher than any one of them, each charged as it says. */
function stackedOn({ circuits }: Proof, net: Net): number {
  const [source] = [...net.positives, ...net.negatives];
  if (!source) return 0;
  const nominalV = circuits.nominalVOf(net.positives.length > 0 ? source.a : source.b);
  const perNominalV = [...net.positives, ...net.negatives].map((each) =>
    each.element.type === 'battery' && each.element.nominalV > 0 ? chargingV(each) / each.element.nominalV : 0,
  );
  return nominalV * Math.max(0, ...perNominalV);
}

function chargingV({ device, element }: SourceEdge): number {
  if (element.type === 'charging') return element.regulatedV;
  const ratings = ratingsOf(device);
  const told = ['equaliseV', 'chargeV'].map((name) => amountOf(ratings, name) ?? 0);
  const usual = element.chemistry === 'lifepo4' ? LIFEPO4_CHARGING_PER_NOMINAL_V : CHARGING_PER_NOMINAL_V;
  return Math.max(...told) || element.nominalV * usual;
}
