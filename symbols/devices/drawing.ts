import type { Device } from '#shared/model/design.ts';

/**
 * How a kind is drawn, in sheet units from the upper left of the unturned symbol. Strokes are one path and fills
 * one path, so that a sheet of three hundred devices stays light; letters stand apart because they are set upright
 * however the device is turned.
 */
export interface Art {
  /** Lines of 1.5. */
  readonly strokes: string;
  /** Filled shapes, without a line round them. */
  readonly fills?: string;
  /** Mechanical links and senses: lines of 1, dashed. */
  readonly dashes?: string;
  readonly letters?: readonly Letter[];
  /** Circles at the terminals: the usual ones, studs on a solid bar, or none where the copper itself is the symbol. */
  readonly terminals?: 'circles' | 'studs' | 'none';
}

export interface Letter {
  /** The middle of the letters, both ways. */
  readonly x: number;
  readonly y: number;
  readonly text: string;
  readonly size: number;
}

export interface Drawing {
  readonly kind: string;
  art(device: Device): Art;
}

export function defineDrawing(drawing: Drawing): Drawing {
  return drawing;
}

/** A circle as part of a path. */
export function circlePath(x: number, y: number, r: number): string {
  return `M${x - r} ${y}a${r} ${r} 0 1 0 ${2 * r} 0a${r} ${r} 0 1 0 ${-2 * r} 0Z`;
}

export function boxPath(x: number, y: number, width: number, height: number): string {
  return `M${x} ${y}h${width}v${height}h${-width}Z`;
}

/** The sign of direct current: a line over three dashes. */
export function directCurrentPath(x: number, y: number): string {
  return `M${x - 6} ${y}h12M${x - 6} ${y + 4}h3M${x - 1.5} ${y + 4}h3M${x + 3} ${y + 4}h3`;
}
