import { z } from 'zod';

import { INSULATION_TEMPERATURES, SIZE_SPELLINGS } from './size.ts';

/**
 * The design document of `*.ampwright.json`, but for what each device kind adds (shared/kinds/design-file.ts
 * joins the two). Keys that have a default may be left out and are then left out on the way back too: the
 * defaults stand in `defaults.ts`, never in the document.
 */

export const EntityId = z.string().regex(/^[A-Za-z0-9_-]{1,64}$/, 'must be 1 to 64 of A-Z a-z 0-9 _ -');
export type EntityId = z.infer<typeof EntityId>;

export const PROFILES = ['abyc-e11', 'iso-13297'] as const;
export const PAPERS = ['A4', 'A3', 'A2', 'letter', 'tabloid'] as const;
export const ORIENTATIONS = ['landscape', 'portrait'] as const;
export const COLOURS = [
  'red',
  'black',
  'yellow',
  'green',
  'white',
  'blue',
  'light-blue',
  'brown',
  'orange',
  'violet',
  'grey',
  'tan',
  'pink',
] as const;
export type PlainColour = (typeof COLOURS)[number];
export const WORK = ['new', 'existing', 'remove'] as const;
export type Work = (typeof WORK)[number];
export const STUDS = [
  '#6',
  '#8',
  '#10',
  '1/4 in',
  '5/16 in',
  '3/8 in',
  '1/2 in',
  'M4',
  'M5',
  'M6',
  'M8',
  'M10',
  'M12',
] as const;
export type Stud = (typeof STUDS)[number];

const finite = z.number();
const positive = z.number().gt(0, 'must be greater than 0');
const notNegative = z.number().min(0, 'must not be less than 0');
const countFrom1 = z.int().min(1, 'must be a whole number from 1');
const fraction = z.number().min(0, 'must be from 0 to 1').max(1, 'must be from 0 to 1');

export const End = z.strictObject({ device: EntityId, terminal: z.string().min(1) });
export type End = z.infer<typeof End>;

export const Vessel = z.strictObject({
  name: z.string(),
  type: z.string().optional(),
  lengthM: positive.optional(),
  owner: z.string().optional(),
  drawingNumber: z.string().optional(),
  nominalV: z.array(positive).optional(),
  shore: z.strictObject({ acV: positive, hz: positive, amps: positive }).optional(),
});
export type Vessel = z.infer<typeof Vessel>;

export const Basis = z.strictObject({
  profile: z.enum(PROFILES).optional(),
  ambientC: finite.optional(),
  engineSpaceC: finite.optional(),
  minAmbientC: finite.optional(),
  dropLimits: z.strictObject({ critical: fraction.optional(), general: fraction.optional() }).optional(),
  cable: z
    .strictObject({
      insulationC: z.literal([...INSULATION_TEMPERATURES]).optional(),
      slackFraction: notNegative.optional(),
      endAllowanceM: notNegative.optional(),
    })
    .optional(),
  currency: z
    .string()
    .regex(/^[A-Z]{3}$/, 'must be a currency code of three letters')
    .optional(),
  units: z.enum(['us', 'metric']).optional(),
  hull: z.enum(['plastic', 'wood', 'steel', 'aluminium']).optional(),
  fuel: z.enum(['petrol', 'diesel', 'none']).optional(),
  dcSystem: z.enum(['grounded', 'ungrounded']).optional(),
  acPolarized: z.boolean().optional(),
  resistance: z.enum(['circular-mil', 'iec-60228']).optional(),
  conductorC: finite.optional(),
  bundling: z.enum(['all', 'ac-only']).optional(),
  ratingAbove: z.enum(['next-standard', '150-percent']).optional(),
  ratingOf: z.enum(['corrected', 'table']).optional(),
  peakSunHours: notNegative.optional(),
  autonomyDays: notNegative.optional(),
});
export type Basis = z.infer<typeof Basis>;

export const Sheet = z.strictObject({
  id: EntityId,
  number: countFrom1.optional(),
  title: z.string().optional(),
  paper: z.enum(PAPERS).optional(),
  orientation: z.enum(ORIENTATIONS).optional(),
});
export type Sheet = z.infer<typeof Sheet>;

export const Zone = z.strictObject({
  id: EntityId,
  name: z.string(),
  engineSpace: z.boolean().optional(),
  ignitionProtection: z.boolean().optional(),
  wet: z.boolean().optional(),
  bilge: z.boolean().optional(),
  ventilated: z.boolean().optional(),
  habitable: z.boolean().optional(),
  ambientC: finite.optional(),
  minAmbientC: finite.optional(),
  sheetId: EntityId.optional(),
  x: finite.optional(),
  y: finite.optional(),
  width: finite.optional(),
  height: finite.optional(),
});
export type Zone = z.infer<typeof Zone>;

/** What every device has. `kind` and `ratings` are narrowed by the kind's own file. */
export const deviceShape = {
  id: EntityId,
  mark: z.string().optional(),
  name: z.string().optional(),
  sheetId: EntityId,
  x: finite,
  y: finite,
  rotation: z.literal([0, 90, 180, 270]).optional(),
  /** Drawn distance between neighbouring terminals of a busbar or block, in sheet units; a multiple of 16. */
  pitch: z.int().multipleOf(16, 'must be a multiple of 16').min(16).optional(),
  zoneId: EntityId.optional(),
  partId: z.string().optional(),
  symbol: z.string().optional(),
  locked: z.boolean().optional(),
  note: z.string().optional(),
  work: z.enum(WORK).optional(),
  studs: z.record(z.string(), z.enum(STUDS)).optional(),
  parent: EntityId.optional(),
  mountedOn: End.optional(),
  maxAmbientC: finite.optional(),
  ignitionProtected: z.boolean().optional(),
  installedYear: z.int().optional(),
  verified: z.enum(['seen', 'document', 'assumed']).optional(),
};

