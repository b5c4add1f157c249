import type { FullBasis } from '#shared/model/defaults.ts';
import { INSULATION_TEMPERATURES } from '#shared/model/size.ts';
import { formatPercent, PERCENT_ACCEPTED, readPercent } from '#shared/units/fraction.ts';
import { formatLength, LENGTH_ACCEPTED, readLengthM, type UnitSystem } from '#shared/units/length.ts';
import { formatNumber, readNumber } from '#shared/units/number.ts';
import { formatC, readCelsius, TEMPERATURE_ACCEPTED } from '#shared/units/temperature.ts';
import type { Choice, Reading } from '#src/ui/cell.tsx';

/** One key of the basis: what it is called, how it is read and printed, what it means for the proof. */
export interface BasisField {
  readonly path: readonly [string, ...string[]];
  readonly caption: string;
  readonly says: string;
  readonly of: (basis: FullBasis) => unknown;
  readonly choices?: readonly Choice[];
  /** Choices are kept as text; this makes the document's value of one. */
  readonly readChoice?: (chosen: string) => unknown;
  readonly print?: (value: unknown, units: UnitSystem) => string;
  readonly read?: (text: string, units: UnitSystem) => Reading<unknown>;
}

export interface BasisGroup {
  readonly title: string;
  readonly fields: readonly BasisField[];
}

export const BASIS_GROUPS: readonly BasisGroup[] = [
  {
    title: 'Rules',
    fields: [
      {
        path: ['profile'],
        caption: 'Rule profile',
        says: 'Every size stays as it is; the findings then say what the other rules think of it.',
        of: (basis) => basis.profile,
        choices: [
          { value: 'abyc-e11', title: 'ABYC E-11, AWG sizes' },
          { value: 'iso-13297', title: 'ISO 13297, mm²' },
        ],
      },
      {
        path: ['ratingAbove'],
        caption: 'A fuse above the ampacity',
        says: 'How far a rating may stand above what the wire carries where no standard rating fits.',
        of: (basis) => basis.ratingAbove,
        choices: [
          { value: 'next-standard', title: 'the next standard rating' },
          { value: '150-percent', title: 'up to 150 %' },
        ],
      },
      {
        path: ['ratingOf'],
        caption: 'Held against',
        says: 'The ampacity after heat and bundling, or that of the table.',
        of: (basis) => basis.ratingOf,
        choices: [
          { value: 'corrected', title: 'the corrected ampacity' },
          { value: 'table', title: 'the ampacity of the table' },
        ],
      },
      {
        path: ['bundling'],
        caption: 'Bundling counts',
        says: 'Which bundled conductors heat one another.',
        of: (basis) => basis.bundling,
        choices: [
          { value: 'all', title: 'for AC and DC' },
          { value: 'ac-only', title: 'for AC only' },
        ],
      },
      {
        path: ['resistance'],
        caption: 'Resistance of copper by',
        says: 'The formula of circular mils, or the table of IEC 60228.',
        of: (basis) => basis.resistance,
        choices: [
          { value: 'circular-mil', title: 'circular mils' },
          { value: 'iec-60228', title: 'IEC 60228' },
        ],
      },
      temperature(
        ['conductorC'],
        'Conductor temperature',
        'Of the copper, for its resistance by IEC 60228.',
        (b) => b.conductorC,
      ),
    ],
  },
  {
    title: 'Heat',
    fields: [
      temperature(
        ['ambientC'],
        'Elsewhere on board',
        'The air a wire lies in where its zone says nothing else.',
        (b) => b.ambientC,
      ),
      temperature(['engineSpaceC'], 'In engine spaces', 'Derates every run that passes one.', (b) => b.engineSpaceC),
      temperature(['minAmbientC'], 'Coldest', 'For what cold does to batteries and sources.', (b) => b.minAmbientC),
    ],
  },
  {
    title: 'Voltage drop',
    fields: [
      share(
        ['dropLimits', 'critical'],
        'Critical loads',
        'Navigation lights, bilge pumps, blowers, electronics.',
        (b) => b.dropLimits.critical,
      ),
      share(
        ['dropLimits', 'general'],
        'All other loads',
        'Of the nominal voltage, there and back.',
        (b) => b.dropLimits.general,
      ),
    ],
  },
  {
    title: 'Cable, for new runs and for buying',
    fields: [
      {
        path: ['cable', 'insulationC'],
        caption: 'Insulation',
        says: 'What new runs are drawn with.',
        of: (basis) => basis.cable.insulationC,
        choices: INSULATION_TEMPERATURES.map((c) => ({ value: String(c), title: `${c} °C` })),
        readChoice: Number,
      },
      {
        ...share(
          ['cable', 'slackFraction'],
          'Slack',
          'Added to every length that is bought.',
          (b) => b.cable.slackFraction,
        ),
        read: (text) => {
          const value = readPercent(text);
          return value !== undefined && value >= 0 ? { ok: true, value } : { ok: false, says: PERCENT_ACCEPTED };
        },
      },
      {
        path: ['cable', 'endAllowanceM'],
        caption: 'For each end',
        says: 'To strip, crimp and dress it.',
        of: (basis) => basis.cable.endAllowanceM,
        print: (value, units) => formatLength(value as number, units),
        read: (text, units) => {
          const value = readLengthM(text, units);
          return value === undefined ? { ok: false, says: LENGTH_ACCEPTED[units] } : { ok: true, value };
        },
      },
    ],
  },
  {
    title: 'The boat',
    fields: [
      pick(['hull'], 'Hull', 'Decides on bonding and corrosion.', (b) => b.hull, [
        'plastic',
        'wood',
        'steel',
        'aluminium',
      ]),
      pick(['fuel'], 'Fuel', 'Petrol asks for ignition protection.', (b) => b.fuel, ['petrol', 'diesel', 'none']),
      pick(['dcSystem'], 'DC system', 'Grounded, or floating with protection in both conductors.', (b) => b.dcSystem, [
        'grounded',
        'ungrounded',
      ]),
      {
        path: ['acPolarized'],
        caption: 'AC system',
        says: 'Polarized: neutral and line cannot change places.',
        of: (basis) => String(basis.acPolarized),
        choices: [
          { value: 'true', title: 'polarized' },
          { value: 'false', title: 'not polarized' },
        ],
        readChoice: (chosen) => chosen === 'true',
      },
    ],
  },
  {
    title: 'On paper',
    fields: [
      {
        path: ['units'],
        caption: 'Lengths on paper and in messages',
        says: 'On screen each reader has their own choice, in the menu.',
        of: (basis) => basis.units,
        choices: [
          { value: 'us', title: 'feet and inches' },
          { value: 'metric', title: 'metres' },
        ],
      },
      {
        path: ['currency'],
        caption: 'Currency',
        says: 'Three letters, such as USD or EUR.',
        of: (basis) => basis.currency,
        print: String,
        read: (text) =>
          /^[a-z]{3}$/i.test(text.trim())
            ? { ok: true, value: text.trim().toUpperCase() }
            : { ok: false, says: 'Three letters, such as USD or EUR.' },
      },
    ],
  },
  {
    title: 'A day on board',
    fields: [
      amount(['peakSunHours'], 'Peak sun hours', 'A day, where the boat lies; for solar.', (b) => b.peakSunHours, 'h'),
      amount(['autonomyDays'], 'Days to last', 'Without charging.', (b) => b.autonomyDays, 'days'),
    ],
  },
];

