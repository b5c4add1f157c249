import type { Device, Run } from '#shared/model/design.ts';
import type { Patch } from '#shared/model/patch.ts';
import { kindOf } from '#shared/kinds/index.ts';
import { UNIT, type Point } from '#shared/kinds/place.ts';

/** A plan: what undo will call it, and the patches that do it. Without patches there is nothing to do. */
export interface Edit {
  readonly label: string;
  readonly patches: readonly Patch[];
  /** Why it can't be done, in one sentence for the person who tried. */
  readonly refused?: string;
}

/** Ids are the caller's: the application's are UUIDv7, a test's whatever it likes. */
export type NewId = () => string;

export function set(path: readonly string[], value: unknown): Patch {
  return { op: 'set', path, value };
}

export function remove(path: readonly string[]): Patch {
  return { op: 'remove', path };
}

export function refuse(label: string, refused: string): Edit {
  return { label, patches: [], refused };
}

/** The nearest place on the grid that terminals stand on. */
export function snap(at: Point): Point {
  return { x: snapTo(at.x), y: snapTo(at.y) };
}

function snapTo(value: number): number {
  return Math.round(value / UNIT) * UNIT || 0;
}

/** What a device is called in a label: its mark, else its name, else its kind. */
export function callDevice(device: Device | undefined): string {
  if (device === undefined) return 'a device';
  return device.mark || device.name || kindOf(device)?.title || 'a device';
}

export function callRun(run: Run | undefined): string {
  return run?.mark || 'a run';
}

/** `F3`, or `4 devices`. */
export function callMany(names: readonly string[], many: string): string {
  return names.length === 1 ? names[0]! : `${names.length} ${many}`;
}

/** A whole entity without the keys that are undefined. */
export function withoutUndefined<Value extends object>(value: Value): Value {
  return Object.fromEntries(Object.entries(value).filter(([, entry]) => entry !== undefined)) as Value;
}
