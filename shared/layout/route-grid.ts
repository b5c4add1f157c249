import type { Box, Point } from '#shared/kinds/place.ts';

/**
 * The sheet as squares of 8 with what each costs a run to pass. Costs are in squares: a run goes that far round to
 * avoid the thing. Nothing is forbidden, so that every run has a route, however crowded the sheet.
 */
export interface RouteGrid {
  readonly columns: number;
  readonly rows: number;
  /** Devices, tags, flags, title block. */
  readonly cost: Float32Array;
  /** How many level and upright runs pass. */
  readonly level: Uint8Array;
  readonly upright: Uint8Array;
  /** Corners and ends of runs, and terminals. */
  readonly corner: Uint8Array;
  /** All of the above summed, as a search asks for it: to come here level or upright, */
  readonly enterLevel: Float32Array;
  readonly enterUpright: Float32Array;
  /** to come from the square at the left, or the one above, on top of another run, and the same back, */
  readonly shareLevel: Float32Array;
  readonly shareUpright: Float32Array;
  /** and to turn here. */
  readonly turn: Float32Array;
}

export const STEP = 8;

export const COST = {
  bend: 5,
  crossing: 7,
  /** On top of another run. */
  overlap: 150,
  /** Through a corner, an end or a terminal that is not the run's own. */
  touch: 150,
  /** Nearer than a lane to a run beside it. */
  lane: 2,
  inside: 1000,
  edge: 25,
  near: 0.75,
  /** Notes and names of zones, which stay where they are. */
  text: 12,
  /** Tags, which are placed again once the runs lie. */
  tag: 3,
  /** Leaving a terminal by another side than its own. */
  sideways: 8,
  backwards: 60,
  offSheet: 500,
  nearFrame: 3,
} as const;

export function makeGrid(width: number, height: number): RouteGrid {
  const columns = Math.ceil(width / STEP) + 1;
  const rows = Math.ceil(height / STEP) + 1;
  const size = columns * rows;
  return {
    columns,
    rows,
    cost: new Float32Array(size),
    level: new Uint8Array(size),
    upright: new Uint8Array(size),
    corner: new Uint8Array(size),
    enterLevel: new Float32Array(size).fill(1),
    enterUpright: new Float32Array(size).fill(1),
    shareLevel: new Float32Array(size),
    shareUpright: new Float32Array(size),
    turn: new Float32Array(size).fill(COST.bend),
  };
}

/** The same squares with nothing routed yet. */
export function copyGrid(grid: RouteGrid): RouteGrid {
  return {
    columns: grid.columns,
    rows: grid.rows,
    cost: grid.cost.slice(),
    level: grid.level.slice(),
    upright: grid.upright.slice(),
    corner: grid.corner.slice(),
    enterLevel: grid.enterLevel.slice(),
    enterUpright: grid.enterUpright.slice(),
    shareLevel: grid.shareLevel.slice(),
    shareUpright: grid.shareUpright.slice(),
    turn: grid.turn.slice(),
  };
}

export function nodeAt(grid: RouteGrid, point: Point): number {
  const column = Math.min(grid.columns - 1, Math.max(0, Math.round(point.x / STEP)));
  const row = Math.min(grid.rows - 1, Math.max(0, Math.round(point.y / STEP)));
  return row * grid.columns + column;
}

export function pointOf(grid: RouteGrid, node: number): Point {
  return { x: (node % grid.columns) * STEP, y: Math.floor(node / grid.columns) * STEP };
}

/** A device: not through it, not along its edge, and rather not close by. */
export function addDevice(grid: RouteGrid, box: Box): void {
  eachNode(grid, box, STEP, (node, x, y) => {
    const away = Math.max(box.x - x, x - box.x - box.width, box.y - y, y - box.y - box.height);
    charge(grid, node, away < 0 ? COST.inside : away === 0 ? COST.edge : COST.near);
  });
}

export function addCost(grid: RouteGrid, box: Box, cost: number): void {
  eachNode(grid, box, 0, (node) => charge(grid, node, cost));
}

