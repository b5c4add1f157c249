import { AWG_SIZES, METRIC_SIZES, type Size } from './size.ts';

export const SIZE_ACCEPTED = 'Type a size such as 2/0 AWG, 10 AWG or 70 mm².';

/**
 * A conductor size as people write it: `2/0`, `2/0 awg`, `10 ga`, `70 mm2`, `70mm²`, `2,5`. A bare number that both
 * series have (4, 6, 10, 16) is read in the reader's own; one that only one has is read in that.
 */
export function readSize(text: string, units: 'us' | 'metric'): Size | undefined {
  const parts = /^(\d{1,3}(?:\/0|[.,]\d{1,2})?|0{1,4})\s*(awg|ga|gauge|mm2|mm²|mm\^2|sq\s?mm|mmq)?$/i.exec(text.trim());
  if (parts === null) return undefined;
  const number = parts[1]!.replace(',', '.');
  const unit = parts[2]?.toLowerCase();
  const awg = awgSize(number);
  const metric = METRIC_SIZES.find((size) => Number(size.slice(0, -4)) === Number(number));
  if (unit !== undefined) return /^(awg|ga|gauge)$/.test(unit) ? awg : metric;
  return units === 'us' ? (awg ?? metric) : (metric ?? awg);
}

function awgSize(number: string): Size | undefined {
  const noughts = /^0+$/.test(number) ? `${number.length}/0` : number;
  return AWG_SIZES.find((size) => size === `${noughts} AWG`);
}
