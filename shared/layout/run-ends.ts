import type { PlacedTerminal } from '#shared/kinds/place.ts';
import type { Design, Device, EntityId, Run } from '#shared/model/design.ts';

import { placeOf } from './device-place.ts';
import { compareMarks } from './mark-order.ts';

export interface RunEnd {
  readonly device: Device;
  readonly terminal: PlacedTerminal;
}

/** A run as a sheet sees it: both its ends, or the one that is here. */
export interface SheetRun {
  readonly run: Run;
  readonly from: RunEnd | null;
  readonly to: RunEnd | null;
  /** The end on another sheet. */
  readonly away: Device | null;
}

/** What of a run is on this sheet; null when nothing is, or when an end is on no terminal there is. */
export function sheetRunOf(design: Design, sheetId: EntityId, run: Run): SheetRun | null {
  const fromDevice = design.devices[run.from.device];
  const toDevice = design.devices[run.to.device];
  if (fromDevice === undefined || toDevice === undefined) return null;
  const from = fromDevice.sheetId === sheetId ? endOf(fromDevice, run.from.terminal) : null;
  const to = toDevice.sheetId === sheetId ? endOf(toDevice, run.to.terminal) : null;
  if (fromDevice.sheetId === sheetId && toDevice.sheetId === sheetId) {
    return from !== null && to !== null ? { run, from, to, away: null } : null;
  }
  if (from !== null) return { run, from, to: null, away: toDevice };
  if (to !== null) return { run, from: null, to, away: fromDevice };
  return null;
}

/** In drawing order: by mark. The later of two that cross hops. */
export function sheetRunsOf(design: Design, sheetId: EntityId): SheetRun[] {
  const runs: SheetRun[] = [];
  for (const run of Object.values(design.runs)) {
    const sheetRun = sheetRunOf(design, sheetId, run);
    if (sheetRun !== null) runs.push(sheetRun);
  }
  return runs.sort((a, b) => compareMarks(a.run, b.run));
}

export function sheetDevicesOf(design: Design, sheetId: EntityId): Device[] {
  return Object.values(design.devices)
    .filter((device) => device.sheetId === sheetId)
    .sort(compareMarks);
}

function endOf(device: Device, name: string): RunEnd | null {
  const terminal = placeOf(device).byName.get(name);
  return terminal === undefined ? null : { device, terminal };
}
