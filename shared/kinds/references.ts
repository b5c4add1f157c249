import { FAMILIES, type Design, type Device, type End, type Run } from '#shared/model/design.ts';

import { kindOf } from './index.ts';

type Path = readonly (string | number)[];

/** What is wrong in a document, and where. */
export interface Refusal {
  readonly path: Path;
  readonly reason: string;
}

/** What a schema cannot say: keys equal to ids, and everything that is named is there. The first that is wrong. */
export function findBadReference(design: Design): Refusal | null {
  for (const refusal of badReferences(design)) return refusal;
  return null;
}

function* badReferences(design: Design): Generator<Refusal> {
  yield* keysUnlikeIds(design);
  if (Object.keys(design.sheets).length === 0) yield { path: ['sheets'], reason: 'must hold at least one sheet' };

  const has = {
    sheet: (id: string) => Object.hasOwn(design.sheets, id),
    zone: (id: string) => Object.hasOwn(design.zones, id),
    device: (id: string) => Object.hasOwn(design.devices, id),
    cable: (id: string) => Object.hasOwn(design.cables ?? {}, id),
  };
  const named = namer(has);
  const terminals = terminalNames(design);

  for (const [id, zone] of Object.entries(design.zones)) yield* named('sheet', ['zones', id, 'sheetId'], zone.sheetId);

  for (const [id, device] of Object.entries(design.devices)) {
    const path = ['devices', id];
    yield* ratingsOf(device, path);
    yield* named('device', [...path, 'ratings', 'backedUpBy'], device.ratings.backedUpBy as string | undefined);
    yield* named('sheet', [...path, 'sheetId'], device.sheetId);
    yield* named('zone', [...path, 'zoneId'], device.zoneId);
    for (const stud of Object.keys(device.studs ?? {})) {
      if (!terminals(id).has(stud))
        yield { path: [...path, 'studs', stud], reason: 'is not a terminal of this device' };
    }
    yield* named('device', [...path, 'parent'], device.parent);
    if (isInItself(design, device))
      yield { path: [...path, 'parent'], reason: 'must not lead back to the device itself' };
    if (device.mountedOn) {
      yield* end([...path, 'mountedOn'], device.mountedOn);
      if (device.mountedOn.device === id)
        yield { path: [...path, 'mountedOn', 'device'], reason: 'must be another device' };
    }
  }

  for (const [id, run] of Object.entries(design.runs)) yield* runReferences(['runs', id], run);

  for (const [id, mode] of Object.entries(design.modes)) {
    for (const device of Object.keys(mode.states ?? {}))
      yield* named('device', ['modes', id, 'states', device], device);
  }
  for (const [id, note] of Object.entries(design.notes)) yield* named('sheet', ['notes', id, 'sheetId'], note.sheetId);

  function* runReferences(path: Path, run: Run): Generator<Refusal> {
    yield* end([...path, 'from'], run.from);
    yield* end([...path, 'to'], run.to);
    yield* named('cable', [...path, 'cable'], run.cable);
    for (const [i, zone] of (run.zoneIds ?? []).entries()) yield* named('zone', [...path, 'zoneIds', i], zone);
  }

  function* end(path: Path, { device, terminal }: End): Generator<Refusal> {
    yield* named('device', [...path, 'device'], device);
    if (has.device(device) && !terminals(device).has(terminal)) {
      yield { path: [...path, 'terminal'], reason: `names terminal ${terminal}, which ${device} does not have` };
    }
  }
}

function* keysUnlikeIds(design: Design): Generator<Refusal> {
  for (const family of FAMILIES) {
    if (family === 'accepted') continue;
    for (const [key, entity] of Object.entries(design[family] ?? {})) {
      if (entity.id !== key) yield { path: [family, key, 'id'], reason: `must be ${key}, the key it stands under` };
    }
  }
}

type Named = 'sheet' | 'zone' | 'device' | 'cable';

function namer(has: Readonly<Record<Named, (id: string) => boolean>>) {
  return function* (what: Named, path: Path, id: string | undefined): Generator<Refusal> {
    if (id !== undefined && !has[what](id)) yield { path, reason: `names ${what} ${id}, which is not there` };
  };
}

/** A load is rated by its amperes or by its watts; with neither nothing can be worked out. */
function* ratingsOf(device: Device, path: Path): Generator<Refusal> {
  const { ratedA, ratedW } = device.ratings;
  if (device.kind === 'load' && ratedA === undefined && ratedW === undefined) {
    yield { path: [...path, 'ratings', 'ratedA'], reason: 'is missing: a load has ratedA or ratedW' };
  }
}

function terminalNames(design: Design): (deviceId: string) => ReadonlySet<string> {
  const known = new Map<string, ReadonlySet<string>>();
  return (deviceId) => {
    const there = known.get(deviceId);
    if (there !== undefined) return there;
    const device = design.devices[deviceId]!;
    const names = new Set(
      kindOf(device)
        ?.terminals(device)
        .map((terminal) => terminal.name),
    );
    known.set(deviceId, names);
    return names;
  };
}

function isInItself(design: Design, device: Device): boolean {
  const seen = new Set<string>();
  for (let at = device.parent; at !== undefined && !seen.has(at); at = design.devices[at]?.parent) {
    if (at === device.id) return true;
    seen.add(at);
  }
  return false;
}
