import type { Design, EntityId } from '#shared/model/design.ts';

import { drawSheet } from './draw-sheet.ts';
import type { SheetLayout } from './sheet-layout.ts';

/**
 * Only the given runs anew, with the tags of the devices at their ends, while something is dragged: the others keep
 * their routes (and their objects, unless a hop comes or goes), though the dragged lie over them. On release
 * `layoutSheet` leads them round it.
 */
export function routeRuns(
  design: Design,
  sheetId: EntityId,
  runIds: readonly EntityId[],
  layout: SheetLayout,
): SheetLayout {
  return drawSheet(design, sheetId, layout, new Set(runIds));
}
