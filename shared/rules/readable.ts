import type { z } from 'zod';

import { Basis, WORK, Zone, type Design, type Device, type Run } from '#shared/model/design.ts';
import { INSULATION_TEMPERATURES, sizeOf } from '#shared/model/size.ts';

/**
 * The design with all taken out that no reader of a file would let through, so that a document from anywhere can be
 * worked out. What is sound stays the same object.
 */
export function readable(design: Design): Design {
  const given: Partial<Design> = isRecord(design) ? design : {};
  const devices = only(given.devices, isDevice);
  return {
    ...given,
    format: 'ampwright-design',
    version: 1,
    basis: isRecord(given.basis) ? readableBasis(given.basis) : {},
    sheets: only(given.sheets, isRecord),
    zones: mapped(only(given.zones, isRecord), readableZone),
    devices,
    runs: mapped(only(given.runs, isRun), tidyRun),
    modes: mapped(only(given.modes, isRecord), withHours),
    notes: only(given.notes, isRecord),
    accepted: isRecord(given.accepted) ? given.accepted : {},
  } as Design;
}

/** Each part of the basis by its own schema; what does not fit falls back to its default. */
function readableBasis(basis: object): object {
  if (Basis.safeParse(basis).success) return basis;
  const shape = Basis.shape as Record<string, z.ZodType>;
  return Object.fromEntries(
    Object.entries(basis).filter(([key, value]) => Object.hasOwn(shape, key) && shape[key]!.safeParse(value).success),
  );
}

function withHours<T extends object>(mode: T): T {
  const { hoursPerDay } = mode as { hoursPerDay?: unknown };
  const isSound = typeof hoursPerDay === 'number' && hoursPerDay >= 0 && hoursPerDay <= 24;
  return isSound ? mode : { ...mode, hoursPerDay: 0 };
}

function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

function only<T>(family: Readonly<Record<string, T>> | undefined, isSound: (value: unknown) => boolean) {
  if (!isRecord(family)) return {};
  const entries = Object.entries(family as Record<string, T>);
  const sound = entries.filter(([id, entity]) => isSound(entity) && (entity as { id?: unknown }).id === id);
  return sound.length === entries.length ? (family as Record<string, T>) : Object.fromEntries(sound);
}

function mapped<T extends object>(family: Record<string, T>, tidy: (entity: T) => T): Record<string, T> {
  const entries = Object.entries(family).map(([id, entity]) => [id, tidy(entity)] as const);
  return entries.every(([id, entity]) => family[id] === entity) ? family : Object.fromEntries(entries);
}

function isDevice(value: unknown): boolean {
  if (!isRecord(value)) return false;
  const { kind, ratings, mark, name, symbol } = value as Partial<Device>;
  return typeof kind === 'string' && isRecord(ratings) && [mark, name, symbol].every(isTextOrNothing);
}

function isRun(value: unknown): boolean {
  if (!isRecord(value)) return false;
  const { from, to, mark } = value as Partial<Run>;
  return [from, to].every((end) => isRecord(end) && typeof end.device === 'string') && isTextOrNothing(mark);
}

function isTextOrNothing(value: unknown): boolean {
  return value === undefined || typeof value === 'string';
}

function tidyRun(run: Run): Run {
  const conductor: Partial<Run['conductor']> = isRecord(run.conductor) ? run.conductor : {};
  const isSound =
    isAmount(run.lengthM) &&
    isAmount(run.milliohm) &&
    typeof conductor.size === 'string' &&
    sizeOf(conductor.size) !== undefined &&
    isCount(conductor.parallel) &&
    isCount(conductor.bundled) &&
    isInsulation(conductor.insulationC) &&
    (run.work === undefined || WORK.includes(run.work)) &&
    isTextOrNothing(run.colour) &&
    isTextOrNothing(run.cable) &&
    (run.zoneIds === undefined || Array.isArray(run.zoneIds));
  if (isSound) return run;
  const size = typeof conductor.size === 'string' && sizeOf(conductor.size) ? conductor.size : '20 AWG';
  return {
    ...run,
    lengthM: isAmount(run.lengthM) ? run.lengthM : undefined,
    milliohm: isAmount(run.milliohm) ? run.milliohm : undefined,
    conductor: {
      size,
      insulationC: isInsulation(conductor.insulationC) ? conductor.insulationC : undefined,
      parallel: isCount(conductor.parallel) ? conductor.parallel : undefined,
      bundled: isCount(conductor.bundled) ? conductor.bundled : undefined,
    },
    colour: isTextOrNothing(run.colour) ? run.colour : undefined,
    cable: isTextOrNothing(run.cable) ? run.cable : undefined,
    zoneIds: Array.isArray(run.zoneIds) ? run.zoneIds : undefined,
    work: run.work !== undefined && WORK.includes(run.work) ? run.work : undefined,
  };
}

function isAmount(value: unknown): boolean {
  return value === undefined || (typeof value === 'number' && Number.isFinite(value) && value >= 0);
}

function isCount(value: unknown): boolean {
  return value === undefined || (Number.isInteger(value) && (value as number) >= 1);
}

function isInsulation(value: unknown): boolean {
  return value === undefined || INSULATION_TEMPERATURES.some((known) => known === value);
}

/** Each part of a zone by its own schema; what does not fit falls back to its default. */
function readableZone<T extends object>(zone: T): T {
  const shape = Zone.shape as Record<string, z.ZodType>;
  const isSound = ([key, value]: [string, unknown]) =>
    !Object.hasOwn(shape, key) || shape[key]!.safeParse(value).success;
  const entries = Object.entries(zone);
  return entries.every(isSound) ? zone : (Object.fromEntries(entries.filter(isSound)) as T);
}
