import { isDeepStrictEqual } from 'node:util';

import { kindOf } from '#shared/kinds/index.ts';
import type { Device, End, Family, Mode, Note, Run, Zone } from '#shared/model/design.ts';

/** That one entity names another, by the field it does it in; with the terminal where it is an end. */
export interface Reference {
  readonly field: string;
  readonly toFamily: Family;
  readonly toId: string;
  readonly terminal?: string;
}

/** What an entity of a family names. What is named must be there: a file that names something missing is refused. */
export function referencesOf(family: Family, entity: unknown): Reference[] {
  if (entity === undefined) return [];
  switch (family) {
    case 'devices':
      return referencesOfDevice(entity as Device);
    case 'runs':
      return referencesOfRun(entity as Run);
    case 'zones':
      return named('sheetId', 'sheets', (entity as Zone).sheetId);
    case 'notes':
      return named('sheetId', 'sheets', (entity as Note).sheetId);
    case 'modes':
      return Object.keys((entity as Mode).states ?? {}).flatMap((id) => named(`states.${id}`, 'devices', id));
    default:
      return [];
  }
}

export function terminalNamesOf(device: Device): ReadonlySet<string> {
  return new Set(
    kindOf(device)
      ?.terminals(device)
      .map((terminal) => terminal.name),
  );
}

/** Whether the same things are named, so that nothing needs to be written or looked up again. */
export function namesTheSame(a: readonly Reference[], b: readonly Reference[]): boolean {
  return isDeepStrictEqual(a, b);
}

function referencesOfDevice(device: Device): Reference[] {
  return [
    ...named('sheetId', 'sheets', device.sheetId),
    ...named('zoneId', 'zones', device.zoneId),
    ...named('parent', 'devices', device.parent),
    ...named('ratings.backedUpBy', 'devices', device.ratings['backedUpBy'] as string | undefined),
    ...(device.mountedOn === undefined ? [] : [endOf('mountedOn', device.mountedOn)]),
  ];
}

function referencesOfRun(run: Run): Reference[] {
  return [
    endOf('from', run.from),
    endOf('to', run.to),
    ...named('cable', 'cables', run.cable),
    ...(run.zoneIds ?? []).flatMap((id, i) => named(`zoneIds.${i}`, 'zones', id)),
  ];
}

function endOf(field: string, end: End): Reference {
  return { field, toFamily: 'devices', toId: end.device, terminal: end.terminal };
}

function named(field: string, toFamily: Family, toId: string | undefined): Reference[] {
  return toId === undefined ? [] : [{ field, toFamily, toId }];
}
