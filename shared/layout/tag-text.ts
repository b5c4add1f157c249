import type { Device } from '#shared/model/design.ts';

/** What stands beside a device: its mark, its name, its rating. At most three lines. */
export function tagLines(device: Device): readonly string[] {
  const kept = known.get(device);
  if (kept !== undefined) return kept;
  const lines = linesOf(device);
  known.set(device, lines);
  return lines;
}

const known = new WeakMap<Device, readonly string[]>();

function linesOf(device: Device): string[] {
  const { kind } = device;
  const mark = device.mark?.trim() ?? '';
  const rating = ratingLines(device);
  const name = device.name?.trim();
  // a bar has its tag on one line, over its end
  if (kind === 'busbar') return [mark, [name, ...rating].filter((part) => part).join(', ')];
  const rest = name ? [name, rating.join(' ')] : rating;
  return [mark, ...rest.filter((line) => line !== '')].slice(0, 3);
}

/** The figures by which the trade calls the thing: 250 A class T, 12.8 V 280 Ah. */
function ratingLines({ kind, ratings }: Device): string[] {
  const figure = (key: string, unit: string) =>
    typeof ratings[key] === 'number' && Number.isFinite(ratings[key]) ? `${printNumber(ratings[key])} ${unit}` : '';
  const word = (key: string) => (typeof ratings[key] === 'string' ? (ratings[key] as string) : '');
  switch (kind) {
    case 'battery':
      return [joined(figure('nominalV', 'V'), figure('capacityAh', 'Ah')), CHEMISTRY[word('chemistry')] ?? ''];
    case 'fuse':
      return [
        figure('ratedA', 'A'),
        word('family') === 'class T' || word('family') === 'class J' ? word('family') : '',
      ];
    case 'switch':
    case 'selector':
      return [figure('continuousA', 'A')];
    case 'alternator':
      return [figure('maxA', 'A')];
    case 'starter':
      return [figure('crankA', 'A')];
    case 'load':
      return [ratings.ratedW !== undefined ? figure('ratedW', 'W') : figure('ratedA', 'A')];
    case 'bond':
      return [];
    default:
      return [figure('ratedA', 'A')];
  }
}

const CHEMISTRY: Readonly<Record<string, string>> = {
  flooded: 'flooded',
  agm: 'AGM',
  gel: 'gel',
  lifepo4: 'LiFePO4',
};

function joined(...parts: readonly string[]): string {
  return parts.filter((part) => part !== '').join(' ');
}

/** Thousands with a comma, no more than two decimals. */
export function printNumber(value: number): string {
  const [whole, decimals] = String(Math.round(value * 100) / 100).split('.');
  const grouped = whole!.replace(/\B(?=(\d{3})+$)/g, ',');
  return decimals === undefined ? grouped : `${grouped}.${decimals}`;
}
