import type { Design, Run } from '#shared/model/design.ts';
import type { Point } from '#shared/kinds/place.ts';

import { callRun, remove, set, snap, type Edit } from './edit.ts';

/** The corners that a person put; none gives the run back to the router. */
export function setBends(design: Design, runId: string, bends: readonly Point[], label?: string): Edit {
  const run = design.runs[runId];
  const name = label ?? (bends.length === 0 ? `Free the bends of ${callRun(run)}` : `Bend ${callRun(run)}`);
  if (run === undefined || !isOnOneSheet(design, run)) return { label: name, patches: [] };
  const placed = bends.map(snap);
  const before = run.bends ?? [];
  if (placed.length === before.length && placed.every((p, i) => p.x === before[i]!.x && p.y === before[i]!.y)) {
    return { label: name, patches: [] };
  }
  const path = ['runs', runId, 'bends'];
  return { label: name, patches: [placed.length === 0 ? remove(path) : set(path, placed)] };
}

/** A corner put in before the one that has this index now. */
export function addBend(design: Design, runId: string, index: number, at: Point): Edit {
  const bends = design.runs[runId]?.bends ?? [];
  return setBends(design, runId, [...bends.slice(0, index), at, ...bends.slice(index)]);
}

export function moveBend(design: Design, runId: string, index: number, at: Point): Edit {
  const bends = design.runs[runId]?.bends ?? [];
  return setBends(
    design,
    runId,
    bends.map((bend, i) => (i === index ? at : bend)),
  );
}

export function removeBend(design: Design, runId: string, index: number): Edit {
  const bends = design.runs[runId]?.bends ?? [];
  return setBends(
    design,
    runId,
    bends.filter((_, i) => i !== index),
    `Take a bend out of ${callRun(design.runs[runId])}`,
  );
}

/** A run between two sheets is drawn as two stubs and has no bends. */
function isOnOneSheet(design: Design, run: Run): boolean {
  return design.devices[run.from.device]?.sheetId === design.devices[run.to.device]?.sheetId;
}
