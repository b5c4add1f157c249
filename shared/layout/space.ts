import type { Box, Point } from '#shared/kinds/place.ts';

/** What is taken on a sheet, found by place: labels and tags ask before they settle. */
export interface Space {
  readonly cells: Map<number, Taken[]>;
}

export interface Taken {
  readonly box: Box;
  /** How bad it is to stand on it. */
  readonly weight: number;
  /** Whose it is: a label may touch nothing but what is its own. */
  readonly owner?: string;
}

/** How bad it is for a label or tag to stand on each thing. */
export const WEIGHT = { device: 20, text: 12, run: 8, flag: 14, frame: 40, zone: 1 };

const CELL = 64;
const STRIDE = 4096;

export function makeSpace(): Space {
  return { cells: new Map() };
}

export function take(space: Space, box: Box, weight: number, owner?: string): void {
  const taken = { box, weight, owner };
  eachCell(box, (key) => {
    const cell = space.cells.get(key);
    if (cell === undefined) space.cells.set(key, [taken]);
    else cell.push(taken);
  });
}

/** Gives a place back: what was taken there for that owner with that weight. */
export function release(space: Space, box: Box, weight: number, owner: string): void {
  eachCell(box, (key) => {
    const cell = space.cells.get(key);
    const at = cell?.findIndex(
      (taken) => taken.owner === owner && taken.weight === weight && isSameBox(taken.box, box),
    );
    if (cell !== undefined && at !== undefined && at >= 0) cell.splice(at, 1);
  });
}

function isSameBox(a: Box, b: Box): boolean {
  return a.x === b.x && a.y === b.y && a.width === b.width && a.height === b.height;
}

/** Everything that stands in `box`, each once. */
export function standing(space: Space, box: Box): Taken[] {
  const found = new Set<Taken>();
  eachCell(box, (key) => {
    for (const taken of space.cells.get(key) ?? []) if (overlaps(taken.box, box)) found.add(taken);
  });
  return [...found];
}

/** The segments of a run, as wide as it is drawn. */
export function takeRun(
  space: Space,
  points: readonly Point[],
  halfWidth: number,
  weight: number,
  owner: string,
): void {
  for (let i = 1; i < points.length; i++) take(space, segmentBox(points[i - 1]!, points[i]!, halfWidth), weight, owner);
}

/** How bad it would be to stand on `box`: nothing is 0. No longer summed once it is `enough`. */
export function conflict(space: Space, box: Box, except?: string, enough = Infinity): number {
  let sum = 0;
  const left = cellOf(box.x);
  const top = cellOf(box.y);
  const right = cellOf(box.x + box.width);
  const bottom = cellOf(box.y + box.height);
  for (let row = top; row <= bottom; row++) {
    for (let column = left; column <= right; column++) {
      const cell = space.cells.get(row * STRIDE + column);
      if (cell === undefined) continue;
      for (const taken of cell) {
        if (!overlaps(taken.box, box) || (except !== undefined && taken.owner === except)) continue;
        // what spans several cells counts in the first one that both have
        if (column !== Math.max(left, cellOf(taken.box.x)) || row !== Math.max(top, cellOf(taken.box.y))) continue;
        sum += taken.weight;
        if (sum >= enough) return sum;
      }
    }
  }
  return sum;
}

export function grow(box: Box, by: number): Box {
  return { x: box.x - by, y: box.y - by, width: box.width + 2 * by, height: box.height + 2 * by };
}

export function segmentBox(a: Point, b: Point, halfWidth: number): Box {
  return grow(
    { x: Math.min(a.x, b.x), y: Math.min(a.y, b.y), width: Math.abs(a.x - b.x), height: Math.abs(a.y - b.y) },
    halfWidth,
  );
}

export function overlaps(a: Box, b: Box): boolean {
  return a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
}

/** What lies far off any paper is put with what lies at its edge: a file may say any number. */
function eachCell(box: Box, visit: (key: number) => void): void {
  const right = cellOf(box.x + box.width);
  const bottom = cellOf(box.y + box.height);
  for (let row = cellOf(box.y); row <= bottom; row++) {
    for (let column = cellOf(box.x); column <= right; column++) visit(row * STRIDE + column);
  }
}

function cellOf(value: number): number {
  return Math.min(64, Math.max(-16, Math.floor(value / CELL)));
}
