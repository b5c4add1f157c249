import type { Change } from '#shared/api/design.ts';
import type { Design } from '#shared/model/design.ts';
import { applyPatches } from '#shared/model/patch.ts';

/** A change of the log, as far as keeping in step needs it. */
export interface KeptChange {
  readonly id: string;
  readonly seq: number;
  readonly patches: Change['patches'];
}

/**
 * What the server has (`base`, at `seq`) and the person's own changes on top of it that it has not yet
 * acknowledged, oldest first. `design` is the one seen: base with what waits applied.
 */
export interface Sync {
  readonly seq: number;
  readonly base: Design;
  readonly waiting: readonly Change[];
  readonly design: Design;
}

export function openSync(seq: number, base: Design, waiting: readonly Change[] = []): Sync {
  return { seq, base, waiting, design: replay(base, waiting) };
}

/** A change of this person, made here or in another tab; the same one twice counts once. */
export function addWaiting(sync: Sync, change: Change): Sync {
  if (sync.waiting.some((waits) => waits.id === change.id)) return sync;
  return { ...sync, waiting: [...sync.waiting, change], design: applyPatches(sync.design, change.patches) };
}

/** The change no longer waits: refused, or given up for someone else's. */
export function dropWaiting(sync: Sync, id: string): Sync {
  const waiting = sync.waiting.filter((change) => change.id !== id);
  if (waiting.length === sync.waiting.length) return sync;
  return { ...sync, waiting, design: replay(sync.base, waiting) };
}

/** The same change again under a new id and on a newer base, in its old place of the queue. */
export function replaceWaiting(sync: Sync, id: string, again: Change): Sync {
  const waiting = sync.waiting.map((change) => (change.id === id ? again : change));
  return { ...sync, waiting, design: replay(sync.base, waiting) };
}

/**
 * Changes that the server has kept, anyone's, laid beneath what waits. Those known already are passed over; the
 * first that does not follow on is a gap: nothing from there on is taken, and the log has to be asked.
 */
export function takeKept(sync: Sync, kept: readonly KeptChange[]): { readonly sync: Sync; readonly gap: boolean } {
  let now = sync;
  for (const change of kept) {
    if (change.seq <= now.seq) {
      now = dropWaiting(now, change.id);
    } else if (change.seq === now.seq + 1) {
      now = advance(now, change);
    } else {
      return { sync: now, gap: true };
    }
  }
  return { sync: now, gap: false };
}

function advance(sync: Sync, change: KeptChange): Sync {
  const base = applyPatches(sync.base, change.patches);
  const [first, ...rest] = sync.waiting;
  if (first?.id === change.id) return { ...sync, seq: change.seq, base, waiting: rest };
  const waiting = sync.waiting.filter((waits) => waits.id !== change.id);
  const design = waiting.length === 0 ? base : replay(base, waiting);
  return { seq: change.seq, base, waiting, design };
}

function replay(base: Design, waiting: readonly Change[]): Design {
  return waiting.reduce((design, change) => applyPatches(design, change.patches), base);
}
