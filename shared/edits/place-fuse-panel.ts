import type { Design, Device } from '#shared/model/design.ts';
import { terminalAt, UNIT, type Point } from '#shared/kinds/place.ts';

import { refuse, set, snap, withoutUndefined, type Edit, type NewId } from './edit.ts';
import { newMarks } from './marks.ts';
import { offerOf } from './place-device.ts';

export interface FusePanelOptions {
  readonly sheetId: string;
  /** The upper left of the busbar. */
  readonly at: Point;
  /** How many fuses; one more stud takes the feed. */
  readonly ways: number;
  readonly fusePartId?: string;
  readonly zoneId?: string;
  /** Between neighbouring fuses, in sheet units; room for a tag beside each. */
  readonly pitch?: number;
}

/** The feed has a stud of its own, left of the fuses. */
const FEED_STUDS = 1;
const RATED_A = 100;

/**
 * A fuse panel: a positive busbar with a fuse bolted on each stud but the first, which takes the feed. The fuses
 * hang below the bar, turned so that their `a` stands on its stud, and belong to the bar: they move with it.
 */
export function placeFusePanel(
  design: Design,
  options: FusePanelOptions,
  newId: NewId,
): Edit & { deviceIds: string[] } {
  const fuse = offerOf(options.fusePartId ?? 'fuse-blade-10');
  if (fuse?.kind.kind !== 'fuse')
    return { ...refuse('Place a fuse panel', 'A fuse panel takes fuses.'), deviceIds: [] };
  if (!Object.hasOwn(design.sheets, options.sheetId)) {
    return { ...refuse('Place a fuse panel', 'That sheet is not there.'), deviceIds: [] };
  }
  const ways = Math.min(24, Math.max(1, Math.round(options.ways)));
  const marks = newMarks(design);
  const bar: Device = withoutUndefined({
    id: newId(),
    kind: 'busbar',
    mark: marks.device({ kind: 'busbar' }),
    name: `Fuse panel, ${ways} ways`,
    ratings: { ratedA: RATED_A, maxV: 32, role: 'dc+', studs: ways + FEED_STUDS },
    sheetId: options.sheetId,
    ...snap(options.at),
    pitch: options.pitch ?? 80,
    zoneId: options.zoneId,
  });
  const fuses = Array.from({ length: ways }, (_, i): Device => {
    const terminal = String(i + 1 + FEED_STUDS);
    return withoutUndefined({
      id: newId(),
      kind: 'fuse',
      mark: marks.device({ kind: 'fuse' }),
      ratings: { ...fuse.offer.ratings },
      sheetId: options.sheetId,
      ...placeOn(terminalAt(bar, terminal)!),
      rotation: 90 as const,
      zoneId: options.zoneId,
      partId: fuse.offer.partId,
      symbol: fuse.offer.symbol,
      parent: bar.id,
      mountedOn: { device: bar.id, terminal },
    });
  });
  const devices = [bar, ...fuses];
  return {
    label: `Place a fuse panel, ${ways} ways`,
    patches: devices.map((device) => set(['devices', device.id], device)),
    deviceIds: devices.map((device) => device.id),
  };
}

/** Where a fuse that hangs below a stud, turned by 90°, has its upper left before turning: it is 6 by 2 squares. */
function placeOn(stud: Point): Point {
  return { x: stud.x - 3 * UNIT, y: stud.y + 2 * UNIT };
}
