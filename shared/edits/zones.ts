import type { Design, Zone } from '#shared/model/design.ts';

import { remove, set, withoutUndefined, type Edit, type NewId } from './edit.ts';

export function addZone(_design: Design, zone: Omit<Zone, 'id'>, newId: NewId): Edit & { zoneId: string } {
  const id = newId();
  const added: Zone = withoutUndefined({ ...zone, id });
  return { label: `Add zone ${zone.name}`, patches: [set(['zones', id], added)], zoneId: id };
}

/** A zone taken out; the devices and runs in it stay, in no zone. */
export function deleteZone(design: Design, zoneId: string): Edit {
  const zone = design.zones[zoneId];
  if (zone === undefined) return { label: 'Delete a zone', patches: [] };
  const devices = Object.values(design.devices)
    .filter((device) => device.zoneId === zoneId)
    .map((device) => remove(['devices', device.id, 'zoneId']));
  const runs = Object.values(design.runs)
    .filter((run) => run.zoneIds?.includes(zoneId))
    .map((run) =>
      set(
        ['runs', run.id, 'zoneIds'],
        run.zoneIds!.filter((id) => id !== zoneId),
      ),
    );
  const accepted = Object.keys(design.accepted ?? {})
    .filter((findingId) => findingId.split(':')[1] === zoneId)
    .map((findingId) => remove(['accepted', findingId]));
  return { label: `Delete zone ${zone.name}`, patches: [...devices, ...runs, ...accepted, remove(['zones', zoneId])] };
}
