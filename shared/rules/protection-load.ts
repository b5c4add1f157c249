import type { EntityId } from '#shared/model/design.ts';
import type { Proof } from '#shared/solve/proof.ts';
import { CONTINUOUS_LOAD_FACTOR } from '#shared/tables/protection.ts';

/** What a device must be rated for: what lasts, and 125 % of what is on for three hours or more. */
export function leastRatingA(proof: Proof, device: EntityId): number {
  return proof.currentThrough(device).lastingA + (CONTINUOUS_LOAD_FACTOR - 1) * proof.longLoadThrough(device);
}
