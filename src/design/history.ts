import type { Patch } from '#shared/model/patch.ts';
import { invertPatches } from '#shared/model/patch.ts';

/** A change that can be taken back: what it is called and the patches that take it back. */
export interface Step {
  readonly label: string;
  readonly inverse: readonly Patch[];
}

/** Undo and redo without end, of one's own changes only. */
export interface History {
  readonly past: readonly Step[];
  readonly future: readonly Step[];
}

export const noHistory: History = { past: [], future: [] };

/** A new change: it can be undone, and nothing can be redone any more. */
export function remember(history: History, before: object, label: string, patches: readonly Patch[]): History {
  return { past: [...history.past, { label, inverse: invertPatches(before, patches) }], future: [] };
}

export interface StepBack {
  readonly history: History;
  readonly label: string;
  readonly patches: readonly Patch[];
}

/** The change that takes the last one back, made of its inverse on the design as it stands now. */
export function stepBack(history: History, now: object): StepBack | null {
  const step = history.past.at(-1);
  if (step === undefined) return null;
  const redo: Step = { label: step.label, inverse: invertPatches(now, step.inverse) };
  return {
    history: { past: history.past.slice(0, -1), future: [...history.future, redo] },
    label: step.label,
    patches: step.inverse,
  };
}

export function stepForward(history: History, now: object): StepBack | null {
  const step = history.future.at(-1);
  if (step === undefined) return null;
  const undo: Step = { label: step.label, inverse: invertPatches(now, step.inverse) };
  return {
    history: { past: [...history.past, undo], future: history.future.slice(0, -1) },
    label: step.label,
    patches: step.inverse,
  };
}
