import type { Design, Sheet } from '#shared/model/design.ts';

import { deleteDevices } from './delete.ts';
import { refuse, remove, set, withoutUndefined, type Edit, type NewId } from './edit.ts';

export function addSheet(
  design: Design,
  sheet: Omit<Sheet, 'id' | 'number'>,
  newId: NewId,
): Edit & { sheetId: string } {
  const id = newId();
  const number = Math.max(0, ...Object.values(design.sheets).map((other) => other.number ?? 1)) + 1;
  const added: Sheet = withoutUndefined({ id, number, ...sheet });
  return { label: `Add sheet ${number}`, patches: [set(['sheets', id], added)], sheetId: id };
}

/** A sheet taken out with all that is drawn on it. The last one stays. */
export function deleteSheet(design: Design, sheetId: string): Edit {
  const sheet = design.sheets[sheetId];
  const label = `Delete sheet ${sheet?.number ?? 1}`;
  if (sheet === undefined) return { label, patches: [] };
  if (Object.keys(design.sheets).length === 1) return refuse(label, 'A design has at least one sheet.');

  const on = <Entity extends { readonly id: string; readonly sheetId?: string }>(
    family: Readonly<Record<string, Entity>>,
  ) => Object.values(family).filter((entity) => entity.sheetId === sheetId);
  const devices = deleteDevices(
    design,
    on(design.devices).map((device) => device.id),
  );
  return {
    label,
    patches: [
      ...devices.patches,
      ...on(design.notes).map((note) => remove(['notes', note.id])),
      ...on(design.zones).map((zone) => remove(['zones', zone.id, 'sheetId'])),
      remove(['sheets', sheetId]),
    ],
  };
}
