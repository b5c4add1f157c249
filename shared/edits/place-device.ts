import type { Design, Device } from '#shared/model/design.ts';
import { KINDS } from '#shared/kinds/index.ts';
import type { Kind } from '#shared/kinds/kind.ts';
import type { Point } from '#shared/kinds/place.ts';

import { callDevice, refuse, set, snap, withoutUndefined, type Edit, type NewId } from './edit.ts';
import { newMarks } from './marks.ts';

export interface PlaceOptions {
  readonly partId: string;
  readonly sheetId: string;
  /** The upper left of the symbol before turning; snapped to the grid. */
  readonly at: Point;
  readonly rotation?: Device['rotation'];
  readonly zoneId?: string;
}

/** A thing of the locker put on a sheet, with its part's ratings and the next mark of its letter. */
export function placeDevice(design: Design, options: PlaceOptions, newId: NewId): Edit & { deviceId?: string } {
  const offered = offerOf(options.partId);
  if (offered === undefined) return refuse('Place a device', 'The locker does not hold this part.');
  if (!Object.hasOwn(design.sheets, options.sheetId)) return refuse('Place a device', 'That sheet is not there.');

  const { kind, offer } = offered;
  const symbol = offer.symbol === kind.symbols[0] ? undefined : offer.symbol;
  const id = newId();
  const device: Device = withoutUndefined({
    id,
    kind: kind.kind,
    mark: newMarks(design).device({ kind: kind.kind, symbol }),
    name: nameOf(kind, offer),
    ratings: { ...offer.ratings },
    sheetId: options.sheetId,
    ...snap(options.at),
    rotation: options.rotation === 0 ? undefined : options.rotation,
    zoneId: options.zoneId,
    partId: offer.partId,
    symbol,
  });
  return { label: `Place ${callDevice(device)}`, patches: [set(['devices', id], device)], deviceId: id };
}

/** What it is, without the figures that its ratings say beside it. A fuse or breaker is known by its rating alone. */
function nameOf(kind: Kind, offer: Kind['offers'][number]): string | undefined {
  return kind.drawer === 'Protect' ? undefined : offer.title.split(',')[0];
}

export function offerOf(partId: string): { kind: Kind; offer: Kind['offers'][number] } | undefined {
  for (const kind of KINDS as unknown as readonly Kind[]) {
    const offer = kind.offers.find((known) => known.partId === partId);
    if (offer !== undefined) return { kind, offer };
  }
  return undefined;
}
