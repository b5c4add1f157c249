/** Conductor sizes the document may name, both series under either profile (domain.md, "Sizes"). */
export const AWG_SIZES = [
  '20 AWG',
  '18 AWG',
  '16 AWG',
  '14 AWG',
  '12 AWG',
  '10 AWG',
  '8 AWG',
  '6 AWG',
  '4 AWG',
  '3 AWG',
  '2 AWG',
  '1 AWG',
  '1/0 AWG',
  '2/0 AWG',
  '3/0 AWG',
  '4/0 AWG',
] as const;

export const METRIC_SIZES = [
  '0.75 mm²',
  '1 mm²',
  '1.5 mm²',
  '2.5 mm²',
  '4 mm²',
  '6 mm²',
  '10 mm²',
  '16 mm²',
  '25 mm²',
  '35 mm²',
  '50 mm²',
  '70 mm²',
  '95 mm²',
  '120 mm²',
  '150 mm²',
] as const;

export type AwgSize = (typeof AWG_SIZES)[number];
export type MetricSize = (typeof METRIC_SIZES)[number];
export type Size = AwgSize | MetricSize;

export const SIZES: readonly Size[] = [...AWG_SIZES, ...METRIC_SIZES];

/** What a file may say: the sizes, and `mm2` written without the superscript. */
export const SIZE_SPELLINGS: readonly string[] = [...SIZES, ...METRIC_SIZES.map((size) => size.replace('mm²', 'mm2'))];

/** The one spelling used inside for a size of a file: `70 mm2` is `70 mm²`. Anything unknown is undefined. */
export function sizeOf(text: string): Size | undefined {
  const size = text.replace('mm2', 'mm²');
  return SIZES.find((known) => known === size);
}

export function isMetric(size: Size): size is MetricSize {
  return size.endsWith('mm²');
}

/** Thinnest first. */
export function seriesOf(size: Size): readonly Size[] {
  return isMetric(size) ? METRIC_SIZES : AWG_SIZES;
}

export const INSULATION_TEMPERATURES = [60, 70, 75, 80, 85, 90, 105, 125, 200] as const;
export type InsulationC = (typeof INSULATION_TEMPERATURES)[number];
