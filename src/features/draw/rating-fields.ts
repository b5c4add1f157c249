import { z } from 'zod';

import { AMP_HOURS_ACCEPTED, formatAh, readAmpHours } from '#shared/units/charge.ts';
import { AMPS_ACCEPTED, formatA, readAmps } from '#shared/units/current.ts';
import { formatPercent, PERCENT_ACCEPTED, readPercent } from '#shared/units/fraction.ts';
import { formatNumber, readNumber } from '#shared/units/number.ts';
import { formatW, readWatts, WATTS_ACCEPTED } from '#shared/units/power.ts';
import { OHMS_ACCEPTED, readMilliohms } from '#shared/units/resistance.ts';
import { formatV, readVolts, VOLTS_ACCEPTED } from '#shared/units/voltage.ts';

/** A rating of a kind as a field, worked out from its key and its schema: the key says the unit. */
export interface RatingField {
  readonly key: string;
  readonly caption: string;
  readonly isRequired: boolean;
  readonly entry:
    | { readonly is: 'choice'; readonly choices: readonly string[] }
    | { readonly is: 'yes-no' }
    | { readonly is: 'text' }
    | {
        readonly is: 'number';
        readonly print: (value: number) => string;
        readonly read: (text: string) => number | undefined;
        readonly accepted: string;
      };
}

export function ratingFieldsOf(schema: z.ZodObject): RatingField[] {
  return Object.entries(schema.shape).map(([key, part]) => {
    const isRequired = !(part instanceof z.ZodOptional);
    const inner = (part instanceof z.ZodOptional ? part.unwrap() : part) as z.ZodType;
    return { key, caption: captionOf(key), isRequired, entry: entryOf(key, inner) };
  });
}

function entryOf(key: string, schema: z.ZodType): RatingField['entry'] {
  if (schema instanceof z.ZodEnum) return { is: 'choice', choices: schema.options.map(String) };
  if (schema instanceof z.ZodBoolean) return { is: 'yes-no' };
  if (schema instanceof z.ZodString) return { is: 'text' };
  const unit = UNITS.find(({ ends }) => ends.test(key));
  if (unit !== undefined) return { is: 'number', ...unit };
  return { is: 'number', print: (value) => formatNumber(value, 3), read: readNumber, accepted: 'Type a number.' };
}

const UNITS: readonly {
  readonly ends: RegExp;
  readonly print: (value: number) => string;
  readonly read: (text: string) => number | undefined;
  readonly accepted: string;
}[] = [
  { ends: /Ah$/, print: formatAh, read: readAmpHours, accepted: AMP_HOURS_ACCEPTED },
  {
    ends: /Milliohm$/i,
    print: (value) => `${formatNumber(value, 3)} mΩ`,
    read: readMilliohms,
    accepted: OHMS_ACCEPTED,
  },
  {
    ends: /Milliamp$/,
    print: (value) => `${formatNumber(value, 1)} mA`,
    read: (text) => readNumber(text.replace(/\s*mA$/i, '')),
    accepted: 'Type milliamperes such as 30 or 30 mA.',
  },
  {
    ends: /Minutes$/,
    print: (value) => `${formatNumber(value, 2)} min`,
    read: readWith(/\s*min(utes)?$/i),
    accepted: 'Type minutes such as 5.',
  },
  {
    ends: /PerDay$/,
    print: (value) => `${formatNumber(value, 2)} h`,
    read: readWith(/\s*h(ours)?$/i),
    accepted: 'Type hours a day such as 8.',
  },
  { ends: /(Fraction|rerating|hotDerate)$/, print: formatPercent, read: readPercent, accepted: PERCENT_ACCEPTED },
  { ends: /A$/, print: formatA, read: readAmps, accepted: AMPS_ACCEPTED },
  { ends: /V$/, print: formatV, read: readVolts, accepted: VOLTS_ACCEPTED },
  { ends: /W$/, print: formatW, read: readWatts, accepted: WATTS_ACCEPTED },
];

function readWith(unit: RegExp): (text: string) => number | undefined {
  return (text) => readNumber(text.replace(unit, ''));
}

const CAPTIONS: Readonly<Record<string, string>> = {
  ccaA: 'Cold cranking',
  capacityAh: 'Capacity, 20 h',
  emfV: 'Voltage at rest',
  ratedA: 'Rated current',
  ratedW: 'Rated power',
  maxA: 'Greatest current',
  interruptA: 'Can interrupt',
  maxV: 'Greatest voltage',
  minV: 'Least voltage',
  nominalV: 'Nominal voltage',
  model: 'Takes constant',
  shortCircuitA: 'Short circuit, maker’s',
  usableFraction: 'Usable share',
  lowTempCutoff: 'Stops charging in frost',
  managed: 'Own management system',
  preAlarm: 'Warns before it opens',
  backedUpBy: 'Relies upstream on',
  hoursPerDay: 'Used in a day',
  onMinutes: 'On at a time',
  lockedRotorA: 'Locked rotor',
};

function captionOf(key: string): string {
  const known = CAPTIONS[key];
  if (known !== undefined) return known;
  const words = key
    .replace(/(Milliohm|Milliamp|A|V|W|Ah)$/, '')
    .replaceAll(/([A-Z])/g, (letter) => ` ${letter.toLowerCase()}`)
    .trim();
  return words.charAt(0).toUpperCase() + words.slice(1);
}
