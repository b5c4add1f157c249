import { isMetric, type AwgSize, type MetricSize, type Size } from '#shared/model/size.ts';

import type { Published } from './published.ts';

/** Ω·cmil/ft in the circular-mil form CM = K · I · L / E: copper that already is warm, not to be corrected again. */
export const CIRCULAR_MIL_K = 10.75;
export const CIRCULAR_MIL_SOURCE: Published = { title: 'ABYC E-11', clause: '11.14.2.6', mark: 'read' };

export const METRES_IN_A_FOOT = 0.3048;
/** The area of a circle one thousandth of an inch across. */
export const SQUARE_MM_IN_A_CIRCULAR_MIL = 5.067074791e-4;

/** Annealed copper, IEC 60028 (from memory). */
export const COPPER_OHM_SQUARE_MM_PER_METRE_AT_20_C = 1 / 58;
export const COPPER_PER_KELVIN_AT_20_C = 0.00393;

/** NEC Chapter 9, Table 8 (from memory); 20 AWG by ASTM B258 (computed). */
export const CIRCULAR_MILS: Readonly<Record<AwgSize, number>> = {
  '20 AWG': 1022,
  '18 AWG': 1620,
  '16 AWG': 2580,
  '14 AWG': 4110,
  '12 AWG': 6530,
  '10 AWG': 10_380,
  '8 AWG': 16_510,
  '6 AWG': 26_240,
  '4 AWG': 41_740,
  '3 AWG': 52_620,
  '2 AWG': 66_360,
  '1 AWG': 83_690,
  '1/0 AWG': 105_600,
  '2/0 AWG': 133_100,
  '3/0 AWG': 167_800,
  '4/0 AWG': 211_600,
};

/** IEC 60228, class 5, tinned: greatest resistance at 20 °C, Ω/km (read). */
export const IEC_60228_CLASS_5_TINNED_OHM_PER_KM: Readonly<Record<MetricSize, number>> = {
  '0.75 mm²': 26.7,
  '1 mm²': 20.0,
  '1.5 mm²': 13.7,
  '2.5 mm²': 8.21,
  '4 mm²': 5.09,
  '6 mm²': 3.39,
  '10 mm²': 1.95,
  '16 mm²': 1.24,
  '25 mm²': 0.795,
  '35 mm²': 0.565,
  '50 mm²': 0.393,
  '70 mm²': 0.277,
  '95 mm²': 0.21,
  '120 mm²': 0.164,
  '150 mm²': 0.132,
};

/** NEC Chapter 9, Table 8: uncoated stranded copper at 75 °C, Ω per 1000 ft (read from 14 AWG up, 18 and 16 from memory). */
export const NEC_STRANDED_OHM_PER_1000_FT_AT_75_C: Readonly<Record<Exclude<AwgSize, '20 AWG'>, number>> = {
  '18 AWG': 7.95,
  '16 AWG': 4.99,
  '14 AWG': 3.14,
  '12 AWG': 1.98,
  '10 AWG': 1.24,
  '8 AWG': 0.778,
  '6 AWG': 0.491,
  '4 AWG': 0.308,
  '3 AWG': 0.245,
  '2 AWG': 0.194,
  '1 AWG': 0.154,
  '1/0 AWG': 0.122,
  '2/0 AWG': 0.0967,
  '3/0 AWG': 0.0766,
  '4/0 AWG': 0.0608,
};

/** R2 = R1 (1 + 0.00323 (T2 − 75)): the note below Table 8 (from memory). */
const NEC_PER_KELVIN_AT_75_C = 0.00323;
/** Tinned strands add 2 to 4 % to NEC's uncoated figures; boat cable is tinned, and the greater is the safe one. */
const TINNING = 1.04;
/** What the lay of the strands adds to solid copper, for the one size Table 8 does not list stranded. */
const STRANDING = 1.02;

/** Resistance of one metre at 20 °C, Ω, tinned and stranded: by IEC 60228, or by NEC Table 8 for an AWG size. */
export function ohmPerMetreAt20C(size: Size): number {
  return R20[size];
}

/** Resistance of one metre by the circular-mil form, Ω. An mm² size counts with the copper its resistance class holds. */
export function ohmPerMetreByCircularMils(size: Size): number {
  return CIRCULAR_MIL_K / METRES_IN_A_FOOT / circularMilsOf(size);
}

export function circularMilsOf(size: Size): number {
  if (!isMetric(size)) return CIRCULAR_MILS[size];
  return effectiveSquareMm(size) / SQUARE_MM_IN_A_CIRCULAR_MIL;
}

/** Nominal copper area, mm². */
export function squareMmOf(size: Size): number {
  if (isMetric(size)) return Number.parseFloat(size);
  return CIRCULAR_MILS[size] * SQUARE_MM_IN_A_CIRCULAR_MIL;
}

/** IEC sizes are classes of resistance: the area of solid copper that has the resistance of the class. */
function effectiveSquareMm(size: MetricSize): number {
  return (COPPER_OHM_SQUARE_MM_PER_METRE_AT_20_C * 1000) / IEC_60228_CLASS_5_TINNED_OHM_PER_KM[size];
}

/** Uncoated stranded AWG copper at 20 °C, Ω/m, by the NEC form. */
export function strandedOhmPerMetreAt20C(size: Exclude<AwgSize, '20 AWG'>): number {
  const at75C = NEC_STRANDED_OHM_PER_1000_FT_AT_75_C[size] / 1000 / METRES_IN_A_FOOT;
  return at75C * (1 + NEC_PER_KELVIN_AT_75_C * (20 - 75));
}

function awgOhmPerMetreAt20C(size: AwgSize): number {
  if (size !== '20 AWG') return strandedOhmPerMetreAt20C(size) * TINNING;
  return (COPPER_OHM_SQUARE_MM_PER_METRE_AT_20_C / squareMmOf(size)) * STRANDING * TINNING;
}

const R20 = Object.fromEntries([
  ...(Object.keys(CIRCULAR_MILS) as AwgSize[]).map((size) => [size, awgOhmPerMetreAt20C(size)]),
  ...(Object.keys(IEC_60228_CLASS_5_TINNED_OHM_PER_KM) as MetricSize[]).map((size) => [
    size,
    IEC_60228_CLASS_5_TINNED_OHM_PER_KM[size] / 1000,
  ]),
]) as Readonly<Record<Size, number>>;
