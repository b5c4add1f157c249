import { UNIT, type Point } from '#shared/kinds/place.ts';

/** To the sheet's grid, where terminals and bends stand. */
export function snap(at: Point): Point {
  return { x: snapUnits(at.x), y: snapUnits(at.y) };
}

export function snapUnits(value: number): number {
  return Math.round(value / UNIT) * UNIT;
}

export function minus(a: Point, b: Point): Point {
  return { x: a.x - b.x, y: a.y - b.y };
}

export function isSamePoint(a: Point, b: Point): boolean {
  return a.x === b.x && a.y === b.y;
}
