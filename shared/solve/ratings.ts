import { kindOf } from '#shared/kinds/index.ts';
import { readRatings } from '#shared/kinds/kind.ts';
import type { Device } from '#shared/model/design.ts';

export type Ratings = Readonly<Record<string, unknown>>;

/** The ratings of a device with what its kind's file fills in; what makes no sense is left out. */
export function ratingsOf(device: Device): Ratings {
  const kind = kindOf(device);
  if (!kind) return {};
  return { ...kind.defaults?.(device), ...readRatings(kind.ratings, device) };
}

export function amountOf(ratings: Ratings, name: string): number | undefined {
  const value = ratings[name];
  return typeof value === 'number' && Number.isFinite(value) ? value : undefined;
}

export function isProtective(device: Device): boolean {
  return device.kind === 'fuse' || device.kind === 'breaker';
}

/** What a person calls a thing: its mark, else its name, else its id. */
export function callOf(entity: { readonly id: string; readonly mark?: string; readonly name?: string }): string {
  return entity.mark?.trim() || entity.name?.trim() || entity.id;
}