export function addTerminal(grid: RouteGrid, point: Point): void {
  const node = nodeAt(grid, point);
  grid.corner[node] = 1;
  refresh(grid, node);
}

export function addRun(grid: RouteGrid, points: readonly Point[]): void {
  for (let i = 1; i < points.length; i++) {
    const from = points[i - 1]!;
    const to = points[i]!;
    const a = nodeAt(grid, from);
    const b = nodeAt(grid, to);
    grid.corner[a] = 1;
    grid.corner[b] = 1;
    const isLevel = from.y === to.y;
    const stride = isLevel ? 1 : grid.columns;
    const beside = isLevel ? grid.columns : 1;
    const use = isLevel ? grid.level : grid.upright;
    const first = Math.min(a, b);
    const last = Math.max(a, b);
    for (let node = first; node <= last; node += stride) use[node]!++;
    for (let node = first; node <= last + stride; node += stride) {
      refresh(grid, node);
      refresh(grid, node - beside);
      refresh(grid, node + beside);
    }
  }
}

/** Everything beyond the frame and under the title block is for drawing only when there is no other way. */
export function addOffSheet(grid: RouteGrid, frame: Box, keepClear: readonly Box[]): void {
  for (let node = 0; node < grid.cost.length; node++) {
    const x = (node % grid.columns) * STEP;
    const y = Math.floor(node / grid.columns) * STEP;
    const inset = Math.min(x - frame.x, frame.x + frame.width - x, y - frame.y, frame.y + frame.height - y);
    if (inset <= 0) charge(grid, node, COST.offSheet);
    else if (inset < 2 * STEP) charge(grid, node, COST.nearFrame);
  }
  for (const box of keepClear) addCost(grid, box, COST.offSheet);
}

function charge(grid: RouteGrid, node: number, cost: number): void {
  grid.cost[node]! += cost;
  grid.enterLevel[node]! += cost;
  grid.enterUpright[node]! += cost;
}

/** Sums anew what a search asks of a square, after a run has come there or beside it. */
function refresh(grid: RouteGrid, node: number): void {
  const { columns, cost, level, upright, corner } = grid;
  if (node < 0 || node >= cost.length) return;
  const isCorner = corner[node]! > 0;
  const besideLevel = (level[node - columns] ?? 0) > 0 || (level[node + columns] ?? 0) > 0;
  const besideUpright = (upright[node - 1] ?? 0) > 0 || (upright[node + 1] ?? 0) > 0;
  const own = 1 + cost[node]! + (isCorner ? COST.touch : 0);
  grid.enterLevel[node] = own + (isCorner ? 0 : COST.crossing * upright[node]!) + (besideLevel ? COST.lane : 0);
  grid.enterUpright[node] = own + (isCorner ? 0 : COST.crossing * level[node]!) + (besideUpright ? COST.lane : 0);
  grid.shareLevel[node] = level[node]! > 0 && (level[node - 1] ?? 0) > 0 ? COST.overlap : 0;
  grid.shareUpright[node] = upright[node]! > 0 && (upright[node - columns] ?? 0) > 0 ? COST.overlap : 0;
  grid.turn[node] = COST.bend + (level[node]! + upright[node]! > 0 ? COST.touch : 0);
}

function eachNode(
  grid: RouteGrid,
  box: Box,
  margin: number,
  visit: (node: number, x: number, y: number) => void,
): void {
  const left = Math.max(0, Math.ceil((box.x - margin) / STEP));
  const right = Math.min(grid.columns - 1, Math.floor((box.x + box.width + margin) / STEP));
  const top = Math.max(0, Math.ceil((box.y - margin) / STEP));
  const bottom = Math.min(grid.rows - 1, Math.floor((box.y + box.height + margin) / STEP));
  for (let row = top; row <= bottom; row++) {
    for (let column = left; column <= right; column++) visit(row * grid.columns + column, column * STEP, row * STEP);
  }
}
