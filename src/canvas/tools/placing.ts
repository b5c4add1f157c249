import { unturnedSize, type Point } from '#shared/kinds/place.ts';
import { offerOf, placeDevice } from '#shared/edits/place-device.ts';
import { placeFusePanel } from '#shared/edits/place-fuse-panel.ts';
import type { Device } from '#shared/model/design.ts';
import { snap } from '#src/canvas/grid.ts';
import { selectDevice } from '#src/canvas/selection.ts';

import { IDLE, isEscape, type Armed, type Happening, type Outcome, type Tool, type World } from './tool.ts';

type Placing = Extract<Tool, { is: 'placing' }>;

/** A kind from the locker in hand: the next click puts it on the sheet, with Shift it stays in hand for another. */
export function onPlacing(tool: Placing, happening: Happening, world: World): Outcome {
  if (happening.type === 'move') return { tool: { ...tool, at: happening.at } };
  if (happening.type === 'down') return { tool: { ...tool, at: happening.at } };
  if (happening.type === 'up') {
    const placed = placeArmed(world, tool.armed, happening.at);
    return {
      tool: happening.shift ? { ...tool, at: happening.at } : IDLE,
      edit: placed.edit,
      selection: placed.id === undefined ? undefined : selectDevice(placed.id),
    };
  }
  if (happening.type === 'cancel' || isEscape(happening)) return { tool: IDLE, handled: true };
  return { tool };
}

/** With its middle under the pointer, on the grid. */
export function placeArmed(world: Pick<World, 'design' | 'sheetId' | 'newId'>, armed: Armed, at: Point) {
  const { design, sheetId, newId } = world;
  const corner = cornerOf(armed, at);
  const placed =
    armed.what === 'fuse-panel'
      ? placeFusePanel(design, { sheetId, at: corner, ways: armed.ways }, newId)
      : placeDevice(design, { partId: armed.partId, sheetId, at: corner }, newId);
  return { edit: placed, id: 'deviceIds' in placed ? placed.deviceIds[0] : placed.deviceId };
}

/** The upper left of what is placed with its middle at a point. */
export function cornerOf(armed: Armed, middle: Point): Point {
  const { width, height } = sizeOfArmed(armed);
  return snap({ x: middle.x - width / 2, y: middle.y - height / 2 });
}

export function sizeOfArmed(armed: Armed): { width: number; height: number } {
  if (armed.what === 'fuse-panel') return { width: 80 * armed.ways + 16, height: 72 };
  return unturnedSize(ghostOf(armed.partId));
}

/** A device as the locker would place it, at the origin: for symbols that stand off the sheet. */
export function ghostOf(partId: string): Device {
  const offered = offerOf(partId);
  return {
    id: partId,
    kind: offered?.kind.kind ?? '',
    ratings: offered?.offer.ratings ?? {},
    symbol: offered?.offer.symbol,
    sheetId: '',
    x: 0,
    y: 0,
  };
}
