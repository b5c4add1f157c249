import { setBends } from '#shared/edits/bends.ts';
import { moveDevices } from '#shared/edits/move-devices.ts';
import type { Design } from '#shared/model/design.ts';
import { applyPatches } from '#shared/model/patch.ts';

import type { Selection } from './selection.ts';
import type { Tool } from './tools/tool.ts';

/** The design as it looks while something is dragged. Everything that stays put keeps its identity. */
export function previewDesign(design: Design, tool: Tool, selection: Selection): Design {
  if (tool.is === 'dragging-devices' && (tool.by.x !== 0 || tool.by.y !== 0)) {
    return applyPatches(design, moveDevices(design, [...selection.devices], tool.by).patches);
  }
  if (tool.is === 'dragging-bend' && design.runs[tool.run] !== undefined) {
    return applyPatches(design, setBends(design, tool.run, tool.bends).patches);
  }
  return design;
}
