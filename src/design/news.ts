import { LoggedChange } from '#shared/api/design.ts';

import type { Tabs } from './tabs.ts';

export interface NewsOptions {
  readonly vesselId: string;
  readonly tabs: Tabs;
  /** The number to hear from. */
  readonly since: () => number;
  readonly onNews: (changes: readonly LoggedChange[]) => void;
  /** The stream broke: the log may have been missed in between. */
  readonly onBreak: () => void;
  readonly signal: AbortSignal;
}

const SHORTEST_WAIT_MS = 1_000;
const LONGEST_WAIT_MS = 30_000;

/**
 * One stream of news a vessel and browser: the tab that holds the lock listens to the server and tells the others;
 * when it closes, the next one takes over.
 */
export async function followNews(options: NewsOptions): Promise<void> {
  try {
    await options.tabs.alone('news', () => listenUntilClosed(options));
  } catch (error) {
    if (!options.signal.aborted) throw error;
  }
}

async function listenUntilClosed(options: NewsOptions): Promise<void> {
  let waitMs = SHORTEST_WAIT_MS;
  while (!options.signal.aborted) {
    const heardAny = await listenOnce(options);
    if (options.signal.aborted) return;
    waitMs = heardAny ? SHORTEST_WAIT_MS : Math.min(waitMs * 2, LONGEST_WAIT_MS);
    options.onBreak();
    await pause(waitMs, options.signal);
  }
}

/** Ends when the stream does; answers whether it ever opened. */
function listenOnce({ vesselId, tabs, since, onNews, signal }: NewsOptions): Promise<boolean> {
  return new Promise((resolve) => {
    const source = new EventSource(`/api/vessels/${vesselId}/news?since=${since()}`);
    let opened = false;
    const end = () => {
      source.close();
      resolve(opened);
    };
    signal.addEventListener('abort', end, { once: true });
    source.addEventListener('open', () => {
      opened = true;
    });
    source.addEventListener('error', end);
    source.addEventListener('change', (event: MessageEvent<string>) => {
      const read = LoggedChange.safeParse(JSON.parse(event.data));
      if (!read.success) return;
      onNews([read.data]);
      tabs.tell({ word: 'news', changes: [read.data] });
    });
  });
}

function pause(ms: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve) => {
    const timer = setTimeout(resolve, ms);
    const soon = () => {
      clearTimeout(timer);
      resolve();
    };
    signal.addEventListener('abort', soon, { once: true });
    window.addEventListener('online', soon, { once: true });
  });
}
