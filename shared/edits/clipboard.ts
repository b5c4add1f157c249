import { DesignFile } from '#shared/kinds/design-file.ts';
import { boxOf, type Point } from '#shared/kinds/place.ts';
import { findBadReference } from '#shared/kinds/references.ts';
import { FORMAT, FORMAT_VERSION, type Design, type Device, type Run } from '#shared/model/design.ts';

import type { Selection } from './delete.ts';
import { callMany, refuse, set, snap, withoutUndefined, type Edit, type NewId } from './edit.ts';
import { withParts } from './family.ts';
import { compareMarks, newMarks } from './marks.ts';

const FRAGMENT = 'ampwright-fragment';

/** What lies on the clipboard: devices, the runs between them and the jackets of those, as text of its own format. */
export interface Fragment {
  readonly format: typeof FRAGMENT;
  readonly version: 1;
  readonly devices: Design['devices'];
  readonly runs: Design['runs'];
  readonly cables: NonNullable<Design['cables']>;
}

/** The chosen devices with the parts of assemblies, and every run that has both its ends among them. */
export function copy(design: Design, selection: Pick<Selection, 'devices'>): Fragment {
  const devices = Object.fromEntries(withParts(design, selection.devices).map((id) => [id, design.devices[id]!]));
  const has = (id: string | undefined) => id !== undefined && Object.hasOwn(devices, id);
  const runs = Object.values(design.runs).filter((run) => has(run.from.device) && has(run.to.device));
  const cables = Object.values(design.cables ?? {}).filter(({ id }) => runs.some((run) => run.cable === id));
  return {
    format: FRAGMENT,
    version: 1,
    devices: Object.fromEntries(Object.values(devices).map((device) => [device.id, withoutOutside(device, has)])),
    runs: Object.fromEntries(runs.map((run) => [run.id, run])),
    cables: Object.fromEntries(cables.map((cable) => [cable.id, cable])),
  };
}

/** Text from anywhere; undefined where it is no fragment of ours. */
export function readFragment(text: string): Fragment | undefined {
  let value: unknown;
  try {
    value = JSON.parse(text);
  } catch {
    return undefined;
  }
  if (typeof value !== 'object' || value === null || (value as Partial<Fragment>).format !== FRAGMENT) return undefined;
  const { devices, runs, cables } = value as Record<string, unknown>;
  const parsed = DesignFile.pick({ devices: true, runs: true, cables: true }).safeParse({ devices, runs, cables });
  if (!parsed.success) return undefined;

  const fragment = { format: FRAGMENT, version: 1, cables: {}, ...parsed.data } as unknown as Fragment;
  return findBadReference(designAround(fragment)) === null ? fragment : undefined;
}

/** The fragment put down with its upper left at a place, with new ids and the next marks. Works across vessels. */
export function paste(
  design: Design,
  fragment: Fragment,
  { sheetId, at }: { readonly sheetId: string; readonly at: Point },
  newId: NewId,
  verb: 'Paste' | 'Duplicate' = 'Paste',
): Edit & { deviceIds: string[]; runIds: string[] } {
  const devices = Object.values(fragment.devices).sort(compareMarks);
  const label = `${verb} ${callMany(
    devices.map((device) => device.mark || device.name || 'a device'),
    'devices',
  )}`;
  const nothing = { deviceIds: [], runIds: [] };
  if (devices.length === 0) return { label, patches: [], ...nothing };
  if (!Object.hasOwn(design.sheets, sheetId)) return { ...refuse(label, 'That sheet is not there.'), ...nothing };

  const boxes = devices.map(boxOf);
  const left = Math.min(...boxes.map((box) => box.x));
  const top = Math.min(...boxes.map((box) => box.y));
  const by = snap({ x: at.x - left, y: at.y - top });
  const marks = newMarks(design);
  const ids = new Map(devices.map((device) => [device.id, newId()]));
  const cableIds = new Map(Object.keys(fragment.cables).map((id) => [id, newId()]));

  const newDevices = devices.map((device) =>
    pasteDevice(device, { design, sheetId, by, ids, mark: marks.device(device) }),
  );
  const runs = Object.values(fragment.runs).sort(compareMarks);
  const newRuns = runs.map((run): Run => {
    const isOnOneSheet = fragment.devices[run.from.device]?.sheetId === fragment.devices[run.to.device]?.sheetId;
    return withoutUndefined({
      ...run,
      id: newId(),
      mark: marks.run(),
      from: { ...run.from, device: ids.get(run.from.device)! },
      to: { ...run.to, device: ids.get(run.to.device)! },
      cable: run.cable === undefined ? undefined : cableIds.get(run.cable),
      zoneIds: run.zoneIds?.filter((zone) => Object.hasOwn(design.zones, zone)),
      bends: isOnOneSheet ? run.bends?.map(({ x, y }) => ({ x: x + by.x, y: y + by.y })) : undefined,
    });
  });
  const cables = Object.values(fragment.cables).map((cable) => ({
    ...cable,
    id: cableIds.get(cable.id)!,
    mark: marks.run(),
  }));
  return {
    label,
    patches: [
      ...newDevices.map((device) => set(['devices', device.id], device)),
      ...cables.map((cable) => set(['cables', cable.id], cable)),
      ...newRuns.map((run) => set(['runs', run.id], run)),
    ],
    deviceIds: newDevices.map((device) => device.id),
    runIds: newRuns.map((run) => run.id),
  };
}

