import type { Basis } from '#shared/model/design.ts';
import type { AwgSize, MetricSize, Size } from '#shared/model/size.ts';

import type { Published } from './published.ts';

type Profile = NonNullable<Basis['profile']>;

/** Allowable amperage of single conductors at 30 °C, a row a size, a column an insulation temperature. */
export interface AmpacityTable {
  readonly source: Published;
  /** Insulation temperatures of the columns, °C, rising. A conductor reads the highest that is not above its own. */
  readonly columnsC: readonly number[];
  /** Thinnest first. */
  readonly rows: readonly (readonly [Size, readonly number[]])[];
  readonly engineSpace: {
    readonly source: Published;
    /** The ambient at which the factors below hold; any other is by formula. */
    readonly ambientC: number;
    /** A factor a column; 0 forbids the insulation in an engine space. */
    readonly factors: readonly number[];
  };
  readonly bundling: {
    readonly source: Published;
    /** Rising: from so many current-carrying conductors on, this factor. */
    readonly steps: readonly { readonly from: number; readonly factor: number }[];
  };
}

const CFR_ROWS: readonly (readonly [AwgSize, readonly number[]])[] = [
  ['18 AWG', [10, 10, 15, 20, 20, 25, 25]],
  ['16 AWG', [15, 15, 20, 25, 25, 30, 35]],
  ['14 AWG', [20, 20, 25, 30, 35, 40, 45]],
  ['12 AWG', [25, 25, 35, 40, 45, 50, 55]],
  ['10 AWG', [40, 40, 50, 55, 60, 70, 70]],
  ['8 AWG', [55, 65, 70, 70, 80, 90, 100]],
  ['6 AWG', [80, 95, 100, 100, 120, 125, 135]],
  ['4 AWG', [105, 125, 130, 135, 160, 170, 180]],
  ['3 AWG', [120, 145, 150, 155, 180, 195, 210]],
  ['2 AWG', [140, 170, 175, 180, 210, 225, 240]],
  ['1 AWG', [165, 195, 210, 210, 245, 265, 280]],
  ['1/0 AWG', [195, 230, 245, 245, 285, 305, 325]],
  ['2/0 AWG', [225, 265, 285, 285, 330, 355, 370]],
  ['3/0 AWG', [260, 310, 330, 330, 385, 410, 430]],
  ['4/0 AWG', [300, 360, 385, 385, 445, 475, 510]],
];

const ISO_ROWS: readonly (readonly [MetricSize, readonly number[]])[] = [
  ['0.75 mm²', [6, 10, 12, 12, 16, 20, 25]],
  ['1 mm²', [8, 14, 18, 18, 20, 25, 35]],
  ['1.5 mm²', [12, 18, 21, 21, 25, 30, 40]],
  ['2.5 mm²', [17, 25, 30, 30, 35, 40, 45]],
  ['4 mm²', [22, 35, 40, 40, 45, 50, 55]],
  ['6 mm²', [29, 45, 50, 50, 60, 70, 75]],
  ['10 mm²', [40, 65, 70, 70, 90, 100, 120]],
  ['16 mm²', [54, 90, 100, 100, 130, 150, 170]],
  ['25 mm²', [71, 120, 140, 140, 170, 185, 200]],
  ['35 mm²', [87, 160, 185, 185, 210, 225, 240]],
  ['50 mm²', [105, 210, 230, 230, 270, 300, 325]],
  ['70 mm²', [135, 265, 285, 285, 330, 360, 375]],
  ['95 mm²', [165, 310, 330, 330, 390, 410, 430]],
  ['120 mm²', [190, 360, 400, 400, 450, 480, 520]],
  ['150 mm²', [220, 380, 430, 430, 475, 520, 560]],
];

export const AMPACITY: Readonly<Record<Profile, AmpacityTable>> = {
  'abyc-e11': {
    source: { title: '33 CFR 183 and ABYC E-11', clause: '183.425, Table 5; Table VI-A', mark: 'read' },
    columnsC: [60, 75, 80, 90, 105, 125, 200],
    rows: CFR_ROWS,
    engineSpace: {
      // The 105 °C factor was read in two printed copies; the others are from memory, held against NEC 310.15(B)(1).
      source: { title: '33 CFR 183', clause: '183.425, Table 5, Note 1', mark: 'from memory' },
      ambientC: 50,
      factors: [0.58, 0.75, 0.78, 0.82, 0.85, 0.89, 1],
    },
    bundling: {
      source: {
        title: '33 CFR 183 and ABYC E-11',
        clause: '183.425, Table 5, Note 2; Tables VI-B to VI-E',
        mark: 'read',
      },
      steps: [
        { from: 3, factor: 0.7 },
        { from: 4, factor: 0.6 },
        { from: 7, factor: 0.5 },
        { from: 25, factor: 0.4 },
      ],
    },
  },
  'iso-13297': {
    source: { title: 'ISO 13297:2020', clause: 'Table A.1', mark: 'from memory' },
    // The 85 to 90 °C column of the standard stands twice, so that each insulation keeps its own temperature.
    columnsC: [60, 70, 85, 90, 105, 125, 200],
    rows: ISO_ROWS,
    engineSpace: {
      source: { title: 'ISO 13297:2020', clause: 'Table A.1, engine spaces', mark: 'from memory' },
      // The text speaks of 60 °C, but the factors are those of 50 °C. Read at 50 °C they are right, and a
      // space that really is hotter is derated by the formula, which is the safer of the two readings.
      ambientC: 50,
      factors: [0, 0.75, 0.82, 0.82, 0.86, 0.89, 1],
    },
    bundling: {
      source: { title: 'ISO 13297:2020', clause: 'Table A.1, bundled conductors', mark: 'from memory' },
      steps: [
        { from: 4, factor: 0.7 },
        { from: 7, factor: 0.6 },
        { from: 25, factor: 0.5 },
      ],
    },
  },
};

/** The ambient that the tables themselves are for, °C. */
export const TABLE_AMBIENT_C = 30;

/** From this voltage on, the law's bundling factors hold whatever the basis says of DC (33 CFR 183.435(b)). */
export const BUNDLING_BY_LAW_FROM_V = 50;
