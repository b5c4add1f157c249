import type { Published } from './published.ts';

/** Rest voltage by state of charge, rising; between two rows it is read on the straight line. */
export interface RestVoltage {
  readonly source: Published;
  /** The nominal voltage of what the table is for. */
  readonly nominalV: number;
  readonly rows: readonly (readonly [soc: number, volts: number])[];
}

/** Two printed tables and a rule of thumb for lead-acid differ by up to 0.2 V at half charge; this is the lowest there. */
export const LEAD_ACID_REST_VOLTAGE: RestVoltage = {
  source: { title: 'Rest voltage of lead-acid batteries, six cells', clause: 'table of eleven rows', mark: 'read' },
  nominalV: 12,
  rows: [
    [0, 10.5],
    [0.1, 11.31],
    [0.2, 11.58],
    [0.3, 11.75],
    [0.4, 11.9],
    [0.5, 12.06],
    [0.6, 12.2],
    [0.7, 12.32],
    [0.8, 12.42],
    [0.9, 12.5],
    [1, 12.7],
  ],
};

export const LIFEPO4_REST_VOLTAGE: RestVoltage = {
  source: { title: 'Rest voltage of LiFePO4 batteries, four cells', clause: 'usual figures', mark: 'from memory' },
  nominalV: 12.8,
  rows: [
    [0, 12],
    [0.1, 12.7],
    [0.2, 12.9],
    [0.3, 13],
    [0.4, 13.05],
    [0.5, 13.1],
    [0.6, 13.15],
    [0.7, 13.2],
    [0.8, 13.3],
    [0.9, 13.35],
    [1, 13.5],
  ],
};

/** Where a mode names no state of charge. */
export const USUAL_SOC = 0.8;
export const LOW_SOC = 0.2;
