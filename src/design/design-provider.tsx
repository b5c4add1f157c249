import { useQuery } from '@tanstack/react-query';
import { useEffect, useState, type ReactNode } from 'react';
import type { StoreApi } from 'zustand';

import { getDesign } from '#shared/api/design.ts';
import { getVessel } from '#shared/api/vessels.ts';
import type { Role } from '#shared/access/matrix.ts';
import { call } from '#src/lib/call.ts';
import { meQuery } from '#src/lib/session.ts';

import { keepDesign } from './keep-design.ts';
import { startLiveCheck } from './live-check.ts';
import { followNews } from './news.ts';
import { OpenDesignContext, type OpenDesign } from './open-design.ts';
import { openOutbox } from './outbox.ts';
import { openTabs } from './tabs.ts';
import { openVesselDoor } from './vessel-door.ts';

/** Opens the design of a vessel and keeps it in step with the server while it is on the page. */
export function DesignProvider({
  vesselId,
  loading = null,
  failed,
  children,
}: {
  readonly vesselId: string;
  readonly loading?: ReactNode;
  readonly failed?: (error: Error, retry: () => void) => ReactNode;
  readonly children: ReactNode;
}) {
  const me = useQuery(meQuery);
  const personId = usePersonOfPage(me.data?.personId);
  const [tries, setTries] = useState(0);
  const wanted = `${vesselId}:${personId ?? ''}:${tries}`;
  const [opened, setOpened] = useState<Opened | null>(null);

  useEffect(() => {
    if (personId === undefined) return undefined;
    const closing = new AbortController();
    openVesselDesign(vesselId, personId, closing.signal).then(
      (store) => !closing.signal.aborted && setOpened({ wanted, store }),
      (why: unknown) => {
        const error = why instanceof Error ? why : new Error(String(why));
        if (!closing.signal.aborted) setOpened({ wanted, error });
      },
    );
    return () => closing.abort();
  }, [vesselId, personId, wanted]);

  if (opened === null || opened.wanted !== wanted) return loading;
  if ('error' in opened) {
    return failed?.(opened.error, () => setTries(tries + 1)) ?? <p role="alert">{opened.error.message}</p>;
  }
  return <OpenDesignContext value={opened.store}>{children}</OpenDesignContext>;
}

type Opened = { readonly wanted: string } & ({ readonly store: StoreApi<OpenDesign> } | { readonly error: Error });

/**
 * Whose page this is: a session that ends does not change it, so that what waits is kept for the person who drew it.
 */
function usePersonOfPage(now: string | undefined): string | undefined {
  const [first, setFirst] = useState(now);
  if (first === undefined && now !== undefined) setFirst(now);
  return first ?? now;
}

async function openVesselDesign(
  vesselId: string,
  personId: string,
  closing: AbortSignal,
): Promise<StoreApi<OpenDesign>> {
  const tabs = openTabs(personId, vesselId);
  closing.addEventListener('abort', () => tabs.close());
  // What other tabs say while this one is opening is heard afterwards.
  const early = tabs.hold();
  const outbox = await openOutbox(personId, vesselId);
  const waiting = await outbox.list();
  const [vessel, loaded] = await Promise.all([
    call(getVessel, { params: { vesselId }, signal: closing }),
    call(getDesign, { params: { vesselId }, signal: closing }),
  ]);
  closing.throwIfAborted();
  return keepOpen({ ...loaded, vesselId, role: vessel.role, waiting, outbox, tabs, closing, early });
}

function keepOpen({
  closing,
  early,
  ...opened
}: Omit<Parameters<typeof keepDesign>[0], 'door' | 'onDesign' | 'now' | 'later'> & {
  readonly role: Role;
  readonly closing: AbortSignal;
  readonly early: { release(): void };
}): StoreApi<OpenDesign> {
  const { vesselId, tabs } = opened;
  let turn = 1;
  const kept = keepDesign({
    ...opened,
    door: openVesselDoor(vesselId),
    now: () => Date.now(),
    onDesign: (design) => {
      turn = check.follow(design);
    },
    later: (work, ms) => {
      const timer = setTimeout(work, ms);
      return () => clearTimeout(timer);
    },
  });
  const check = startLiveCheck(kept.store.getState().design, (answer) =>
    kept.tellAnalysis(answer.analysis, answer.tookMs, answer.turn === turn),
  );
  early.release();

  void followNews({
    vesselId,
    tabs,
    since: () => kept.store.getState().seq,
    onNews: kept.tellNews,
    onBreak: () => void kept.catchUp(),
    signal: closing,
  });
  const again = () => {
    const { keeping, retry } = kept.store.getState();
    if (keeping.state === 'offline') retry();
    else void kept.catchUp();
  };
  const onSight = () => {
    if (document.visibilityState === 'visible') again();
  };
  window.addEventListener('online', again, { signal: closing });
  document.addEventListener('visibilitychange', onSight, { signal: closing });
  closing.addEventListener('abort', () => {
    kept.stop();
    check.stop();
  });
  return kept.store;
}
