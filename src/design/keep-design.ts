import { v7 as uuidv7 } from 'uuid';
import { createStore, type StoreApi } from 'zustand/vanilla';

import { may, type Role } from '#shared/access/matrix.ts';
import type { Change, LoggedChange } from '#shared/api/design.ts';
import type { Analysis } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';
import { MOST_PATCHES, type Patch } from '#shared/model/patch.ts';

import { readField } from './field.ts';
import { noHistory, remember, stepBack, stepForward, type History } from './history.ts';
import type { FieldConflict, Keeping, OpenDesign } from './open-design.ts';
import type { Outbox } from './outbox.ts';
import type { ServerDoor, Sent } from './server-door.ts';
import { addWaiting, dropWaiting, openSync, replaceWaiting, takeKept, type KeptChange } from './sync.ts';
import type { Tabs } from './tabs.ts';

export interface KeepOptions {
  readonly vesselId: string;
  readonly role: Role;
  readonly seq: number;
  readonly design: Design;
  readonly waiting: readonly Change[];
  readonly outbox: Outbox;
  readonly door: ServerDoor;
  readonly tabs: Tabs;
  /** Told of every new state; answers through `tellAnalysis`. */
  readonly onDesign: (design: Design) => void;
  readonly now: () => number;
  /** Runs `work` after so many milliseconds; answers how to call it off. */
  readonly later: (work: () => void, ms: number) => () => void;
}

export interface KeptDesign {
  readonly store: StoreApi<OpenDesign>;
  tellAnalysis(analysis: Analysis, tookMs: number, isOfNow: boolean): void;
  tellNews(changes: readonly LoggedChange[]): void;
  /** Asks the log for what was missed. */
  catchUp(): Promise<void>;
  stop(): void;
}

const FIRST_RETRY_MS = 1_000;
const LONGEST_RETRY_MS = 30_000;

/**
 * The open design: applies what the person does at once, keeps it on the device, sends it in order, and lays what
 * others did beneath it. It reaches the world only through what it is given, so that it runs without a browser.
 */
