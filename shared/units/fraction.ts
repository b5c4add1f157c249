import { formatNumber, readQuantity } from './number.ts';

export const PERCENT_ACCEPTED = 'Type a share such as 3 % or 2.5 %.';

/** A fraction as `2.8 %`, `10 %`, `0.34 %`. */
export function formatPercent(fraction: number): string {
  const percent = fraction * 100;
  return `${formatNumber(percent, Math.abs(percent) < 0.95 ? 2 : 1)} %`;
}

/** As formatPercent, with as many decimals as it takes to tell it from its limit: `3.004 %` against `3 %`. */
export function formatPercentBeside(fraction: number, limit: number): string {
  const limitText = formatPercent(limit);
  const plain = formatPercent(fraction);
  if (plain !== limitText || fraction === limit) return plain;
  for (let decimals = 2; decimals <= 9; decimals++) {
    const finer = `${formatNumber(fraction * 100, decimals)} %`;
    if (finer !== limitText) return finer;
  }
  return plain;
}

/** `3`, `3 %` and `3%` are all 0.03. */
export function readPercent(text: string): number | undefined {
  const percent = readQuantity(text, { '%': 1 });
  return percent === undefined ? undefined : percent / 100;
}
