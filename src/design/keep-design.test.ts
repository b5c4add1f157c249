import { describe, expect, it } from 'vitest';

import type { Change, LoggedChange } from '#shared/api/design.ts';
import type { Role } from '#shared/access/matrix.ts';
import type { Design } from '#shared/model/design.ts';
import { applyPatches, pathsOverlap, type Patch } from '#shared/model/patch.ts';

import { keepDesign, type KeptDesign } from './keep-design.ts';
import { keepInMemory, type Outbox } from './outbox.ts';
import type { Sent, ServerDoor } from './server-door.ts';
import type { Tabs, TabWord } from './tabs.ts';

const empty: Design = {
  format: 'ampwright-design',
  version: 1,
  basis: {},
  sheets: { s1: { id: 's1' } },
  zones: {},
  devices: {},
  runs: {},
  modes: {},
  notes: {},
};

/** A server that keeps its promises: ids count once, an overlapping field of somebody else since `base` conflicts. */
class Server implements ServerDoor {
  log: LoggedChange[] = [];
  design = empty;
  mood: 'well' | 'unreachable' | 'signed-out' | 'refuses' | 'deaf' = 'well';
  received: string[] = [];

  async send(change: Change): Promise<Sent> {
    if (this.mood === 'unreachable') return { said: 'unreachable' };
    if (this.mood === 'signed-out') return { said: 'signed-out' };
    if (this.mood === 'refuses') return { said: 'refused', reason: 'runs.w1: no such device' };
    this.received.push(change.id);
    const known = this.log.find((logged) => logged.id === change.id);
    if (known !== undefined) return { said: 'kept', seq: known.seq };
    const conflicts = this.log
      .filter((logged) => logged.seq > change.base && logged.by.name === 'Bo')
      .flatMap((logged) => logged.patches)
      .filter((theirs) => change.patches.some((mine) => pathsOverlap(mine.path, theirs.path)))
      .map((theirs) => ({ path: theirs.path, theirs: theirs.value, by: 'Bo' }));
    if (conflicts.length > 0) return { said: 'conflict', seq: this.log.length, conflicts, reason: 'Changed since' };
    const logged = this.keep(change, 'Ines');
    if (this.mood === 'deaf') {
      this.mood = 'unreachable';
      return { said: 'unreachable' };
    }
    return { said: 'kept', seq: logged.seq };
  }

  async listSince(seq: number): Promise<readonly LoggedChange[] | null> {
    return this.mood === 'unreachable' ? null : this.log.filter((logged) => logged.seq > seq);
  }

  keep(change: Pick<Change, 'id' | 'label' | 'patches'>, name: string): LoggedChange {
    const seq = this.log.length + 1;
    const logged: LoggedChange = {
      id: change.id,
      seq,
      label: change.label,
      patches: change.patches,
      by: { personId: name, name },
      at: '2026-01-01T00:00:00Z',
    };
    this.log.push(logged);
    this.design = applyPatches(this.design, change.patches);
    return logged;
  }
}

/** Tabs of one browser: words reach the others, one lock a name. */
class Browser {
  private ears: ((word: TabWord) => void)[][] = [];
  private turns = new Map<string, Promise<unknown>>();

  tab(): Tabs {
    const mine: ((word: TabWord) => void)[] = [];
    this.ears.push(mine);
    return {
      tell: (word) => {
        for (const ears of this.ears) if (ears !== mine) ears.forEach((hear) => hear(word));
      },
      listen: (hear) => void mine.push(hear),
      alone: async (name, work) => {
        const before = this.turns.get(name) ?? Promise.resolve();
        const turn = before.then(work);
        this.turns.set(
          name,
          turn.catch(() => undefined),
        );
        return await turn;
      },
      close: () => {
        this.ears = this.ears.filter((ears) => ears !== mine);
      },
    };
  }
}

class Scene {
  server = new Server();
  browser = new Browser();
  outbox: Outbox = keepInMemory();
  due: (() => void)[] = [];

