import { useEffect, useMemo, useRef } from 'react';

import { withFamily } from '#shared/edits/family.ts';
import { layoutSheet } from '#shared/layout/layout-sheet.ts';
import { routeRuns } from '#shared/layout/route-runs.ts';
import type { SheetLayout } from '#shared/layout/sheet-layout.ts';
import type { Design, EntityId } from '#shared/model/design.ts';
import { useOpenDesign } from '#src/design/open-design.ts';

import { useCanvas, useCanvasStore } from './canvas-store.ts';
import { previewDesign } from './preview.ts';
import type { Selection } from './selection.ts';
import type { Tool } from './tools/tool.ts';

/** The sheet as it is drawn now: at rest the whole layout, while something is dragged only its runs laid anew. */
export function useSheetLayout(): { readonly design: Design; readonly layout: SheetLayout } {
  const design = useOpenDesign((open) => open.design);
  const sheetId = useCanvas((canvas) => canvas.sheetId);
  const selection = useCanvas((canvas) => canvas.selection);
  const dragging = useCanvas((canvas) => (isDragging(canvas.tool) ? canvas.tool : null));
  const store = useCanvasStore();
  const rest = useRestLayout(design, sheetId);

  useEffect(() => {
    store.setState({ layout: rest });
  }, [store, rest]);

  return useMemo(() => {
    if (dragging === null) return { design, layout: rest };
    const preview = previewDesign(design, dragging, selection);
    if (preview === design) return { design, layout: rest };
    return { design: preview, layout: routeRuns(preview, sheetId, runsInHand(design, dragging, selection), rest) };
  }, [design, sheetId, rest, dragging, selection]);
}

/** Laid with the last layout of the sheet beside it, so that what did not move stays the same object. */
function useRestLayout(design: Design, sheetId: EntityId): SheetLayout {
  const last = useRef<{ readonly sheetId: EntityId; readonly layout: SheetLayout } | null>(null);
  const { sheets, devices, runs, zones, notes, basis } = design;
  const layout = useMemo(
    () => layoutSheet(design, sheetId, last.current?.sheetId === sheetId ? last.current.layout : undefined),
    // What the layout does not read does not lay it anew.
    // eslint-disable-next-line react-hooks/exhaustive-deps
    [sheetId, sheets, devices, runs, zones, notes, basis],
  );
  useEffect(() => {
    last.current = { sheetId, layout };
  }, [sheetId, layout]);
  return layout;
}

function isDragging(tool: Tool): boolean {
  return tool.is === 'dragging-devices' || tool.is === 'dragging-bend';
}

function runsInHand(design: Design, tool: Tool, selection: Selection): EntityId[] {
  if (tool.is === 'dragging-bend') return [tool.run];
  const moved = new Set(withFamily(design, [...selection.devices]));
  return Object.values(design.runs)
    .filter((run) => moved.has(run.from.device) || moved.has(run.to.device))
    .map((run) => run.id);
}