/** A little down and to the right of what it was made from. */
const DUPLICATE_OFFSET = 32;

export function duplicate(design: Design, selection: Pick<Selection, 'devices'>, newId: NewId) {
  const fragment = copy(design, selection);
  const devices = Object.values(fragment.devices);
  const boxes = devices.map(boxOf);
  const at = {
    x: Math.min(...boxes.map((box) => box.x)) + DUPLICATE_OFFSET,
    y: Math.min(...boxes.map((box) => box.y)) + DUPLICATE_OFFSET,
  };
  return paste(design, fragment, { sheetId: devices[0]?.sheetId ?? '', at }, newId, 'Duplicate');
}

function pasteDevice(
  device: Device,
  to: { design: Design; sheetId: string; by: Point; ids: ReadonlyMap<string, string>; mark: string },
): Device {
  const backedUpBy = to.ids.get(String(device.ratings.backedUpBy));
  return withoutUndefined({
    ...device,
    id: to.ids.get(device.id)!,
    mark: to.mark,
    ratings: withoutUndefined({ ...device.ratings, backedUpBy }),
    sheetId: to.sheetId,
    x: device.x + to.by.x,
    y: device.y + to.by.y,
    zoneId: device.zoneId !== undefined && Object.hasOwn(to.design.zones, device.zoneId) ? device.zoneId : undefined,
    parent: device.parent === undefined ? undefined : to.ids.get(device.parent),
    mountedOn: device.mountedOn && { ...device.mountedOn, device: to.ids.get(device.mountedOn.device)! },
  });
}

/** What points out of the fragment is let go. */
function withoutOutside(device: Device, has: (id: string | undefined) => boolean): Device {
  const { backedUpBy } = device.ratings as { backedUpBy?: string };
  return withoutUndefined({
    ...device,
    ratings: withoutUndefined({ ...device.ratings, backedUpBy: has(backedUpBy) ? backedUpBy : undefined }),
    parent: has(device.parent) ? device.parent : undefined,
    mountedOn: has(device.mountedOn?.device) ? device.mountedOn : undefined,
  });
}

/** Sheets and zones are the other vessel's and are not asked for. */
function designAround(fragment: Fragment): Design {
  const devices = Object.values(fragment.devices);
  const zoneIds = [
    ...devices.flatMap((device) => device.zoneId ?? []),
    ...Object.values(fragment.runs).flatMap((run) => run.zoneIds ?? []),
  ];
  return {
    ...fragment,
    format: FORMAT,
    version: FORMAT_VERSION,
    basis: {},
    sheets: Object.fromEntries(['any', ...devices.map((device) => device.sheetId)].map((id) => [id, { id }])),
    zones: Object.fromEntries(zoneIds.map((id) => [id, { id, name: id }])),
    modes: {},
    notes: {},
  };
}
