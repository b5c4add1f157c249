import type { Node } from '@xyflow/react';

import { kindOf } from '#shared/kinds/index.ts';
import { boxOf } from '#shared/kinds/place.ts';
import type { Design, Device, EntityId } from '#shared/model/design.ts';

export type DeviceNode = Node<{ readonly device: Device }, 'device'>;

/**
 * The devices of a sheet as the viewport's nodes, their sizes given and never measured. A device that did not change
 * keeps its node, so that only what moved is drawn again.
 */
export function createNodeCache(): (
  design: Design,
  sheetId: EntityId,
  selected: ReadonlySet<EntityId>,
) => DeviceNode[] {
  const plain = new WeakMap<Device, DeviceNode>();
  const chosen = new WeakMap<Device, DeviceNode>();
  return (design, sheetId, selected) =>
    Object.values(design.devices)
      .filter((device) => device.sheetId === sheetId)
      .map((device) => {
        const isSelected = selected.has(device.id);
        const cache = isSelected ? chosen : plain;
        const known = cache.get(device);
        if (known !== undefined) return known;
        const node = makeNode(device, isSelected);
        cache.set(device, node);
        return node;
      });
}

function makeNode(device: Device, selected: boolean): DeviceNode {
  const { x, y, width, height } = boxOf(device);
  return {
    id: device.id,
    type: 'device',
    position: { x, y },
    width,
    height,
    measured: { width, height },
    handles: [],
    data: { device },
    selected,
    draggable: false,
    selectable: false,
    connectable: false,
    focusable: true,
    ariaLabel: nameDevice(device),
  };
}

/** `F3, Fuse, House bank fuse`. */
export function nameDevice(device: Device): string {
  return [device.mark, kindOf(device)?.title ?? device.kind, device.name].filter(Boolean).join(', ');
}
