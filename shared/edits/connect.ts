import { basisOf } from '#shared/model/defaults.ts';
import type { Design, Device, End, Run } from '#shared/model/design.ts';
import type { Size } from '#shared/model/size.ts';
import { terminalAt, type Point } from '#shared/kinds/place.ts';

import { callDevice, refuse, set, withoutUndefined, type Edit, type NewId } from './edit.ts';
import { newMarks } from './marks.ts';

/** A new run between two terminals, with the next number, a first size and the zones its ends stand in. */
export function connect(
  design: Design,
  { from, to, bends = [] }: { from: End; to: End; bends?: readonly Point[] },
  newId: NewId,
): Edit & { runId?: string } {
  const [one, other] = [design.devices[from.device], design.devices[to.device]];
  const [a, b] = [one && terminalAt(one, from.terminal), other && terminalAt(other, to.terminal)];
  const label = `Wire ${callDevice(one)} to ${callDevice(other)}`;
  if (!one || !other || !a || !b) return refuse(label, 'A run ends on a terminal at both ends.');
  if (one === other && a.name === b.name) return refuse(label, 'A run ends on two different terminals.');

  const id = newId();
  const zoneIds = [...new Set([one.zoneId, other.zoneId].filter((zone) => zone !== undefined))];
  const run: Run = withoutUndefined({
    id,
    mark: newMarks(design).run(),
    from,
    to,
    conductor: {
      size: firstSize(design, [one, other], [a.role, b.role]),
      insulationC: basisOf(design).cable.insulationC,
    },
    zoneIds: zoneIds.length > 0 ? zoneIds : undefined,
    bends: bends.length > 0 && one.sheetId === other.sheetId ? bends.map(({ x, y }) => ({ x, y })) : undefined,
  });
  return { label, patches: [set(['runs', id], run)], runId: id };
}

/** Up to these amperes these sizes: a first guess for a run whose length is not known yet. The findings judge it. */
const FIRST_SIZES: readonly (readonly [amps: number, awg: Size, metric: Size])[] = [
  [10, '14 AWG', '2.5 mm²'],
  [20, '12 AWG', '4 mm²'],
  [30, '10 AWG', '6 mm²'],
  [50, '8 AWG', '10 mm²'],
  [75, '6 AWG', '16 mm²'],
  [100, '4 AWG', '25 mm²'],
  [150, '2 AWG', '35 mm²'],
  [200, '1/0 AWG', '70 mm²'],
  [250, '2/0 AWG', '95 mm²'],
];

function firstSize(design: Design, devices: readonly Device[], roles: readonly string[]): Size {
  const isMetric = basisOf(design).profile === 'iso-13297';
  if (roles.includes('signal') || roles.includes('data')) return isMetric ? '1.5 mm²' : '16 AWG';
  if (roles.includes('bond')) return isMetric ? '10 mm²' : '8 AWG';
  const amps = Math.min(...devices.map(mostAmps), 100);
  const crank = devices.some((device) => device.kind === 'starter') ? 150 : 0;
  const fitting = FIRST_SIZES.find(([good]) => good >= Math.max(amps, crank)) ?? FIRST_SIZES.at(-1)!;
  return isMetric ? fitting[2] : fitting[1];
}

/** What a device can pass or take; a battery, or one that does not say, sets no bound. */
function mostAmps({ kind, ratings }: Device): number {
  const { ratedA, ratedW, nominalV, maxA, continuousA } = ratings as Record<string, number | undefined>;
  const amps = kind === 'load' ? (ratedA ?? (ratedW ?? 0) / (nominalV ?? 12)) : (ratedA ?? continuousA ?? maxA);
  return amps !== undefined && Number.isFinite(amps) && amps > 0 ? amps : Number.POSITIVE_INFINITY;
}
