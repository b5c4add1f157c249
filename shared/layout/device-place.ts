import { boxOf, terminalsOf, type Box, type PlacedTerminal } from '#shared/kinds/place.ts';
import type { Device } from '#shared/model/design.ts';

export interface DevicePlace {
  readonly box: Box;
  /** The box with what the symbol draws beyond it: blades of contacts, a float, the arm of a push button. */
  readonly inked: Box;
  readonly terminals: readonly PlacedTerminal[];
  readonly byName: ReadonlyMap<string, PlacedTerminal>;
}

/** Reading ratings is dear, and a device that did not change has not moved: kept as long as the device is. */
const known = new WeakMap<Device, DevicePlace>();

export function placeOf(device: Device): DevicePlace {
  const kept = known.get(device);
  if (kept !== undefined) return kept;
  const terminals = terminalsOf(device);
  const box = boxOf(device);
  const place = {
    box,
    inked: inkedBox(device, box),
    terminals,
    byName: new Map(terminals.map((terminal) => [terminal.name, terminal])),
  };
  known.set(device, place);
  return place;
}

function inkedBox(device: Device, box: Box): Box {
  if (device.kind !== 'switch' && device.kind !== 'breaker') return box;
  const over = device.symbol === 'float' ? 12 : 5;
  const turned = (device.rotation ?? 0) % 180 !== 0;
  return turned
    ? { ...box, x: box.x - over, width: box.width + 2 * over }
    : { ...box, y: box.y - over, height: box.height + 2 * over };
}
