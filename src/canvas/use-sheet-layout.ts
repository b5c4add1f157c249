import { useEffect, useMemo, useState } from 'react';

import { withFamily } from '#shared/edits/family.ts';
import { routeRuns } from '#shared/layout/route-runs.ts';
import type { SheetLayout } from '#shared/layout/sheet-layout.ts';
import type { Design, EntityId } from '#shared/model/design.ts';
import { useOpenDesign } from '#src/design/open-design.ts';

import { useCanvas, useCanvasStore } from './canvas-store.ts';
import { previewDesign } from './preview.ts';
import type { Selection } from './selection.ts';
import { createSheetLayouts } from './sheet-layouts.ts';
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

  // Where the hand is does not change what it holds.
  // eslint-disable-next-line react-hooks/exhaustive-deps
  const held = useMemo(() => holdInHand(design, dragging, selection), [design, dragging?.is, selection]);
  return useMemo(() => {
    if (dragging === null) return { design, layout: rest };
    const preview = previewDesign(design, dragging, selection);
    if (preview === design) return { design, layout: rest };
    const tags = Object.fromEntries(Object.entries(rest.tags).filter(([id]) => !held.devices.has(id)));
    return { design: preview, layout: routeRuns(preview, sheetId, held.runs, { runs: rest.runs, tags }) };
  }, [design, sheetId, rest, dragging, selection, held]);
}

/** What did not move stays where it lies, and stays the same object. */
function useRestLayout(design: Design, sheetId: EntityId): SheetLayout {
  const [turn, setTurn] = useState(0);
  const [layouts] = useState(() => createSheetLayouts(() => setTurn((last) => last + 1)));
  useEffect(() => {
    layouts.resume();
    return () => layouts.stop();
  }, [layouts]);
  // A turn is a layout that has come in.
  // eslint-disable-next-line react-hooks/exhaustive-deps
  return useMemo(() => layouts.layoutOf(design, sheetId), [layouts, design, sheetId, turn]);
}

function isDragging(tool: Tool): boolean {
  return tool.is === 'dragging-devices' || tool.is === 'dragging-bend';
}

/** The devices that go with the hand, and the runs that must be laid anew for it. */
function holdInHand(design: Design, tool: Tool | null, selection: Selection) {
  if (tool?.is === 'dragging-bend') return { devices: new Set<EntityId>(), runs: [tool.run] };
  const devices = new Set(tool === null ? [] : withFamily(design, [...selection.devices]));
  const runs = Object.values(design.runs).filter((run) => devices.has(run.from.device) || devices.has(run.to.device));
  return { devices, runs: runs.map(({ id }) => id) };
}
