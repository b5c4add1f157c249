import { kindOf } from '#shared/kinds/index.ts';
import { readRatings } from '#shared/kinds/kind.ts';
import type { Device } from '#shared/model/design.ts';

export type Ratings = Readonly<Record<string, unknown>>;

/** Reading ratings by their schema is slow beside all else and asked often; a document's objects never change. */
const known = new WeakMap<object, { readonly kind: string; readonly ratings: Ratings }>();

/** The ratings of a device with what its kind's file fills in; what makes no sense is left out. */
export function ratingsOf(device: Device): Ratings {
  const before = known.get(device.ratings);
  if (before && before.kind === device.kind) return before.ratings;
  const kind = kindOf(device);
  const ratings = kind ? { ...kind.defaults?.(device), ...readRatings(kind.ratings, device) } : {};
  known.set(device.ratings, { kind: device.kind, ratings });
  return ratings;
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
