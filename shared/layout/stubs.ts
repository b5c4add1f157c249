import type { Box, Point } from '#shared/kinds/place.ts';
import type { Design, Device } from '#shared/model/design.ts';

import { placeOf } from './device-place.ts';
import { SIDE_DIRECTION, type Direction } from './find-path.ts';
import { squareOf } from './paper.ts';
import { addCost, addRun, COST, nodeAt, STEP, type RouteGrid } from './route-grid.ts';
import type { SheetRun } from './run-ends.ts';
import type { StubLayout } from './sheet-layout.ts';

export interface StubRoute {
  readonly points: Point[];
  readonly stub: StubLayout;
}

/** A run to another sheet: a short way out of its terminal, and a flag that says where it goes on. */
export function routeStub(design: Design, grid: RouteGrid, { from, to, away }: SheetRun): StubRoute | null {
  const end = from ?? to;
  const sheet = away && design.sheets[away.sheetId];
  if (end === null || !away || !sheet) return null;
  const { terminal } = end;

  let best: { cost: number; heading: Direction; reach: number } | undefined;
  for (const heading of [0, 1, 2, 3] as const) {
    const own = terminal.sides.some((side) => SIDE_DIRECTION[side] === heading);
    const reaches = heading % 2 === 0 ? LEVEL_REACHES : UPRIGHT_REACHES;
    reaches.forEach((reach, i) => {
      const cost = (own ? 0 : 40) + i + costOf(grid, terminal, heading, reach);
      if (best === undefined || cost < best.cost) best = { cost, heading, reach };
    });
  }
  if (best === undefined) return null;
  const { heading, reach } = best;
  const tip = moved(terminal, heading, reach);
  const points = [{ x: terminal.x, y: terminal.y }, tip];
  const centre = moved(tip, heading, heading % 2 === 0 ? FLAG.width / 2 : FLAG.uprightHeight / 2);
  const onward = from !== null ? heading : (((heading + 2) % 4) as Direction);
  const stub: StubLayout = {
    ...centre,
    points: POINTS[onward],
    text: stubText(design, away),
    to: { sheetId: away.sheetId, deviceId: away.id },
  };
  addRun(grid, points);
  addCost(grid, flagBox(stub), COST.inside);
  return { points, stub };
}

/** Sheet and square of the other end. */
export function stubText(design: Design, away: Device): string {
  const sheet = design.sheets[away.sheetId];
  const { box } = placeOf(away);
  const middle = { x: box.x + box.width / 2, y: box.y + box.height / 2 };
  return sheet === undefined ? '' : `${sheet.number ?? 1}.${squareOf(sheet, middle)}`;
}

export const FLAG = { width: 34, height: 14, uprightHeight: 17, point: 6 };

export function flagBox({ x, y, points }: Pick<StubLayout, 'x' | 'y' | 'points'>): Box {
  const height = points === 'left' || points === 'right' ? FLAG.height : FLAG.uprightHeight;
  return { x: x - FLAG.width / 2, y: y - height / 2, width: FLAG.width, height };
}

const POINTS = ['right', 'down', 'left', 'up'] as const;
/** Long enough for the run's label where there is room. */
const LEVEL_REACHES = [72, 80, 64, 56, 48, 40, 32, 24, 16];
const UPRIGHT_REACHES = [40, 32, 48, 56, 24, 16];

function moved({ x, y }: Point, heading: Direction, by: number): Point {
  if (heading === 0) return { x: x + by, y };
  if (heading === 1) return { x, y: y + by };
  if (heading === 2) return { x: x - by, y };
  return { x, y: y - by };
}

/** What stands in the way of the run and its flag. */
function costOf(grid: RouteGrid, terminal: Point, heading: Direction, reach: number): number {
  let cost = 0;
  const isLevel = heading % 2 === 0;
  for (let along = STEP; along <= reach; along += STEP) {
    const node = nodeAt(grid, moved(terminal, heading, along));
    const overlap = (isLevel ? grid.level : grid.upright)[node]!;
    const crossing = (isLevel ? grid.upright : grid.level)[node]!;
    cost += grid.cost[node]! + overlap * COST.overlap + crossing * COST.crossing + grid.corner[node]! * COST.touch;
  }
  const depth = isLevel ? FLAG.width : FLAG.uprightHeight;
  const breadth = isLevel ? FLAG.height : FLAG.width;
  for (let along = 0; along <= depth + STEP; along += STEP) {
    for (let off = -breadth / 2 - 2; off <= breadth / 2 + 2; off += STEP / 2) {
      const at = moved(terminal, heading, reach + along);
      const node = nodeAt(grid, isLevel ? { x: at.x, y: at.y + off } : { x: at.x + off, y: at.y });
      cost += grid.cost[node]! + (grid.level[node]! + grid.upright[node]! + grid.corner[node]!) * 20;
    }
  }
  return cost;
}
