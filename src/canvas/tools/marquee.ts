import { boxOf, type Box, type Point } from '#shared/kinds/place.ts';
import { joinSelections, type Selection } from '#src/canvas/selection.ts';

import { IDLE, isEscape, type Happening, type Outcome, type Tool, type World } from './tool.ts';

type Spanning = Extract<Tool, { is: 'marquee' }>;

/** What lies wholly inside is selected on release. */
export function onMarquee(tool: Spanning, happening: Happening, world: World): Outcome {
  if (happening.type === 'move') return { tool: { ...tool, at: happening.at } };
  if (happening.type === 'up') {
    const inside = selectInside(world, boxBetween(tool.start, happening.at));
    return { tool: IDLE, selection: joinSelections(tool.added, inside) };
  }
  if (happening.type === 'cancel' || isEscape(happening)) return { tool: IDLE, handled: true };
  return { tool };
}

export function boxBetween(a: Point, b: Point): Box {
  return { x: Math.min(a.x, b.x), y: Math.min(a.y, b.y), width: Math.abs(a.x - b.x), height: Math.abs(a.y - b.y) };
}

function selectInside({ design, sheetId, layout }: World, frame: Box): Selection {
  const holds = (p: Point) =>
    p.x >= frame.x && p.x <= frame.x + frame.width && p.y >= frame.y && p.y <= frame.y + frame.height;
  const devices = Object.values(design.devices).filter((device) => {
    if (device.sheetId !== sheetId) return false;
    const box = boxOf(device);
    return holds(box) && holds({ x: box.x + box.width, y: box.y + box.height });
  });
  const runs = Object.values(layout.runs).filter((run) => run.points.length > 0 && run.points.every(holds));
  return { devices: new Set(devices.map(({ id }) => id)), runs: new Set(runs.map(({ runId }) => runId)) };
}
