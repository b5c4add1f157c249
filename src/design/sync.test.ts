import { describe, expect, it } from 'vitest';

import type { Change } from '#shared/api/design.ts';
import type { Design } from '#shared/model/design.ts';

import { addWaiting, dropWaiting, openSync, replaceWaiting, takeKept } from './sync.ts';

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

function rename(id: string, title: string, base = 0): Change {
  return { id, base, label: 'Rename', patches: [{ op: 'set', path: ['sheets', 's1', 'title'], value: title }] };
}

function note(id: string, base = 0): Change {
  const value = { id, sheetId: 's1', x: 0, y: 0, text: id };
  return { id, base, label: 'Note', patches: [{ op: 'set', path: ['notes', id], value }] };
}

describe('what a person sees while changes travel', () => {
  it('shows a change at once, before the server has it', () => {
    const sync = addWaiting(openSync(3, empty), rename('a', 'Mains'));
    expect(sync.design.sheets['s1']!.title).toBe('Mains');
    expect(sync.base.sheets['s1']!.title).toBeUndefined();
  });

  it('keeps the very same picture when the server acknowledges', () => {
    const before = addWaiting(openSync(3, empty), rename('a', 'Mains'));
    const { sync, gap } = takeKept(before, [{ ...rename('a', 'Mains'), seq: 4 }]);
    expect(gap).toBe(false);
    expect(sync.design).toBe(before.design);
    expect([sync.seq, sync.waiting.length]).toEqual([4, 0]);
  });

  it("lays another person's change beneath what waits", () => {
    const before = addWaiting(openSync(3, empty), rename('a', 'Mains'));
    const { sync } = takeKept(before, [
      { ...rename('x', 'Theirs'), seq: 4 },
      { ...note('n'), seq: 5 },
    ]);
    expect(sync.design.sheets['s1']!.title).toBe('Mains');
    expect(sync.base.sheets['s1']!.title).toBe('Theirs');
    expect(sync.design.notes['n']!.text).toBe('n');
    expect(sync.waiting.map((change) => change.id)).toEqual(['a']);
  });

  it('takes no change twice, neither news nor an acknowledgement', () => {
    const once = takeKept(openSync(3, empty), [{ ...note('n'), seq: 4 }]).sync;
    const removed = takeKept(once, [{ id: 'r', seq: 5, patches: [{ op: 'remove', path: ['notes', 'n'] }] }]).sync;
    const again = takeKept(removed, [{ ...note('n'), seq: 4 }]).sync;
    expect(again.design.notes).toEqual({});
    expect(again.seq).toBe(5);
  });

  it('says that the log must be asked when a number is missing, and keeps what followed on', () => {
    const { sync, gap } = takeKept(openSync(3, empty), [
      { ...note('n4'), seq: 4 },
      { ...note('n6'), seq: 6 },
    ]);
    expect(gap).toBe(true);
    expect(sync.seq).toBe(4);
    expect(Object.keys(sync.design.notes)).toEqual(['n4']);
  });

  it('no longer waits for a change that was in the design when it was loaded', () => {
    const before = openSync(9, empty, [rename('a', 'Mains')]);
    const { sync } = takeKept(before, [{ ...rename('a', 'Mains'), seq: 8 }]);
    expect(sync.waiting).toEqual([]);
    expect(sync.seq).toBe(9);
  });

  it('puts back the picture of the server when a change is given up, and leaves the rest', () => {
    const both = addWaiting(addWaiting(openSync(0, empty), rename('a', 'Mine')), note('n'));
    const sync = dropWaiting(both, 'a');
    expect(sync.design.sheets['s1']!.title).toBeUndefined();
    expect(sync.design.notes['n']).toBeDefined();
  });

  it('sends a change again in its old place, on a newer base', () => {
    const both = addWaiting(addWaiting(openSync(0, empty), rename('a', 'First')), rename('b', 'Second'));
    const sync = replaceWaiting(both, 'a', rename('c', 'First', 7));
    expect(sync.waiting.map((change) => [change.id, change.base])).toEqual([
      ['c', 7],
      ['b', 0],
    ]);
    expect(sync.design.sheets['s1']!.title).toBe('Second');
  });
});
