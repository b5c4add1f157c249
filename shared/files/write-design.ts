import { kindOf } from '#shared/kinds/index.ts';
import {
  Accepted,
  Basis,
  Cable,
  Conductor,
  DeviceState,
  End,
  FORMAT,
  FORMAT_VERSION,
  Mode,
  Note,
  Run,
  Sheet,
  Vessel,
  Zone,
  type Design,
  type Device,
} from '#shared/model/design.ts';

/**
 * The file of a design: keys in the order the format is documented in, entities by id. The same design always
 * gives the same text, so that two files can be compared line by line.
 */
export function writeDesign(design: Design): string {
  return `${JSON.stringify(canonicalDesign(design), null, 2)}\n`;
}

/** `Minnow` is `minnow.ampwright.json`. */
export function fileNameOf(design: Design): string {
  const name = (design.vessel?.name ?? '')
    .normalize('NFKD')
    .replace(/[\u0300-\u036f]/g, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .slice(0, 60)
    .replace(/^-+|-+$/g, '');
  return `${name === '' ? 'design' : name}.ampwright.json`;
}

/** As written, before it is text. */
export function canonicalDesign(design: Design): object {
  return inOrder(
    {
      format: FORMAT,
      version: FORMAT_VERSION,
      vessel: design.vessel && inOrder(design.vessel, keysOf(Vessel)),
      basis: inOrder(design.basis, keysOf(Basis)),
      sheets: byId(design.sheets, (sheet) => inOrder(sheet, keysOf(Sheet))),
      zones: byId(design.zones, (zone) => inOrder(zone, keysOf(Zone))),
      devices: byId(design.devices, canonicalDevice),
      runs: byId(design.runs, canonicalRun),
      modes: byId(design.modes, (mode) =>
        inOrder(
          {
            ...mode,
            states: mode.states && byId(mode.states, (state) => inOrder(state, keysOf(DeviceState))),
          },
          keysOf(Mode),
        ),
      ),
      notes: byId(design.notes, (note) => inOrder(note, keysOf(Note))),
      cables: design.cables && byId(design.cables, (cable) => inOrder(cable, keysOf(Cable))),
      accepted: design.accepted && byId(design.accepted, (accepted) => inOrder(accepted, keysOf(Accepted))),
    },
    [],
  );
}

const DEVICE_KEYS: readonly string[] = [
  'id',
  'kind',
  'mark',
  'name',
  'ratings',
  'sheetId',
  'x',
  'y',
  'rotation',
  'pitch',
  'zoneId',
  'partId',
  'symbol',
  'locked',
  'note',
  'work',
  'studs',
  'parent',
  'mountedOn',
  'maxAmbientC',
  'ignitionProtected',
  'installedYear',
  'verified',
];

function canonicalDevice(device: Device): object {
  return inOrder(
    {
      ...device,
      ratings: inOrder(device.ratings, Object.keys(kindOf(device)?.ratings.shape ?? {})),
      studs: device.studs && byId(device.studs, (stud) => stud),
      mountedOn: device.mountedOn && inOrder(device.mountedOn, keysOf(End)),
    },
    DEVICE_KEYS,
  );
}

function canonicalRun(run: Run): object {
  return inOrder(
    {
      ...run,
      from: inOrder(run.from, keysOf(End)),
      to: inOrder(run.to, keysOf(End)),
      conductor: inOrder(run.conductor, keysOf(Conductor)),
      bends: run.bends?.map(({ x, y }) => ({ x, y })),
    },
    keysOf(Run),
  );
}

function keysOf(schema: { readonly shape: object }): readonly string[] {
  return Object.keys(schema.shape);
}

/** The keys that are there, those of the list first and in its order; what is undefined is left out. */
function inOrder(value: object, keys: readonly string[]): object {
  const entries = Object.entries(value).filter(([, entry]) => entry !== undefined);
  const rank = (key: string) => (keys.includes(key) ? keys.indexOf(key) : keys.length);
  return Object.fromEntries(entries.sort(([a], [b]) => rank(a) - rank(b)));
}

function byId<Value>(record: Readonly<Record<string, Value>>, write: (value: Value) => unknown): object {
  const sorted = Object.entries(record).sort(([a], [b]) => (a < b ? -1 : a > b ? 1 : 0));
  return Object.fromEntries(sorted.map(([id, value]) => [id, write(value)]));
}