  async open(role: Role = 'designer'): Promise<KeptDesign> {
    return keepDesign({
      vesselId: 'v1',
      role,
      seq: this.server.log.length,
      design: this.server.design,
      waiting: await this.outbox.list(),
      outbox: this.outbox,
      door: this.server,
      tabs: this.browser.tab(),
      onDesign: () => {},
      now: () => 0,
      later: (work) => {
        this.due.push(work);
        return () => void (this.due = this.due.filter((waits) => waits !== work));
      },
    });
  }
}

const title = (value: string): Patch[] => [{ op: 'set', path: ['sheets', 's1', 'title'], value }];
const note = (id: string): Patch[] => [
  { op: 'set', path: ['notes', id], value: { id, sheetId: 's1', x: 0, y: 0, text: id } },
];
const settle = () => new Promise((resolve) => setTimeout(resolve, 5));
const titleOf = (kept: KeptDesign) => kept.store.getState().design.sheets['s1']!.title;
const stateOf = (kept: KeptDesign) => kept.store.getState().keeping.state;

describe('saving', () => {
  it('says Saving, then Saved, and the server has it', async () => {
    const scene = new Scene();
    const kept = await scene.open();
    kept.store.getState().change('Rename', title('Mains'));
    expect(stateOf(kept)).toBe('saving');
    await settle();
    expect(stateOf(kept)).toBe('saved');
    expect(scene.server.design.sheets['s1']!.title).toBe('Mains');
    expect(await scene.outbox.list()).toEqual([]);
  });

  it('keeps what is drawn offline, says how much, and sends it in order when the line is back', async () => {
    const scene = new Scene();
    const kept = await scene.open();
    scene.server.mood = 'unreachable';
    for (const name of ['One', 'Two', 'Three']) kept.store.getState().change('Rename', title(name));
    await settle();
    expect(kept.store.getState().keeping).toEqual({ state: 'offline', waiting: 3 });
    expect(await scene.outbox.list()).toHaveLength(3);

    scene.server.mood = 'well';
    scene.due.forEach((work) => work());
    await settle();
    expect(stateOf(kept)).toBe('saved');
    expect(scene.server.log.map((logged) => logged.patches[0]!.value)).toEqual(['One', 'Two', 'Three']);
  });

  it('sends what waited when the page is opened again, and applies nothing twice whose answer was lost', async () => {
    const scene = new Scene();
    const first = await scene.open();
    scene.server.mood = 'deaf';
    first.store.getState().change('Note', note('n1'));
    await settle();
    expect(scene.server.log).toHaveLength(1);
    first.stop();

    scene.server.mood = 'well';
    const second = await scene.open();
    await settle();
    expect(scene.server.log).toHaveLength(1);
    expect(stateOf(second)).toBe('saved');
    expect(Object.keys(second.store.getState().design.notes)).toEqual(['n1']);
  });

  it('waits for the password when the session has ended, and then sends', async () => {
    const scene = new Scene();
    const kept = await scene.open();
    scene.server.mood = 'signed-out';
    kept.store.getState().change('Rename', title('Mains'));
    await settle();
    expect(kept.store.getState().keeping).toEqual({ state: 'signed-out', waiting: 1 });
    scene.server.mood = 'well';
    kept.store.getState().retry();
    await settle();
    expect(scene.server.design.sheets['s1']!.title).toBe('Mains');
    expect(stateOf(kept)).toBe('saved');
  });

  it('says why the server refuses, and goes on once the change is given up', async () => {
    const scene = new Scene();
    const kept = await scene.open();
    scene.server.mood = 'refuses';
    kept.store.getState().change('Rename', title('Mains'));
    kept.store.getState().change('Note', note('n1'));
    await settle();
    expect(kept.store.getState().keeping).toEqual({ state: 'refused', waiting: 2, reason: 'runs.w1: no such device' });
    scene.server.mood = 'well';
    kept.store.getState().resolveConflict('theirs');
    await settle();
    expect(titleOf(kept)).toBeUndefined();
    expect(scene.server.log).toHaveLength(1);
  });

  it('changes nothing for someone who may only look', async () => {
    const scene = new Scene();
    const kept = await scene.open('reviewer');
    kept.store.getState().change('Rename', title('Mains'));
    await settle();
    expect(titleOf(kept)).toBeUndefined();
    expect(scene.server.received).toEqual([]);
  });
});

