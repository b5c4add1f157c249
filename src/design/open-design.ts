import { createContext, useContext } from 'react';
import { useStore, type StoreApi } from 'zustand';

import type { Role } from '#shared/access/matrix.ts';
import type { Analysis } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';
import type { Patch } from '#shared/model/patch.ts';

/** The states of keeping, said in words in the head. */
export type Keeping =
  | { readonly state: 'saved'; readonly at: number }
  | { readonly state: 'saving'; readonly waiting: number }
  | { readonly state: 'offline'; readonly waiting: number }
  | { readonly state: 'signed-out'; readonly waiting: number }
  | { readonly state: 'conflict'; readonly waiting: number; readonly conflicts: readonly FieldConflict[] }
  | { readonly state: 'refused'; readonly waiting: number; readonly reason: string };

export interface FieldConflict {
  readonly path: readonly string[];
  readonly mine: unknown;
  readonly theirs: unknown;
  readonly by: string;
}

/** The design that is open: every screen of a vessel reads it and changes it through here and nowhere else. */
export interface OpenDesign {
  readonly vesselId: string;
  readonly role: Role;
  readonly mayEdit: boolean;
  /** Sequence number of the last acknowledged change. */
  readonly seq: number;
  /** With what waits applied. */
  readonly design: Design;
  /** Of the design as it stands, worked out in the worker; null until the first answer. */
  readonly analysis: Analysis | null;
  /** Milliseconds the last check took. */
  readonly checkedInMs: number | null;
  /** True while the analysis is of an older state than `design`. */
  readonly checking: boolean;
  readonly keeping: Keeping;
  readonly canUndo: string | null;
  readonly canRedo: string | null;

  /** One change a person made: applied at once, undoable, kept on the device, sent. No-op without patches. */
  change(label: string, patches: readonly Patch[]): void;
  undo(): void;
  redo(): void;
  /** Tries again to send what waits. */
  retry(): void;
  /** Ends a conflict: mine is sent again on top of theirs, or dropped. */
  resolveConflict(choice: 'mine' | 'theirs'): void;
}

export const OpenDesignContext = createContext<StoreApi<OpenDesign> | null>(null);

/** The store of the open design, for handlers; a component that shows something uses `useOpenDesign`. */
export function useOpenDesignStore(): StoreApi<OpenDesign> {
  const store = useContext(OpenDesignContext);
  if (store === null) throw new Error('useOpenDesign is used outside of an open design');
  return store;
}

export function useOpenDesign<Selected>(select: (state: OpenDesign) => Selected): Selected {
  return useStore(useOpenDesignStore(), select);
}
