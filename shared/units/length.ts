/** The two ways of measuring that a reader may choose. */
export type UnitSystem = 'us' | 'metric';

const METRES: Readonly<Record<string, number>> = {
  mm: 0.001,
  cm: 0.01,
  m: 1,
  metre: 1,
  metres: 1,
  meter: 1,
  meters: 1,
  in: 0.0254,
  inch: 0.0254,
  inches: 0.0254,
  '"': 0.0254,
  ft: 0.3048,
  foot: 0.3048,
  feet: 0.3048,
  "'": 0.3048,
};

const INCH = 0.0254;

/** What a field for a length says below itself when it could not read what was typed. */
export const LENGTH_ACCEPTED: Readonly<Record<UnitSystem, string>> = {
  us: 'Type a length such as 6 ft 4 in, 6.5 ft or 1.9 m.',
  metric: 'Type a length such as 1.9 m, 190 cm or 6 ft 4 in.',
};

/**
 * A length as people write it, in metres: `6 ft 4 in`, `6'4"`, `6' 4 1/2`, `1.9 m`, `190 cm`, `1,9 m`. A bare
 * number is feet or metres, as the reader measures. Undefined for anything else; no length is negative.
 */
export function readLengthM(text: string, units: UnitSystem): number | undefined {
  if (text.length > 60) return undefined;
  const parts = splitParts(normalize(text));
  if (parts === undefined || parts.length === 0 || parts.length > 2) return undefined;

  const [first, second] = parts;
  const firstUnit = first!.unit ?? (units === 'us' ? 'ft' : 'm');
  const factor = METRES[firstUnit]!;
  const lengthM = scale(first!, firstUnit);
  if (lengthM === undefined) return undefined;
  if (second === undefined) return lengthM;

  // Two parts are feet and inches, or metres and centimetres or millimetres; the second is always the smaller unit.
  const isFeet = factor === 0.3048 && first!.unit !== undefined;
  const secondUnit = second.unit ?? (isFeet ? 'in' : undefined);
  if (secondUnit === undefined || METRES[secondUnit]! >= factor || first!.unit === undefined) return undefined;
  const rest = scale(second, secondUnit);
  return rest === undefined ? undefined : round(lengthM + rest);
}

/**
 * `6 ft 4 in`, under a foot `7.1 in`; `1.9 m`. What was printed, read back and printed again, is the same. With as many
 * more decimals as are asked for: `7.91 in`, `6 ft 0.3 in`, `1.804 m`.
 */
export function formatLength(lengthM: number, units: UnitSystem, finer = 0): string {
  if (!Number.isFinite((lengthM / INCH) * 1e4)) return 'unknown';
  return units === 'us' ? formatFeet(Math.max(0, lengthM), finer) : formatMetres(Math.max(0, lengthM), finer);
}

/** Without a comma for thousands, which half the world would read as a decimal point. */
function formatMetres(lengthM: number, finer: number): string {
  return `${Number(lengthM.toFixed((lengthM < 0.9995 ? 3 : 2) + finer))} m`;
}

function formatFeet(lengthM: number, finer: number): string {
  if (finer > 0) return formatFinerFeet(lengthM, finer);
  const tenths = Math.round((lengthM / INCH) * 10);
  if (tenths < 120) return `${tenths / 10} in`;
  const halves = Math.round((lengthM / INCH) * 2);
  const feet = Math.floor(halves / 24);
  const inches = Math.floor((halves % 24) / 2);
  const half = halves % 2 === 1;
  const feetText = `${feet.toLocaleString('en-US')} ft`;
  if (inches === 0 && !half) return feetText;
  const inchText = half ? (inches === 0 ? '1/2' : `${inches} 1/2`) : String(inches);
  return `${feetText} ${inchText} in`;
}

function formatFinerFeet(lengthM: number, finer: number): string {
  const isShort = Math.round((lengthM / INCH) * 10) < 120;
  const decimals = isShort ? finer + 1 : finer;
  const inches = Number((lengthM / INCH).toFixed(decimals));
  if (isShort) return `${inches} in`;
  const feet = Math.floor(inches / 12);
  const rest = Number((inches - 12 * feet).toFixed(decimals));
  return rest === 0 ? `${feet.toLocaleString('en-US')} ft` : `${feet.toLocaleString('en-US')} ft ${rest} in`;
}

interface Part {
  /** As typed, with its commas. */
  readonly number: string;
  readonly fraction: number;
  readonly unit?: string;
}

function normalize(text: string): string {
  return text
    .trim()
    .toLowerCase()
    .replace(/[’′´]/g, "'")
    .replace(/[”″“]/g, '"')
    .replace(/''/g, '"')
    .replace(/¼/g, ' 1/4')
    .replace(/½/g, ' 1/2')
    .replace(/¾/g, ' 3/4');
}

function splitParts(text: string): Part[] | undefined {
  const parts: Part[] = [];
  const part = /\s*(?:(\d+)\/(\d+)|(\d+(?:[.,]\d+)*|[.,]\d+)(?:\s+(\d+)\/(\d+))?)\s*([a-z]+|['"])?\.?\s*/y;
  while (part.lastIndex < text.length) {
    const found = part.exec(text);
    if (found === null) return undefined;
    const [, top, bottom, number = '0', over, under, unit] = found;
    if (unit !== undefined && !Object.hasOwn(METRES, unit)) return undefined;
    const divisor = Number(bottom ?? under ?? 1);
    if (divisor === 0) return undefined;
    parts.push({ number, fraction: Number(top ?? over ?? 0) / divisor, unit });
  }
  return parts;
}

function scale(part: Part, unit: string): number | undefined {
  // `1,234 m` is a little over a metre, as most of the world writes it; `1,234 mm` and `1,234 ft` are thousands.
  const commaIsPoint = METRES[unit] === 1 && !/,\d+[.,]/.test(part.number);
  const plain =
    !commaIsPoint && /^\d{1,3}(,\d{3})+(\.\d+)?$/.test(part.number)
      ? part.number.replaceAll(',', '')
      : /^\d{1,3}(,\d{3})+\.\d+$/.test(part.number)
        ? part.number.replaceAll(',', '')
        : part.number.replace(',', '.');
  const value = Number(plain);
  return Number.isFinite(value) ? round((value + part.fraction) * METRES[unit]!) : undefined;
}

/** To a hundredth of a millimetre: 6 ft 4 in is 1.9304 m and not 1.9304000000000001. */
function round(lengthM: number): number {
  return Math.round(lengthM * 1e5) / 1e5;
}
