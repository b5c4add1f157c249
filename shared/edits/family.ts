import type { Design } from '#shared/model/design.ts';

/** The devices and all that is bolted to them: parts of an assembly, and what sits on their studs with no wire between. */
export function withFamily(design: Design, deviceIds: readonly string[]): string[] {
  return grow(design, deviceIds, (device) => [device.parent, device.mountedOn?.device]);
}

/** The devices and the parts of assemblies among them. */
export function withParts(design: Design, deviceIds: readonly string[]): string[] {
  return grow(design, deviceIds, (device) => [device.parent]);
}

type Hold = (device: Design['devices'][string]) => readonly (string | undefined)[];

function grow(design: Design, deviceIds: readonly string[], heldBy: Hold): string[] {
  const held = new Map<string, string[]>();
  for (const device of Object.values(design.devices)) {
    for (const holder of heldBy(device)) {
      if (holder !== undefined) held.set(holder, [...(held.get(holder) ?? []), device.id]);
    }
  }
  const found = new Set<string>();
  const waiting = deviceIds.filter((id) => Object.hasOwn(design.devices, id));
  while (waiting.length > 0) {
    const id = waiting.pop()!;
    if (found.has(id)) continue;
    found.add(id);
    waiting.push(...(held.get(id) ?? []));
  }
  return Object.keys(design.devices).filter((id) => found.has(id));
}
