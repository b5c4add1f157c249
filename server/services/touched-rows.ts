import type { z } from 'zod';

import {
  Accepted,
  Basis,
  Cable,
  FAMILIES,
  Mode,
  Note,
  Run,
  Sheet,
  Vessel,
  Zone,
  type Device,
  type Family,
} from '#shared/model/design.ts';
import { applyPatches, type Patch } from '#shared/model/patch.ts';
import { findReservedKey } from '#shared/files/read-design.ts';
import { firstOf, refusalOf } from '#shared/files/refusal.ts';
import { DeviceFile } from '#shared/kinds/design-file.ts';
import type { Database } from '#server/db/connect.ts';
import { readEntities, readFamily, type DesignRow } from '#server/db/design-queries.ts';
import { Invalid } from '#server/refusals.ts';

import { terminalNamesOf } from './entity-references.ts';

/** The part of a design that some patches touch: what it has one of, and the entities they name. Absent is undefined. */
export interface TouchedRows {
  readonly vessel: unknown;
  readonly basis: unknown;
  readonly families: Readonly<Record<Family, ReadonlyMap<string, unknown>>>;
}

/** Refuses what no design can take, before anything is read. */
export function checkPaths(patches: readonly Patch[]): void {
  patches.forEach((patch, i) => {
    const [root, id] = patch.path as [string, ...string[]];
    const field = `patches.${i}.path`;
    for (const key of patch.path) {
      if (findReservedKey({ [key]: null }, []) !== null)
        throw new Invalid(`${key} is not a key that a design may have.`, field);
    }
    const reserved = findReservedKey(patch.value, []);
    if (reserved !== null) throw new Invalid(`${reserved.path.join('.')} ${reserved.reason}`, `patches.${i}.value`);
    if (patch.op === 'set' && patch.value === undefined)
      throw new Invalid('Nothing to set was given.', `patches.${i}.value`);
    if (root === 'vessel') return;
    if (root === 'basis' || isFamily(root)) {
      if (patch.op === 'remove' && id === undefined && root !== 'cables' && root !== 'accepted') {
        throw new Invalid(`${root} is a part of every design and stays.`, field);
      }
      return;
    }
    throw new Invalid(`${root} is no part of a design that can be changed.`, field);
  });
}

export async function loadTouched(
  tx: Database,
  vesselId: string,
  row: DesignRow,
  patches: readonly Patch[],
): Promise<TouchedRows> {
  const families = {} as Record<Family, Map<string, unknown>>;
  for (const family of FAMILIES) families[family] = await loadTouchedOf(tx, vesselId, family, patches);
  return { vessel: row.vessel ?? undefined, basis: row.basis, families };
}

/** The rows as they are after the patches; what was not touched is the same object. */
export function patchTouched(before: TouchedRows, patches: readonly Patch[]): TouchedRows {
  const families = {} as Record<Family, Map<string, unknown>>;
  for (const family of FAMILIES) families[family] = new Map(before.families[family]);
  let { vessel, basis } = before;
  for (const patch of patches) {
    const [root, id, ...below] = patch.path as [string, ...string[]];
    if (root === 'vessel') vessel = patchOne(vessel, patch, patch.path.slice(1));
    else if (root === 'basis') basis = patchOne(basis, patch, patch.path.slice(1));
    else if (id === undefined) patchFamily(families[root as Family], patch);
    else families[root as Family].set(id, patchOne(families[root as Family].get(id), patch, below));
  }
  return { vessel, basis, families };
}

/** What differs between the two, family by family. */
export function changedIds(before: TouchedRows, after: TouchedRows, family: Family): string[] {
  return [...after.families[family]].flatMap(([id, body]) => (before.families[family].get(id) === body ? [] : [id]));
}

/** Refuses the first thing that does not fit the document's schema, by its path: `devices.f1.ratings.ratedA`. */
export function checkShapes(before: TouchedRows, after: TouchedRows): void {
  if (after.vessel !== before.vessel && after.vessel !== undefined) checkShape(Vessel, after.vessel, ['vessel']);
  if (after.basis !== before.basis) checkShape(Basis, after.basis, ['basis']);
  for (const family of FAMILIES) {
    for (const id of changedIds(before, after, family)) {
      const body = after.families[family].get(id);
      if (body === undefined) continue;
      checkShape(SHAPES[family], body, [family, id]);
      const more = family === 'accepted' ? undefined : findUnfit(family, id, body);
      if (more === undefined) continue;
      const field = [family, id, ...more.path].join('.');
      throw new Invalid(`${field}: ${more.reason}`, field);
    }
  }
}

const SHAPES: Readonly<Record<Family, z.ZodType>> = {
  sheets: Sheet,
  zones: Zone,
  devices: DeviceFile,
  runs: Run,
  modes: Mode,
  notes: Note,
  cables: Cable,
  accepted: Accepted,
};

function checkShape(shape: z.ZodType, value: unknown, at: readonly string[]): void {
  const issues = shape.safeParse(value).error?.issues;
  if (issues === undefined) return;
  const { path, reason } = firstOf(
    issues.flatMap((issue) => refusalOf(issue, value)),
    value,
  );
  const field = [...at, ...path].join('.');
  throw new Invalid(`${field}: ${reason}`, field);
}

/** What a schema can not say of one entity by itself; a file that has it is refused as well. */
function findUnfit(family: Family, id: string, body: unknown): { path: string[]; reason: string } | undefined {
  if ((body as { id: string }).id !== id) return { path: ['id'], reason: `must be ${id}, the key it stands under` };
  if (family !== 'devices') return undefined;
  const device = body as Device;
  const { ratedA, ratedW } = device.ratings;
  if (device.kind === 'load' && ratedA === undefined && ratedW === undefined) {
    return { path: ['ratings', 'ratedA'], reason: 'is missing: a load has ratedA or ratedW' };
  }
  if (device.mountedOn?.device === id) return { path: ['mountedOn', 'device'], reason: 'must be another device' };
  const terminals = terminalNamesOf(device);
  const stud = Object.keys(device.studs ?? {}).find((name) => !terminals.has(name));
  return stud === undefined ? undefined : { path: ['studs', stud], reason: 'is not a terminal of this device' };
}

async function loadTouchedOf(
  tx: Database,
  vesselId: string,
  family: Family,
  patches: readonly Patch[],
): Promise<Map<string, unknown>> {
  const own = patches.filter((patch) => patch.path[0] === family);
  if (own.length === 0) return new Map();
  if (own.some((patch) => patch.path.length === 1)) return readFamily(tx, vesselId, family);
  return readEntities(tx, vesselId, family, new Set(own.map((patch) => patch.path[1]!)));
}

function patchFamily(entities: Map<string, unknown>, patch: Patch): void {
  for (const id of entities.keys()) entities.set(id, undefined);
  if (patch.op === 'remove') return;
  const { value, path } = patch;
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    throw new Invalid(`${path[0]}: must be an object`, path[0]);
  }
  for (const [id, entity] of Object.entries(value)) entities.set(id, entity);
}

/** One entity patched: set or removed whole, or below. */
function patchOne(entity: unknown, patch: Patch, below: readonly string[]): unknown {
  if (below.length === 0) return patch.op === 'set' ? patch.value : undefined;
  if (entity === undefined && patch.op === 'remove') return undefined;
  return applyPatches({ entity: entity ?? {} }, [{ ...patch, path: ['entity', ...below] }]).entity;
}

function isFamily(root: string): root is Family {
  return (FAMILIES as readonly string[]).includes(root);
}
