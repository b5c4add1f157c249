/** `1234.5` as `1,234.5`: thousands with a comma, at most so many decimals, none that say nothing. */
export function formatNumber(value: number, decimals = 2): string {
  if (!Number.isFinite(value)) return 'unknown';
  const fixed = Math.abs(value).toFixed(decimals);
  const [whole = '0', after = ''] = fixed.split('.');
  const grouped = whole.replace(/\B(?=(\d{3})+(?!\d))/g, ',');
  const kept = after.replace(/0+$/, '');
  const text = kept === '' ? grouped : `${grouped}.${kept}`;
  return value < 0 && Number(fixed) !== 0 ? `-${text}` : text;
}

/** Three figures that matter, and never fewer than the whole number has: 287, 13.6, 0.42, 1,234. */
export function formatFigures(value: number, finer = 0): string {
  const size = Math.abs(value);
  if (size >= 99.95) return formatNumber(value, finer);
  if (size >= 9.995) return formatNumber(value, 1 + finer);
  return formatNumber(value, 2 + finer);
}

/**
 * A number as people type it: `1,234.5`, `1,9`, `-3`. A comma before three figures is taken for thousands, any
 * other for a decimal point. Undefined where it is not one number.
 */
export function readNumber(text: string): number | undefined {
  const trimmed = text.trim().replace(/^[−–]/, '-');
  if (trimmed.length > 40) return undefined;
  if (/^[+-]?\d{1,3}(,\d{3})+(\.\d+)?$/.test(trimmed)) return Number(trimmed.replaceAll(',', ''));
  if (/^[+-]?(\d+([.,]\d*)?|[.,]\d+)$/.test(trimmed)) return Number(trimmed.replace(',', '.'));
  return undefined;
}

/** What a unit typed behind a number multiplies it by; units are compared as they are written, then in lower case. */
export type UnitFactors = Readonly<Record<string, number>>;

/** A number with or without its unit: `1.5 kW` by `{ W: 1, kW: 1000 }` is 1500. A bare number has the first unit. */
export function readQuantity(text: string, factors: UnitFactors): number | undefined {
  if (text.length > 60) return undefined;
  const parts = /^([^a-zA-Zµμ°Ω%]*)([a-zA-Zµμ°Ω%]*)$/.exec(text.trim());
  if (parts === null) return undefined;
  const value = readNumber(parts[1]!);
  if (value === undefined) return undefined;
  const unit = parts[2]!;
  if (unit === '') return value * (Object.values(factors)[0] ?? 1);
  const exact = Object.hasOwn(factors, unit) ? factors[unit] : undefined;
  const factor = exact ?? Object.entries(factors).find(([name]) => name.toLowerCase() === unit.toLowerCase())?.[1];
  // Divided where the factor is a part, so that 300 mA is 0.3 A and not 0.30000000000000004.
  if (factor === undefined) return undefined;
  return factor < 1 ? value / Math.round(1 / factor) : value * factor;
}
