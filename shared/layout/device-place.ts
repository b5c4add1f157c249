import { boxOf, terminalsOf, type Box, type PlacedTerminal } from '#shared/kinds/place.ts';
import type { Device } from '#shared/model/design.ts';

export interface DevicePlace {
  readonly box: Box;
  readonly terminals: readonly PlacedTerminal[];
  readonly byName: ReadonlyMap<string, PlacedTerminal>;
}

/** Reading ratings is dear, and a device that did not change has not moved: kept as long as the device is. */
const known = new WeakMap<Device, DevicePlace>();

export function placeOf(device: Device): DevicePlace {
  const kept = known.get(device);
  if (kept !== undefined) return kept;
  const terminals = terminalsOf(device);
  const place = {
    box: boxOf(device),
    terminals,
    byName: new Map(terminals.map((terminal) => [terminal.name, terminal])),
  };
  known.set(device, place);
  return place;
}
