import type { Box, Point } from '#shared/kinds/place.ts';
import type { Design, Device, EntityId, Run, Sheet } from '#shared/model/design.ts';

import { coreWidth, OUTLINE } from './core-width.ts';
import { placeOf } from './device-place.ts';
import { cautionBox, frameBox, paperSize, titleBlockBox } from './paper.ts';
import {
  addCost,
  addDevice,
  addOffSheet,
  addTerminal,
  copyGrid,
  COST,
  makeGrid,
  type RouteGrid,
} from './route-grid.ts';
import type { SheetRun } from './run-ends.ts';
import { HOP_RADIUS } from './run-path.ts';
import { flagBox } from './stubs.ts';
import type { RunLayout, StubLayout } from './sheet-layout.ts';
import { grow, makeSpace, segmentBox, take, takeRun, WEIGHT, type Space } from './space.ts';
import { textWidth, wrapText } from './text-width.ts';

export const NOTE = { size: 9, line: 11, width: 160 };

/** The sheet before anything is routed: its devices, notes and zones in the way of runs. */
export function gridOf(design: Design, sheet: Sheet, devices: readonly Device[]): RouteGrid {
  const grid = copyGrid(emptyGrid(sheet));
  for (const device of devices) {
    const { box, terminals } = placeOf(device);
    addDevice(grid, box);
    for (const terminal of terminals) addTerminal(grid, terminal);
  }
  for (const note of notesOf(design, sheet.id)) addCost(grid, note, COST.text);
  for (const name of zoneNamesOf(design, sheet.id)) addCost(grid, name, COST.text);
  return grid;
}

const emptyGrids = new Map<string, RouteGrid>();

/** Each paper's once: most of its squares are off any device. */
function emptyGrid(sheet: Sheet): RouteGrid {
  const { width, height } = paperSize(sheet);
  const paper = `${width} ${height}`;
  const kept = emptyGrids.get(paper);
  if (kept !== undefined) return kept;
  const grid = makeGrid(width, height);
  addOffSheet(grid, frameBox(sheet), [titleBlockBox(sheet), cautionBox(sheet)]);
  emptyGrids.set(paper, grid);
  return grid;
}

/** What labels and tags keep clear of before any of them stands. */
export function spaceOf(design: Design, sheet: Sheet, devices: readonly Device[]): Space {
  const space = makeSpace();
  const { width, height } = paperSize(sheet);
  const frame = frameBox(sheet);
  const right = frame.x + frame.width;
  const bottom = frame.y + frame.height;
  const edges: Box[] = [
    { x: -64, y: -64, width: width + 128, height: 64 + frame.y },
    { x: -64, y: bottom, width: width + 128, height: height - bottom + 64 },
    { x: -64, y: -64, width: 64 + frame.x, height: height + 128 },
    { x: right, y: -64, width: width - right + 64, height: height + 128 },
    titleBlockBox(sheet),
    cautionBox(sheet),
  ];
  for (const edge of edges) take(space, edge, WEIGHT.frame);
  for (const device of devices) take(space, grow(placeOf(device).inked, 1), WEIGHT.device, device.id);
  for (const note of notesOf(design, sheet.id)) take(space, note, WEIGHT.text);
  for (const zone of Object.values(design.zones)) {
    const { sheetId, x, y, width: w, height: h } = zone;
    if (sheetId !== sheet.id || x === undefined || y === undefined || w === undefined || h === undefined) continue;
    const corners = [
      { x, y },
      { x: x + w, y },
      { x: x + w, y: y + h },
      { x, y: y + h },
    ];
    takeRun(space, [...corners, corners[0]!], 0.5, WEIGHT.zone, zone.id);
  }
  for (const name of zoneNamesOf(design, sheet.id)) take(space, name, WEIGHT.text);
  return space;
}

export function takeRunLayout(space: Space, run: Run, layout: Pick<RunLayout, 'points' | 'hops' | 'stubs'>): void {
  takeRun(space, layout.points, coreWidth(run) / 2 + OUTLINE + 1, WEIGHT.run, run.id);
  for (const hop of layout.hops) take(space, grow({ ...hop, width: 0, height: 0 }, HOP_RADIUS + 3), WEIGHT.run, run.id);
  for (const stub of layout.stubs) takeFlag(space, stub);
}

export function takeFlag(space: Space, stub: StubLayout): void {
  take(space, grow(flagBox(stub), 1), WEIGHT.flag);
}

/**
 * The first step out of every terminal that a run leaves by its own side, further where it runs straight to its
 * other end: tags stand before runs are routed, and keep out of these.
 */
export function takeWaysOut(space: Space, runs: readonly SheetRun[]): void {
  for (const { from, to } of runs) {
    for (const [end, other] of [
      [from, to],
      [to, from],
    ] as const) {
      const side = end?.terminal.sides.length === 1 ? end.terminal.sides[0] : undefined;
      if (end === null || side === undefined) continue;
      const { x, y } = end.terminal;
      const isLevel = side === 'left' || side === 'right';
      const sign = side === 'right' || side === 'bottom' ? 1 : -1;
      const toOther = other && (isLevel ? other.terminal.y === y : other.terminal.x === x);
      const reach = toOther ? Math.abs(isLevel ? other.terminal.x - x : other.terminal.y - y) / 2 : 24;
      const tip: Point = isLevel ? { x: x + sign * reach, y } : { x, y: y + sign * reach };
      take(space, segmentBox({ x, y }, tip, 6), WEIGHT.run);
    }
  }
}

export function notesOf(design: Design, sheetId: EntityId): Box[] {
  return Object.values(design.notes)
    .filter((note) => note.sheetId === sheetId)
    .map(({ x, y, text, width }) => {
      const lines = wrapText(text, NOTE.size, width ?? NOTE.width);
      const widest = Math.max(0, ...lines.map((line) => textWidth(line, NOTE.size)));
      return { x, y, width: widest, height: lines.length * NOTE.line + 2 };
    });
}

/** Where the names of zones stand, low under their upper left corner. */
function zoneNamesOf(design: Design, sheetId: EntityId): Box[] {
  return Object.values(design.zones).flatMap(({ sheetId: on, x, y, name }) =>
    on === sheetId && x !== undefined && y !== undefined
      ? [{ x: x + 6, y: y + 3, width: textWidth(name, 9.5) + 40, height: 13 }]
      : [],
  );
}