export interface Device {
  readonly id: EntityId;
  readonly kind: string;
  readonly mark?: string;
  readonly name?: string;
  readonly ratings: Readonly<Record<string, unknown>>;
  readonly sheetId: EntityId;
  readonly x: number;
  readonly y: number;
  readonly rotation?: 0 | 90 | 180 | 270;
  readonly pitch?: number;
  readonly zoneId?: EntityId;
  readonly partId?: string;
  readonly symbol?: string;
  readonly locked?: boolean;
  readonly note?: string;
  readonly work?: Work;
  readonly studs?: Readonly<Record<string, Stud>>;
  readonly parent?: EntityId;
  readonly mountedOn?: End;
  readonly maxAmbientC?: number;
  readonly ignitionProtected?: boolean;
  readonly installedYear?: number;
  readonly verified?: 'seen' | 'document' | 'assumed';
}

const colourPattern = new RegExp(`^(${COLOURS.join('|')})(/(${COLOURS.join('|')}))?$`);
export const Colour = z.string().regex(colourPattern, 'must be a colour, or two joined by /');

export const Conductor = z.strictObject({
  size: z.enum(SIZE_SPELLINGS as [string, ...string[]]),
  insulationC: z.literal([...INSULATION_TEMPERATURES]).optional(),
  parallel: countFrom1.optional(),
  bundled: countFrom1.optional(),
});
export type Conductor = z.infer<typeof Conductor>;

export const Run = z
  .strictObject({
    id: EntityId,
    mark: z.string().optional(),
    from: End,
    to: End,
    lengthM: z.number().min(0, 'must be greater than 0').optional(),
    conductor: Conductor,
    milliohm: notNegative.optional(),
    link: z.boolean().optional(),
    enclosed: z.enum(['none', 'sheath', 'conduit', 'enclosure']).optional(),
    cable: EntityId.optional(),
    colour: Colour.optional(),
    dropClass: z.enum(['critical', 'general']).optional(),
    zoneIds: z.array(EntityId).optional(),
    bends: z.array(z.strictObject({ x: finite, y: finite })).optional(),
    locked: z.boolean().optional(),
    work: z.enum(WORK).optional(),
    note: z.string().optional(),
  })
  .refine((run) => run.lengthM !== 0 || run.link === true, { path: ['lengthM'], message: 'must be greater than 0' });
export type Run = z.infer<typeof Run>;

export const DeviceState = z.strictObject({
  on: z.boolean().optional(),
  closed: z.boolean().optional(),
  fraction: notNegative.optional(),
  position: z.string().optional(),
  soc: fraction.optional(),
});
export type DeviceState = z.infer<typeof DeviceState>;

/** Built-in modes; a design's own mode may not take their ids. */
export const BUILT_IN_MODES = ['all-on', 'all-charging'] as const;

export const Mode = z.strictObject({
  id: EntityId.refine((id) => !BUILT_IN_MODES.some((builtIn) => builtIn === id), {
    message: 'all-on and all-charging are built in and not free for modes',
  }),
  name: z.string(),
  hoursPerDay: notNegative.optional(),
  states: z.record(EntityId, DeviceState).optional(),
});
export type Mode = z.infer<typeof Mode>;

export const Note = z.strictObject({
  id: EntityId,
  sheetId: EntityId,
  x: finite,
  y: finite,
  text: z.string(),
  width: positive.optional(),
});
export type Note = z.infer<typeof Note>;

export const Cable = z.strictObject({
  id: EntityId,
  mark: z.string().optional(),
  type: z.string(),
  jacket: z.string().optional(),
});
export type Cable = z.infer<typeof Cable>;

export const Accepted = z.strictObject({ reason: z.string(), by: z.string(), at: z.string() });
export type Accepted = z.infer<typeof Accepted>;

export const FORMAT = 'ampwright-design';
export const FORMAT_VERSION = 1;

export interface Design {
  readonly format: typeof FORMAT;
  readonly version: typeof FORMAT_VERSION;
  readonly vessel?: Vessel;
  readonly basis: Basis;
  readonly sheets: Readonly<Record<EntityId, Sheet>>;
  readonly zones: Readonly<Record<EntityId, Zone>>;
  readonly devices: Readonly<Record<EntityId, Device>>;
  readonly runs: Readonly<Record<EntityId, Run>>;
  readonly modes: Readonly<Record<EntityId, Mode>>;
  readonly notes: Readonly<Record<EntityId, Note>>;
  readonly cables?: Readonly<Record<EntityId, Cable>>;
  readonly accepted?: Readonly<Record<string, Accepted>>;
}

/** The families kept a row an entity; `vessel` and `basis` are a row each. */
export const FAMILIES = ['sheets', 'zones', 'devices', 'runs', 'modes', 'notes', 'cables', 'accepted'] as const;
export type Family = (typeof FAMILIES)[number];
