import type { Change, LoggedChange } from '#shared/api/design.ts';

/** What the tabs of one person tell each other about a vessel. */
export type TabWord =
  | { readonly word: 'waits'; readonly change: Change }
  | { readonly word: 'kept'; readonly change: Change; readonly seq: number }
  | { readonly word: 'dropped'; readonly id: string }
  | { readonly word: 'replaced'; readonly id: string; readonly change: Change }
  | { readonly word: 'news'; readonly changes: readonly LoggedChange[] };

export interface Tabs {
  tell(word: TabWord): void;
  listen(hear: (word: TabWord) => void): void;
  /** Runs the work while no other tab runs its work of this name; waits for its turn. */
  alone<Result>(name: string, work: () => Promise<Result>): Promise<Result>;
  close(): void;
}

/** Tabs of a browser, which can be heard from before there is anything to tell the words to. */
export interface BrowserTabs extends Tabs {
  /** Keeps what is said from now on, until it is released to who listens by then. */
  hold(): { release(): void };
}

/** Tabs of one person on one vessel: other people signed in on this device never hear them. */
export function openTabs(personId: string, vesselId: string): BrowserTabs {
  const scope = `ampwright:${personId}:${vesselId}`;
  const channel = new BroadcastChannel(scope);
  const closing = new AbortController();
  const ears: ((word: TabWord) => void)[] = [];
  let held: TabWord[] | null = null;
  channel.addEventListener('message', (event: MessageEvent<TabWord>) => {
    if (held !== null) held.push(event.data);
    else for (const hear of ears) hear(event.data);
  });
  return {
    hold() {
      const words: TabWord[] = [];
      held = words;
      return {
        release() {
          held = null;
          for (const word of words) for (const hear of ears) hear(word);
        },
      };
    },
    tell(word) {
      if (!closing.signal.aborted) channel.postMessage(word);
    },
    listen(hear) {
      ears.push(hear);
    },
    async alone(name, work) {
      return await navigator.locks.request(`${scope}:${name}`, { signal: closing.signal }, work);
    },
    close() {
      closing.abort();
      channel.close();
    },
  };
}
