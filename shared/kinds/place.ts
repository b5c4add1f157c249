import type { Device } from '#shared/model/design.ts';

import { kindOf } from './index.ts';
import type { Side, Terminal } from './kind.ts';

/** Sheet units in a grid square. */
export const UNIT = 8;

export interface Point {
  readonly x: number;
  readonly y: number;
}

/** A terminal where it stands on the sheet, in sheet units, and the sides of the turned symbol a run may leave by. */
export interface PlacedTerminal extends Point {
  readonly name: string;
  readonly role: Terminal['role'];
  readonly optional: boolean;
  readonly sides: readonly Side[];
}

export interface Box extends Point {
  readonly width: number;
  readonly height: number;
}

/** The box a device fills on its sheet after turning, in sheet units. */
export function boxOf(device: Device): Box {
  const { width, height } = unturnedSize(device);
  const centre = { x: device.x + width / 2, y: device.y + height / 2 };
  const turned = (device.rotation ?? 0) % 180 !== 0;
  const [w, h] = turned ? [height, width] : [width, height];
  return { x: centre.x - w / 2, y: centre.y - h / 2, width: w, height: h };
}

export function unturnedSize(device: Device): { width: number; height: number } {
  const size = kindOf(device)?.size(device) ?? { width: 4, height: 4 };
  return { width: size.width * UNIT, height: size.height * UNIT };
}

export function terminalsOf(device: Device): PlacedTerminal[] {
  const { width, height } = unturnedSize(device);
  const rotation = device.rotation ?? 0;
  return (kindOf(device)?.terminals(device) ?? []).map((terminal) => {
    const at = { x: terminal.x * UNIT, y: terminal.y * UNIT };
    const turned = turn({ x: at.x - width / 2, y: at.y - height / 2 }, rotation);
    return {
      name: terminal.name,
      role: terminal.role,
      optional: terminal.optional ?? false,
      sides: (terminal.sides ?? [nearestSide(at, width, height)]).map((side) => turnSide(side, rotation)),
      x: device.x + width / 2 + turned.x,
      y: device.y + height / 2 + turned.y,
    };
  });
}

export function terminalAt(device: Device, name: string): PlacedTerminal | undefined {
  return terminalsOf(device).find((terminal) => terminal.name === name);
}

/** Clockwise, in sheet coordinates (y downwards). */
function turn(p: Point, rotation: number): Point {
  if (rotation === 90) return { x: -p.y, y: p.x };
  if (rotation === 180) return { x: -p.x, y: -p.y };
  if (rotation === 270) return { x: p.y, y: -p.x };
  return p;
}

/** The nearest edge; where two are as near, left and right win. */
function nearestSide(p: Point, width: number, height: number): Side {
  const distances: readonly [Side, number][] = [
    ['left', p.x],
    ['right', width - p.x],
    ['top', p.y],
    ['bottom', height - p.y],
  ];
  return distances.reduce((best, next) => (next[1] < best[1] ? next : best))[0];
}

const CLOCKWISE: readonly Side[] = ['top', 'right', 'bottom', 'left'];

function turnSide(side: Side, rotation: number): Side {
  return CLOCKWISE[(CLOCKWISE.indexOf(side) + rotation / 90) % 4]!;
}
