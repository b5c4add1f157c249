import type { Published } from './published.ts';

export const BATTERY_RESISTANCE_SOURCE: Published = {
  title: 'Usual internal resistance of batteries, fully charged, 25 °C',
  clause: 'per 12 V 100 Ah',
  mark: 'from memory',
};

/** Milliohm of a unit of 12 V and 100 Ah; it grows with the volts and falls with the ampere-hours. */
export const BATTERY_MILLIOHM = {
  flooded: { least: 5, greatest: 8 },
  agm: { least: 3, greatest: 5 },
  gel: { least: 5, greatest: 8 },
  lifepo4: { least: 3, greatest: 10 },
} as const;

/** For the least fault current: cold, old and nearly empty. */
export const AGED_FACTOR = 2;
