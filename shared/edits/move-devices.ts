import type { Design } from '#shared/model/design.ts';
import type { Point } from '#shared/kinds/place.ts';

import { callDevice, callMany, set, snap, type Edit } from './edit.ts';
import { withFamily } from './family.ts';

/** Devices moved, with what is bolted to them; bends of runs between two moved devices go along. */
export function moveDevices(design: Design, deviceIds: readonly string[], by: Point): Edit {
  const { x: dx, y: dy } = snap(by);
  const named = deviceIds.filter((id) => Object.hasOwn(design.devices, id));
  const label = `Move ${callMany(
    named.map((id) => callDevice(design.devices[id])),
    'devices',
  )}`;
  if (dx === 0 && dy === 0) return { label, patches: [] };

  const moved = new Set(withFamily(design, named));
  const devices = [...moved].flatMap((id) => {
    const { x, y } = design.devices[id]!;
    return [
      ...(dx === 0 ? [] : [set(['devices', id, 'x'], x + dx)]),
      ...(dy === 0 ? [] : [set(['devices', id, 'y'], y + dy)]),
    ];
  });
  const bends = Object.values(design.runs)
    .filter((run) => (run.bends?.length ?? 0) > 0 && moved.has(run.from.device) && moved.has(run.to.device))
    .map((run) =>
      set(
        ['runs', run.id, 'bends'],
        run.bends!.map(({ x, y }) => ({ x: x + dx, y: y + dy })),
      ),
    );
  return { label, patches: [...devices, ...bends] };
}
