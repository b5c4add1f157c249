import { useEffect, useState, type ReactNode } from 'react';
import { createStore } from 'zustand/vanilla';

import type { Role } from '#shared/access/matrix.ts';
import type { Design } from '#shared/model/design.ts';

import { startLiveCheck } from './live-check.ts';
import { OpenDesignContext, type OpenDesign } from './open-design.ts';

/** An issued revision, or any document that is only looked at: the same screens read it, nothing changes it. */
export function FrozenDesignProvider({
  vesselId,
  role,
  seq,
  issuedAt,
  design,
  children,
}: {
  readonly vesselId: string;
  readonly role: Role;
  readonly seq: number;
  readonly issuedAt: string;
  readonly design: Design;
  readonly children: ReactNode;
}) {
  const [store] = useState(() => createStore<OpenDesign>()(() => freeze({ vesselId, role, seq, issuedAt, design })));

  useEffect(() => {
    store.setState(freeze({ vesselId, role, seq, issuedAt, design }));
    const check = startLiveCheck(design, ({ analysis, tookMs }) =>
      store.setState({ analysis, checkedInMs: tookMs, checking: false }),
    );
    return () => check.stop();
  }, [store, vesselId, role, seq, issuedAt, design]);

  return <OpenDesignContext value={store}>{children}</OpenDesignContext>;
}

function freeze(given: { vesselId: string; role: Role; seq: number; issuedAt: string; design: Design }): OpenDesign {
  const nothing = () => {};
  return {
    vesselId: given.vesselId,
    role: given.role,
    mayEdit: false,
    seq: given.seq,
    design: given.design,
    analysis: null,
    checkedInMs: null,
    checking: true,
    keeping: { state: 'saved', at: Date.parse(given.issuedAt) },
    canUndo: null,
    canRedo: null,
    change: nothing,
    undo: nothing,
    redo: nothing,
    retry: nothing,
    resolveConflict: nothing,
  };
}
