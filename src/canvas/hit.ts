import { boxOf, terminalsOf, type Box, type PlacedTerminal, type Point } from '#shared/kinds/place.ts';
import type { SheetLayout } from '#shared/layout/sheet-layout.ts';
import type { Design, Device, EntityId } from '#shared/model/design.ts';

import type { Selection } from './selection.ts';

/** What lies under the pointer. */
export type Target =
  | { readonly on: 'terminal'; readonly device: EntityId; readonly terminal: string; readonly at: Point }
  | { readonly on: 'bend'; readonly run: EntityId; readonly index: number }
  | { readonly on: 'stub'; readonly run: EntityId; readonly sheetId: EntityId; readonly device: EntityId }
  | { readonly on: 'device'; readonly device: EntityId }
  | { readonly on: 'run'; readonly run: EntityId }
  | { readonly on: 'nothing' };

export interface Scene {
  readonly design: Design;
  readonly sheetId: EntityId;
  readonly layout: SheetLayout;
  readonly selection: Selection;
  /** Sheet units a screen pixel is long: what can be hit stays as wide for the hand however far the sheet is. */
  readonly unitsPerPixel: number;
}

/** A terminal is caught within 12 sheet units while a run is drawn, and more closely when a press has to choose. */
export const CATCH_UNITS = 12;
const PRESS_PIXELS = 6;
const GRIP_PIXELS = 8;

const NOTHING: Target = { on: 'nothing' };

/** Small things lie above large ones: grips, terminals, devices, runs. */
export function hitAt(scene: Scene, at: Point): Target {
  return (
    hitBend(scene, at) ??
    hitTerminal(scene, at, Math.min(CATCH_UNITS, Math.max(4, PRESS_PIXELS * scene.unitsPerPixel))) ??
    hitDevice(scene, at) ??
    hitStub(scene, at) ??
    hitRun(scene, at) ??
    NOTHING
  );
}

/** The nearest terminal of the sheet within `reach`. */
export function hitTerminal(
  { design, sheetId }: Pick<Scene, 'design' | 'sheetId'>,
  at: Point,
  reach: number,
  except?: { readonly device: EntityId; readonly terminal: string },
): Extract<Target, { on: 'terminal' }> | undefined {
  let nearest: { device: Device; terminal: PlacedTerminal } | undefined;
  let nearestUnits = reach;
  for (const device of Object.values(design.devices)) {
    if (device.sheetId !== sheetId || !isWithin(boxOf(device), at, reach)) continue;
    for (const terminal of terminalsOf(device)) {
      if (except?.device === device.id && except.terminal === terminal.name) continue;
      const units = Math.hypot(terminal.x - at.x, terminal.y - at.y);
      if (units > nearestUnits) continue;
      nearest = { device, terminal };
      nearestUnits = units;
    }
  }
  if (nearest === undefined) return undefined;
  const { device, terminal } = nearest;
  return { on: 'terminal', device: device.id, terminal: terminal.name, at: { x: terminal.x, y: terminal.y } };
}

function hitBend({ design, selection, unitsPerPixel }: Scene, at: Point): Target | undefined {
  const reach = GRIP_PIXELS * unitsPerPixel;
  for (const id of selection.runs) {
    const bends = design.runs[id]?.bends ?? [];
    const index = bends.findIndex((bend) => Math.hypot(bend.x - at.x, bend.y - at.y) <= reach);
    if (index >= 0) return { on: 'bend', run: id, index };
  }
  return undefined;
}

/** The smallest device under the point, so that one on another can be had. */
function hitDevice({ design, sheetId }: Scene, at: Point): Target | undefined {
  let best: { id: EntityId; area: number } | undefined;
  for (const device of Object.values(design.devices)) {
    if (device.sheetId !== sheetId) continue;
    const box = boxOf(device);
    if (!isWithin(box, at, 2)) continue;
    const area = box.width * box.height;
    if (best === undefined || area < best.area) best = { id: device.id, area };
  }
  return best === undefined ? undefined : { on: 'device', device: best.id };
}

function hitStub({ layout }: Scene, at: Point): Target | undefined {
  for (const run of Object.values(layout.runs)) {
    const stub = run.stubs.find(({ x, y }) => Math.abs(x - at.x) <= 18 && Math.abs(y - at.y) <= 10);
    if (stub !== undefined) return { on: 'stub', run: run.runId, sheetId: stub.to.sheetId, device: stub.to.deviceId };
  }
  return undefined;
}

function hitRun({ layout, unitsPerPixel }: Scene, at: Point): Target | undefined {
  const reach = Math.max(3.5, PRESS_PIXELS * unitsPerPixel);
  let best: { id: EntityId; units: number } | undefined;
  for (const run of Object.values(layout.runs)) {
    const units = distanceToLine(run.points, at);
    if (units <= reach && (best === undefined || units < best.units)) best = { id: run.runId, units };
  }
  if (best !== undefined) return { on: 'run', run: best.id };
  const labelled = Object.values(layout.runs).find((run) => run.label !== null && isWithin(run.label.box, at, 0));
  return labelled === undefined ? undefined : { on: 'run', run: labelled.runId };
}

export function distanceToLine(points: readonly Point[], at: Point): number {
  let least = Infinity;
  for (let i = 1; i < points.length; i++) least = Math.min(least, distanceToLeg(points[i - 1]!, points[i]!, at));
  return least;
}

export function distanceToLeg(a: Point, b: Point, at: Point): number {
  const [dx, dy] = [b.x - a.x, b.y - a.y];
  const long = dx * dx + dy * dy;
  const share = long === 0 ? 0 : Math.min(1, Math.max(0, ((at.x - a.x) * dx + (at.y - a.y) * dy) / long));
  return Math.hypot(at.x - a.x - share * dx, at.y - a.y - share * dy);
}

export function isWithin(box: Box, at: Point, reach: number): boolean {
  return (
    at.x >= box.x - reach &&
    at.x <= box.x + box.width + reach &&
    at.y >= box.y - reach &&
    at.y <= box.y + box.height + reach
  );
}