export function keepDesign(options: KeepOptions): KeptDesign {
  const { outbox, door, tabs } = options;
  let sync = openSync(options.seq, options.design, options.waiting);
  let history: History = noHistory;
  let stopped: Extract<Sent, { said: 'conflict' | 'refused' }> | null = null;
  let trouble: 'offline' | 'signed-out' | null = null;
  let retryMs = FIRST_RETRY_MS;
  let callOffRetry: () => void = () => {};
  let isSending = false;
  let isOver = false;
  let savedAt = options.now();
  /** Changes are written to the device in the order they were made. */
  let writing: Promise<unknown> = Promise.resolve();

  const store = createStore<OpenDesign>()(() => ({
    vesselId: options.vesselId,
    role: options.role,
    mayEdit: may(options.role, 'edit-design'),
    seq: sync.seq,
    design: sync.design,
    analysis: null,
    checkedInMs: null,
    checking: true,
    keeping: keepingNow(),
    canUndo: null,
    canRedo: null,
    change,
    undo: () => step(stepBack),
    redo: () => step(stepForward),
    retry,
    resolveConflict,
  }));

  tabs.listen((said) => {
    if (said.word === 'waits') sync = addWaiting(sync, said.change);
    else if (said.word === 'dropped') endWait(said.id);
    else if (said.word === 'replaced') putInPlace(said.id, said.change);
    else if (said.word === 'kept') return take([{ ...said.change, seq: said.seq }]);
    else return take(said.changes);
    show();
    if (said.word === 'waits') void send();
  });
  if (sync.waiting.length > 0) void send();

  return {
    store,
    tellAnalysis: (analysis, tookMs, isOfNow) => store.setState({ analysis, checkedInMs: tookMs, checking: !isOfNow }),
    tellNews: take,
    catchUp,
    stop() {
      isOver = true;
      callOffRetry();
      tabs.close();
    },
  };

  function change(label: string, patches: readonly Patch[]): void {
    if (patches.length === 0 || !store.getState().mayEdit) return;
    history = remember(history, sync.design, label, patches);
    queue(label, patches);
  }

  function step(take: typeof stepBack): void {
    if (!store.getState().mayEdit) return;
    const taken = take(history, sync.design);
    if (taken === null) return;
    history = taken.history;
    const verb = take === stepBack ? 'Undo' : 'Redo';
    queue(`${verb}: ${taken.label}`, taken.patches);
  }

  /** A change larger than one may be is sent as several, in order. */
  function queue(label: string, patches: readonly Patch[]): void {
    for (let at = 0; at < patches.length; at += MOST_PATCHES) {
      const made: Change = {
        id: uuidv7(),
        base: sync.seq,
        label: label.slice(0, 200),
        patches: patches.slice(at, at + MOST_PATCHES).map(plainPatch),
      };
      sync = addWaiting(sync, made);
      writing = writing.then(() => outbox.add(made)).catch(() => undefined);
      tabs.tell({ word: 'waits', change: made });
    }
    show();
    void writing.then(send);
  }

  /** Sends what waits, first made first, while no other tab of this person does. */
  async function send(): Promise<void> {
    if (isSending || isOver || stopped !== null) return;
    isSending = true;
    callOffRetry();
    try {
      await tabs.alone('send', sendAll);
    } catch {
      // The tab is closing while it waited for its turn: what waits is on the device.
    }
    isSending = false;
    if (isOver) return;
    show();
    if (trouble === null && stopped === null && sync.waiting.length > 0) void send();
  }

  async function sendAll(): Promise<void> {
    for (;;) {
      await writing;
      // One that could not be written to the device, or that another tab has sent: sent again it does no harm.
      const first = (await outbox.list())[0] ?? sync.waiting[0];
      if (isOver || first === undefined) return;
      const said = await door.send(first);
      if (isOver) return;
      if (said.said === 'kept') {
        await outbox.remove(first.id);
        trouble = null;
        retryMs = FIRST_RETRY_MS;
        savedAt = options.now();
        tabs.tell({ word: 'kept', change: first, seq: said.seq });
        take([{ ...first, seq: said.seq }]);
        continue;
      }
      if (said.said === 'conflict' || said.said === 'refused') {
        stopped = said;
        if (said.said === 'conflict') await catchUp();
      } else {
        trouble = said.said === 'signed-out' ? 'signed-out' : 'offline';
        if (trouble === 'offline') retryLater();
      }
      return;
    }
  }

  function take(kept: readonly KeptChange[]): void {
    const taken = takeKept(sync, kept);
    sync = taken.sync;
    show();
    if (taken.gap) void catchUp();
  }

  async function catchUp(): Promise<void> {
    const missed = await door.listSince(sync.seq);
    if (missed === null || isOver) return;
    const taken = takeKept(sync, missed);
    sync = taken.sync;
    show();
  }

  function retryLater(): void {
    callOffRetry = options.later(() => void send(), retryMs);
    retryMs = Math.min(retryMs * 2, LONGEST_RETRY_MS);
  }

  function retry(): void {
    trouble = null;
    if (stopped?.said === 'refused') stopped = null;
    retryMs = FIRST_RETRY_MS;
    show();
    if (sync.waiting.length > 0) void send();
    void catchUp();
  }

  function resolveConflict(choice: 'mine' | 'theirs'): void {
    const [first] = sync.waiting;
    if (stopped === null || first === undefined) return;
    const base = stopped.said === 'conflict' ? Math.max(stopped.seq, sync.seq) : sync.seq;
    stopped = null;
    if (choice === 'mine') {
      const again: Change = { ...first, id: uuidv7(), base };
      putInPlace(first.id, again);
      writing = writing.then(() => outbox.replace(first.id, again)).catch(() => undefined);
      tabs.tell({ word: 'replaced', id: first.id, change: again });
    } else {
      endWait(first.id);
      writing = writing.then(() => outbox.remove(first.id)).catch(() => undefined);
      tabs.tell({ word: 'dropped', id: first.id });
    }
    show();
    void writing.then(send);
  }

  function putInPlace(id: string, again: Change): void {
    sync = replaceWaiting(sync, id, again);
    stopped = null;
  }

  function endWait(id: string): void {
    sync = dropWaiting(sync, id);
    stopped = null;
  }

  function show(): void {
    if (isOver) return;
    const before = store.getState();
    const isNew = before.design !== sync.design;
    store.setState({
      seq: sync.seq,
      design: sync.design,
      checking: before.checking || isNew,
      keeping: keepingNow(),
      canUndo: history.past.at(-1)?.label ?? null,
      canRedo: history.future.at(-1)?.label ?? null,
    });
    if (isNew) options.onDesign(sync.design);
  }

  function keepingNow(): Keeping {
    const waiting = sync.waiting.length;
    if (waiting === 0)
      return trouble === 'signed-out' ? { state: 'signed-out', waiting } : { state: 'saved', at: savedAt };
    if (stopped?.said === 'conflict') return { state: 'conflict', waiting, conflicts: conflictsOf(stopped) };
    if (stopped?.said === 'refused') return { state: 'refused', waiting, reason: stopped.reason };
    if (trouble !== null) return { state: trouble, waiting };
    return { state: 'saving', waiting };
  }

  function conflictsOf(said: Extract<Sent, { said: 'conflict' }>): FieldConflict[] {
    return said.conflicts.map((field) => ({ ...field, mine: readField(sync.design, field.path) }));
  }
}

/** As it will read after a journey as JSON: no undefined, no shared objects that the page may change. */
function plainPatch(patch: Patch): Change['patches'][number] {
  return JSON.parse(JSON.stringify(patch)) as Change['patches'][number];
}
