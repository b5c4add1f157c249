import { z } from 'zod';

import type { Device } from '#shared/model/design.ts';

import type { Condition, Element } from './element.ts';

/** The drawers of the locker: places in the system, from store to watch. */
export const DRAWERS = ['Store', 'Charge', 'Protect', 'Switch', 'Join', 'Convert', 'Use', 'Shore', 'Watch'] as const;
export type Drawer = (typeof DRAWERS)[number];

export type TerminalRole = 'dc+' | 'dc-' | 'l' | 'n' | 'pe' | 'bond' | 'signal' | 'data' | 'any';

/** A stud, blade or screw. `x`, `y` are in grid squares of 8 sheet units from the upper left of the unturned symbol. */
export interface Terminal {
  readonly name: string;
  readonly role: TerminalRole;
  readonly x: number;
  readonly y: number;
  /** May stay open without a finding. */
  readonly optional?: true;
  /** The sides of the unturned symbol a run may leave by; when left out, the nearest edge. */
  readonly sides?: readonly Side[];
}

export type Side = 'left' | 'right' | 'top' | 'bottom';

/** A thing the locker offers: the kind with a generic part's ratings and, where there are several, its drawing. */
export interface Offer {
  readonly partId: string;
  readonly title: string;
  readonly symbol?: string;
  readonly ratings: Readonly<Record<string, unknown>>;
}

/** One device kind: what it is called, drawn as and rated by. Lengths in grid squares, ratings in SI. */
export interface Kind<Ratings extends z.ZodObject = z.ZodObject> {
  readonly kind: string;
  readonly title: string;
  readonly drawer: Drawer;
  /** IEC 81346-2, by drawing where the kind's drawings have different purposes. */
  letter(symbol: string | undefined): string;
  readonly ratings: Ratings;
  /** The drawings it may have; the first is the one when `symbol` is left out. */
  readonly symbols: readonly [string, ...string[]];
  readonly offers: readonly [Offer, ...Offer[]];
  terminals(device: Device): readonly Terminal[];
  /** Both even, so that turning about the centre keeps terminals on the grid. */
  size(device: Device): { readonly width: number; readonly height: number };
  /**
   * What stands for a rating that the document leaves out, by key. Shown as a default, never written into a
   * document. Ratings that safety hangs on are not here: unknown is not passed.
   */
  defaults(device: Device): Readonly<Record<string, number | string | boolean>>;
  /** How it enters the network in a mode. */
  network(device: Device, condition: Condition): readonly Element[];
}

export function defineKind<Ratings extends z.ZodObject>(kind: Kind<Ratings>): Kind<Ratings> {
  return kind;
}

/** The ratings of a device read by its kind's schema; what does not fit is left out, so that a bad design never throws. */
export function readRatings<Ratings extends z.ZodObject>(schema: Ratings, device: Device): Partial<z.infer<Ratings>> {
  const { ratings } = device;
  if (typeof ratings !== 'object' || ratings === null) return parseRatings(schema, device);
  const before = known.get(ratings);
  if (before && before.schema === schema) return before.read as Partial<z.infer<Ratings>>;
  const read = parseRatings(schema, device);
  known.set(ratings, { schema, read });
  return read;
}

/** Asked for in every mode, and slow beside all else; the objects of a document never change. */
const known = new WeakMap<object, { readonly schema: z.ZodObject; readonly read: object }>();

function parseRatings<Ratings extends z.ZodObject>(schema: Ratings, device: Device): Partial<z.infer<Ratings>> {
  const whole = schema.safeParse(device.ratings);
  if (whole.success) return whole.data as Partial<z.infer<Ratings>>;
  const shape = schema.shape as Record<string, z.ZodType>;
  const kept = Object.entries(device.ratings ?? {}).filter(([key, value]) => shape[key]?.safeParse(value).success);
  return Object.fromEntries(kept) as Partial<z.infer<Ratings>>;
}

/** A rating: any finite number may be drawn; whether it makes sense is for a finding to say. */
export const amount = z.number();
/** A count that terminals hang on, kept to what can be drawn. */
export const count = (least: number, most: number) => z.int().min(least).max(most);

/** Grid squares between neighbouring terminals of a busbar or block: the device's pitch, else 16 units. */
export function pitchOf(device: Device): number {
  return Math.max(2, Math.round((device.pitch ?? 16) / 16) * 2);
}

/** `n` terminals in a row, named 1 … n, one square in from the left. */
export function rowOfTerminals(n: number, pitch: number, y: number, role: TerminalRole): Terminal[] {
  return Array.from({ length: n }, (_, i) => ({
    name: String(i + 1),
    role,
    x: 1 + i * pitch,
    y,
    optional: true as const,
    sides: ['top', 'bottom'] as const,
  }));
}
