import type { Design, EntityId } from '#shared/model/design.ts';

import { drawSheet } from './draw-sheet.ts';
import type { SheetLayout } from './sheet-layout.ts';

/**
 * Everything of a sheet in its place: tags beside their devices, runs round both, hops where runs cross, and labels
 * where nothing else is. The same design gives the same picture.
 *
 * With the layout of before, what nobody touched stays where it was, and stays the same object: only runs whose ends
 * moved are routed, and those that something has come in the way of.
 */
export function layoutSheet(design: Design, sheetId: EntityId, previous?: SheetLayout): SheetLayout {
  return drawSheet(design, sheetId, previous, null);
}