describe('two people on one field', () => {
  async function meet(): Promise<{ scene: Scene; kept: KeptDesign }> {
    const scene = new Scene();
    const kept = await scene.open();
    scene.server.keep({ id: 'b', label: 'Rename', patches: title('Theirs') as Change['patches'] }, 'Bo');
    kept.store.getState().change('Rename', title('Mine'));
    await settle();
    return { scene, kept };
  }

  it('shows both values and whose the other is', async () => {
    const { kept } = await meet();
    expect(kept.store.getState().keeping).toEqual({
      state: 'conflict',
      waiting: 1,
      conflicts: [{ path: ['sheets', 's1', 'title'], mine: 'Mine', theirs: 'Theirs', by: 'Bo' }],
    });
  });

  it('keeps mine on top of theirs', async () => {
    const { scene, kept } = await meet();
    kept.store.getState().resolveConflict('mine');
    await settle();
    expect([titleOf(kept), scene.server.design.sheets['s1']!.title, stateOf(kept)]).toEqual(['Mine', 'Mine', 'saved']);
  });

  it('takes theirs and drops mine', async () => {
    const { scene, kept } = await meet();
    kept.store.getState().resolveConflict('theirs');
    await settle();
    expect([titleOf(kept), scene.server.design.sheets['s1']!.title, stateOf(kept)]).toEqual([
      'Theirs',
      'Theirs',
      'saved',
    ]);
  });
});

describe('news and tabs', () => {
  it("lays another person's news beneath what waits and asks the log for what it missed", async () => {
    const scene = new Scene();
    const kept = await scene.open();
    scene.server.keep({ id: 'b1', label: 'Note', patches: note('b1') as Change['patches'] }, 'Bo');
    const late = scene.server.keep({ id: 'b2', label: 'Note', patches: note('b2') as Change['patches'] }, 'Bo');
    kept.tellNews([late]);
    await settle();
    expect(Object.keys(kept.store.getState().design.notes).toSorted()).toEqual(['b1', 'b2']);
    expect(kept.store.getState().seq).toBe(2);
  });

  it('a second tab follows the first at once, and every change is sent once', async () => {
    const scene = new Scene();
    const [one, two] = [await scene.open(), await scene.open()];
    one.store.getState().change('Rename', title('One'));
    expect(titleOf(two)).toBe('One');
    two.store.getState().change('Note', note('n1'));
    one.store.getState().change('Note', note('n2'));
    await settle();
    expect(new Set(scene.server.received).size).toBe(3);
    expect(scene.server.log).toHaveLength(3);
    expect([stateOf(one), stateOf(two)]).toEqual(['saved', 'saved']);
    expect(one.store.getState().design).toEqual(two.store.getState().design);
    expect(one.store.getState().design).toEqual(scene.server.design);
  });

  it('undo takes back only what was done in this tab, and is itself sent', async () => {
    const scene = new Scene();
    const kept = await scene.open();
    kept.store.getState().change('Rename the sheet', title('Mains'));
    const theirs = { id: 'b', label: 'Note', patches: note('b') as Change['patches'] };
    await settle();
    kept.tellNews([scene.server.keep(theirs, 'Bo')]);
    expect(kept.store.getState().canUndo).toBe('Rename the sheet');
    kept.store.getState().undo();
    await settle();
    expect(scene.server.design.sheets['s1']!.title).toBeUndefined();
    expect(Object.keys(scene.server.design.notes)).toEqual(['b']);
    expect(kept.store.getState().canRedo).toBe('Rename the sheet');
    kept.store.getState().redo();
    await settle();
    expect(scene.server.design.sheets['s1']!.title).toBe('Mains');
    expect(kept.store.getState().canUndo).toBe('Rename the sheet');
  });
});
