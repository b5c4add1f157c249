import type { Design, EntityId } from '#shared/model/design.ts';

/** Devices and runs chosen on the sheet, in the ledger and in the address alike. */
export interface Selection {
  readonly devices: ReadonlySet<EntityId>;
  readonly runs: ReadonlySet<EntityId>;
}

export const NOTHING_SELECTED: Selection = { devices: new Set(), runs: new Set() };

export function selectDevice(id: EntityId): Selection {
  return { devices: new Set([id]), runs: new Set() };
}

export function selectRun(id: EntityId): Selection {
  return { devices: new Set(), runs: new Set([id]) };
}

export function sizeOfSelection(selection: Selection): number {
  return selection.devices.size + selection.runs.size;
}

/** Adds what is not selected and takes away what is: what a click with Shift does. */
export function toggleSelected(selection: Selection, family: 'devices' | 'runs', id: EntityId): Selection {
  const toggled = new Set(selection[family]);
  if (!toggled.delete(id)) toggled.add(id);
  return { ...selection, [family]: toggled };
}

export function joinSelections(a: Selection, b: Selection): Selection {
  return { devices: new Set([...a.devices, ...b.devices]), runs: new Set([...a.runs, ...b.runs]) };
}

export function isSameSelection(a: Selection, b: Selection): boolean {
  return isSameSet(a.devices, b.devices) && isSameSet(a.runs, b.runs);
}

function isSameSet(a: ReadonlySet<string>, b: ReadonlySet<string>): boolean {
  return a.size === b.size && [...a].every((id) => b.has(id));
}

/** What is still there of it: others may have deleted some, and undo takes new things away. */
export function keepExisting(selection: Selection, design: Design): Selection {
  const devices = [...selection.devices].filter((id) => Object.hasOwn(design.devices, id));
  const runs = [...selection.runs].filter((id) => Object.hasOwn(design.runs, id));
  if (devices.length === selection.devices.size && runs.length === selection.runs.size) return selection;
  return { devices: new Set(devices), runs: new Set(runs) };
}

/** Marks (or ids, where a mark is missing or used twice) joined by commas, as the address says it. */
export function writeSelection(selection: Selection, design: Design): string {
  const entities = [
    ...[...selection.devices].map((id) => design.devices[id]),
    ...[...selection.runs].map((id) => design.runs[id]),
  ].filter((entity) => entity !== undefined);
  const uses = new Map<string, number>();
  for (const { mark } of [...Object.values(design.devices), ...Object.values(design.runs)]) {
    if (mark !== undefined) uses.set(mark, (uses.get(mark) ?? 0) + 1);
  }
  return entities
    .map(({ id, mark }) => (mark !== undefined && isPlain(mark) && uses.get(mark) === 1 ? mark : id))
    .join(',');
}

export function readSelection(text: string, design: Design): Selection {
  const devices = new Set<EntityId>();
  const runs = new Set<EntityId>();
  for (const name of text.split(',').filter((part) => part !== '')) {
    if (Object.hasOwn(design.devices, name)) devices.add(name);
    else if (Object.hasOwn(design.runs, name)) runs.add(name);
    else {
      const device = Object.values(design.devices).find(({ mark }) => mark === name);
      const run = Object.values(design.runs).find(({ mark }) => mark === name);
      if (device !== undefined) devices.add(device.id);
      else if (run !== undefined) runs.add(run.id);
    }
  }
  return { devices, runs };
}

/** A mark that may stand in an address between commas, and that is no id of something else. */
function isPlain(mark: string): boolean {
  return mark !== '' && !mark.includes(',');
}