/** What the document keeps for a choice. */
export function readChoiceOf(field: BasisField, chosen: string): unknown {
  return field.readChoice === undefined ? chosen : field.readChoice(chosen);
}

type Path = readonly [string, ...string[]];

function temperature(path: Path, caption: string, says: string, of: BasisField['of']): BasisField {
  return {
    path,
    caption,
    says,
    of,
    print: (value) => formatC(value as number),
    read: (text) => {
      const value = readCelsius(text);
      return value === undefined ? { ok: false, says: TEMPERATURE_ACCEPTED } : { ok: true, value };
    },
  };
}

function share(path: Path, caption: string, says: string, of: BasisField['of']): BasisField {
  return {
    path,
    caption,
    says,
    of,
    print: (value) => formatPercent(value as number),
    read: (text) => {
      const value = readPercent(text);
      return value !== undefined && value >= 0 && value <= 1
        ? { ok: true, value }
        : { ok: false, says: PERCENT_ACCEPTED };
    },
  };
}

function pick(path: Path, caption: string, says: string, of: BasisField['of'], values: readonly string[]): BasisField {
  return { path, caption, says, of, choices: values.map((value) => ({ value, title: value })) };
}

function amount(path: Path, caption: string, says: string, of: BasisField['of'], unit: string): BasisField {
  return {
    path,
    caption,
    says,
    of,
    print: (value) => (value === undefined ? '' : `${formatNumber(value as number)} ${unit}`),
    read: (text) => {
      const value = readNumber(text.replace(/[a-z]+\s*$/i, ''));
      return value === undefined || value < 0
        ? { ok: false, says: `Type a number such as 4 ${unit}.` }
        : { ok: true, value };
    },
  };
}
