import type { Design } from '#shared/model/design.ts';
import type { Patch } from '#shared/model/patch.ts';

import { callDevice, callMany, callRun, remove, type Edit } from './edit.ts';
import { withParts } from './family.ts';

export interface Selection {
  readonly devices: readonly string[];
  readonly runs: readonly string[];
}

/**
 * Devices and runs taken out, with the parts of assemblies among them, every run that ended on them, and all that
 * pointed at them: places on their studs, what backed what up, states in modes, accepted findings.
 */
export function deleteSelection(design: Design, selection: Selection, verb: 'Delete' | 'Cut' = 'Delete'): Edit {
  const devices = new Set(withParts(design, selection.devices));
  const chosenRuns = new Set(selection.runs);
  const runs = Object.values(design.runs).filter(
    (run) => chosenRuns.has(run.id) || devices.has(run.from.device) || devices.has(run.to.device),
  );
  const gone = new Set([...devices, ...runs.map((run) => run.id)]);

  const patches = [
    ...runs.map((run) => remove(['runs', run.id])),
    ...emptyCables(design, gone),
    ...[...devices].map((id) => remove(['devices', id])),
    ...pointersTo(design, devices),
    ...acceptancesOf(design, gone),
  ];
  return { label: `${verb} ${nameAll(design, selection)}`, patches };
}

export function deleteDevices(design: Design, deviceIds: readonly string[]): Edit {
  return deleteSelection(design, { devices: deviceIds, runs: [] });
}

export function deleteRuns(design: Design, runIds: readonly string[]): Edit {
  return deleteSelection(design, { devices: [], runs: runIds });
}

function nameAll(design: Design, { devices, runs }: Selection): string {
  if (devices.length === 0) {
    return callMany(
      runs.map((id) => callRun(design.runs[id])),
      'runs',
    );
  }
  const named = callMany(
    devices.map((id) => callDevice(design.devices[id])),
    'devices',
  );
  if (runs.length === 0) return named;
  return `${named} and ${callMany(
    runs.map((id) => callRun(design.runs[id])),
    'runs',
  )}`;
}

function emptyCables(design: Design, gone: ReadonlySet<string>): Patch[] {
  const left = new Set<string>();
  const touched = new Set<string>();
  for (const run of Object.values(design.runs)) {
    if (run.cable !== undefined) (gone.has(run.id) ? touched : left).add(run.cable);
  }
  return [...touched].filter((id) => !left.has(id)).map((id) => remove(['cables', id]));
}

function* pointersTo(design: Design, devices: ReadonlySet<string>): Generator<Patch> {
  if (devices.size === 0) return;
  for (const device of Object.values(design.devices)) {
    if (devices.has(device.id)) continue;
    if (device.mountedOn && devices.has(device.mountedOn.device)) yield remove(['devices', device.id, 'mountedOn']);
    if (devices.has(String(device.ratings.backedUpBy))) yield remove(['devices', device.id, 'ratings', 'backedUpBy']);
  }
  for (const mode of Object.values(design.modes)) {
    for (const id of Object.keys(mode.states ?? {})) {
      if (devices.has(id)) yield remove(['modes', mode.id, 'states', id]);
    }
  }
}

/** A finding's id is its rule, subject and terminal joined by colons. */
function acceptancesOf(design: Design, gone: ReadonlySet<string>): Patch[] {
  return Object.keys(design.accepted ?? {})
    .filter((findingId) => gone.has(findingId.split(':')[1] ?? ''))
    .map((findingId) => remove(['accepted', findingId]));
}
