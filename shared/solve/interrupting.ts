import type { Device } from '#shared/model/design.ts';
import {
  LARGE_BANK_DEVICE_A,
  LARGE_BANK_DEVICE_V,
  LARGE_BANK_FIGURE_A,
  TABLE_MOST_AH,
  TABLE_MOST_CCA,
  tableInterruptA,
} from '#shared/tables/interrupting.ts';

import type { Bank } from './circuits.ts';
import type { Proof } from './proof.ts';
import { amountOf, ratingsOf } from './ratings.ts';

/** What a protective device must be able to break, and by which way it was found. */
export interface InterruptNeed {
  /** The greater of the currents through it for a short just on either side. */
  readonly computedA: number;
  /** The sum at its node: reported, never asked of it. */
  readonly nodeA: number;
  /** What the profile's own clause admits instead; null where it has no figure for such a bank. */
  readonly admittedA: number | null;
  readonly admittedBy: 'table' | 'maker' | null;
  /** Where the maker's figure is above 10 kA, a device of 20 kA at 125 V DC will do. */
  readonly isLargeBankDevice: boolean;
  readonly position: 'main' | 'branch';
  readonly basis: string;
}

export function interruptNeedOf(proof: Proof, device: Device): InterruptNeed | undefined {
  const fault = proof.faults[device.id];
  if (!fault) return undefined;
  const position = proof.regions.isMain(device.id) ? 'main' : 'branch';
  const admitted = banksFeeding(proof, device).map((bank) => admittedFor(bank, position));
  const isKnown = admitted.length > 0 && admitted.every((each) => each !== null);
  const worst = isKnown ? admitted.reduce((a, b) => (b!.amperes > a!.amperes ? b : a))! : null;
  const ratings = ratingsOf(device);
  const isStrong =
    (amountOf(ratings, 'interruptA') ?? 0) >= LARGE_BANK_DEVICE_A &&
    (amountOf(ratings, 'maxV') ?? 0) >= LARGE_BANK_DEVICE_V;
  return {
    computedA: fault.greatestA,
    nodeA: fault.nodeA,
    admittedA: worst?.amperes ?? null,
    admittedBy: worst?.by ?? null,
    isLargeBankDevice: isStrong && worst?.by === 'maker' && worst.amperes > LARGE_BANK_FIGURE_A,
    position,
    basis: fault.basis,
  };
}

/** Every bank that some position of the switches joins to the device. */
function banksFeeding({ circuits }: Proof, device: Device): Bank[] {
  const [contact] = circuits.network.contactsOf(device.id);
  if (!contact) return [];
  const net = circuits.netOf(contact.a);
  const sources = net.side === 'return' ? net.negatives : net.positives;
  return [...new Set(sources.flatMap((source) => circuits.bankOf(source.device.id) ?? []))];
}

interface Admitted {
  readonly amperes: number;
  readonly by: 'table' | 'maker';
}

/** A bank of 2,200 CCA and 500 Ah or less with a known CCA: the table. Above: what the battery's maker says. */
function admittedFor(bank: Bank, position: 'main' | 'branch'): Admitted | null {
  const { ccaA, capacityAh, nominalV, shortCircuitA } = bank;
  const isSmall = ccaA !== null && ccaA <= TABLE_MOST_CCA && capacityAh <= TABLE_MOST_AH;
  const byTable = isSmall ? tableInterruptA(nominalV, ccaA, position) : undefined;
  if (byTable !== undefined) return { amperes: byTable, by: 'table' };
  return shortCircuitA === null ? null : { amperes: shortCircuitA, by: 'maker' };
}
