import type { Design, Device } from '#shared/model/design.ts';
import { unturnedSize, type Point } from '#shared/kinds/place.ts';

import { callDevice, callMany, set, type Edit } from './edit.ts';
import { withFamily } from './family.ts';

/** Each device turned a quarter clockwise about its centre; an assembly turns as one piece about its bar's. */
export function rotateDevices(design: Design, deviceIds: readonly string[]): Edit {
  const named = deviceIds.filter((id) => Object.hasOwn(design.devices, id));
  const label = `Turn ${callMany(
    named.map((id) => callDevice(design.devices[id])),
    'devices',
  )}`;
  const chosen = new Set(named);
  const isHeld = (id: string) => {
    const { parent, mountedOn } = design.devices[id]!;
    return (parent !== undefined && chosen.has(parent)) || (mountedOn !== undefined && chosen.has(mountedOn.device));
  };

  const turned = new Set<string>();
  const patches = named
    .filter((id) => !isHeld(id))
    .flatMap((id) => {
      const pivot = centreOf(design.devices[id]!);
      return withFamily(design, [id])
        .filter((member) => !turned.has(member) && turned.add(member))
        .flatMap((member) => turn(design.devices[member]!, pivot));
    });
  return { label, patches };
}

/** Sizes are even in grid squares, so that centres stand on the grid and terminals stay on it. */
function centreOf(device: Device): Point {
  const { width, height } = unturnedSize(device);
  return { x: device.x + width / 2, y: device.y + height / 2 };
}

function turn(device: Device, pivot: Point) {
  const centre = centreOf(device);
  const x = device.x - centre.x + pivot.x - (centre.y - pivot.y);
  const y = device.y - centre.y + pivot.y + (centre.x - pivot.x);
  const patches = [set(['devices', device.id, 'rotation'], ((device.rotation ?? 0) + 90) % 360)];
  if (x !== device.x) patches.push(set(['devices', device.id, 'x'], x));
  if (y !== device.y) patches.push(set(['devices', device.id, 'y'], y));
  return patches;
}
