import type { Basis } from '#shared/model/design.ts';

import type { Published } from './published.ts';

type Profile = NonNullable<Basis['profile']>;

/** How far from the source of its current, along the conductor, a protective device may stand. */
export interface Distances {
  readonly source: Published;
  readonly bareM: number;
  /** Throughout in a sheath, conduit or enclosure. */
  readonly enclosedFromBatteryM: number;
  readonly enclosedElsewhereM: number;
}

export const DISTANCES: Readonly<Record<Profile, Distances>> = {
  'abyc-e11': {
    source: { title: 'ABYC E-11 and 33 CFR 183', clause: 'overcurrent protection, location; 183.455(b)', mark: 'read' },
    bareM: 0.1778, // 7 in
    enclosedFromBatteryM: 1.8288, // 72 in
    enclosedElsewhereM: 1.016, // 40 in
  },
  'iso-13297': {
    source: { title: 'ISO 13297:2020 and ISO 10133:2012', clause: '12.3; 8.1', mark: 'from memory' },
    bareM: 0.2,
    enclosedFromBatteryM: 1.8,
    // "A protective covering from the source to the device" without a figure: the battery's figure is taken for both.
    enclosedElsewhereM: 1.8,
  },
};

/** The greatest share of a conductor's ampacity that a standard rating above it may reach. */
export const NEXT_STANDARD_CEILING = 1.5;

export const RATING_SOURCE: Readonly<Record<Profile, Published>> = {
  'abyc-e11': {
    title: 'ABYC E-11 and 33 CFR 183',
    clause: 'overcurrent protection, rating; 183.455(c)',
    mark: 'from memory',
  },
  'iso-13297': { title: 'ISO 10133:2012, ISO 13297:2020', clause: '8.1', mark: 'from memory' },
};

/** A load on for three hours or more takes no more than 80 % of its device: NEC 210.20(A) (read). */
export const CONTINUOUS_LOAD_FACTOR = 1.25;
export const CONTINUOUS_LOAD_HOURS = 3;
export const CONTINUOUS_LOAD_SOURCE: Published = { title: 'NEC', clause: '210.20(A)', mark: 'read' };

/** NEC 240.6(A), fuses and inverse-time breakers (read). */
const NEC_RATINGS = [
  10, 15, 20, 25, 30, 35, 40, 45, 50, 60, 70, 80, 90, 100, 110, 125, 150, 175, 200, 225, 250, 300, 350, 400, 450, 500,
  600, 700, 800, 1000, 1200,
] as const;

/**
 * Standard ratings by the family of a device, A, rising. "Next standard rating" uses the list of the device's own
 * family, never one global list. All but NEC's own list are from memory.
 */
export const STANDARD_RATINGS: Readonly<Record<string, readonly number[]>> = {
  blade: [1, 2, 3, 4, 5, 7.5, 10, 15, 20, 25, 30, 35, 40, 50, 60, 70, 80, 100],
  'bolt-down': [
    30, 35, 40, 50, 60, 70, 80, 100, 125, 130, 150, 175, 200, 225, 250, 300, 325, 350, 400, 425, 450, 500, 600, 675,
    750,
  ],
  terminal: [30, 40, 50, 60, 75, 80, 90, 100, 125, 150, 175, 200, 225, 250, 300],
  'class T': [1, 3, 6, ...NEC_RATINGS],
  'class J': [1, 3, 6, ...NEC_RATINGS.filter((rating) => rating <= 600)],
  glass: [0.5, 1, 2, 3, 4, 5, 6, 7.5, 8, 10, 15, 20, 25, 30],
  gG: [
    2, 4, 6, 8, 10, 12, 16, 20, 25, 32, 35, 40, 50, 63, 80, 100, 125, 160, 200, 250, 315, 400, 500, 630, 800, 1000,
    1250,
  ],
  /** Breakers, and fuses whose family is not told or not known: NEC 240.6(A), with the small ratings of DC breakers. */
  '': [1, 2, 3, 5, 7.5, ...NEC_RATINGS],
};

export function standardRatings(family: string | undefined): readonly number[] {
  return STANDARD_RATINGS[family ?? ''] ?? STANDARD_RATINGS['']!;
}

export function nextRatingUp(family: string | undefined, fromA: number): number | undefined {
  return standardRatings(family).find((rating) => rating >= fromA - 1e-9);
}

export function nextRatingDown(family: string | undefined, fromA: number): number | undefined {
  return standardRatings(family).findLast((rating) => rating <= fromA + 1e-9);
}
