import { expect, it } from 'vitest';

import { applyPatches, type Patch } from '#shared/model/patch.ts';

import { noHistory, remember, stepBack, stepForward } from './history.ts';

const set = (path: string[], value: unknown): Patch => ({ op: 'set', path, value });

it('goes back and forth through every change and ends where it began', () => {
  let document: object = { runs: {} };
  let history = noHistory;
  const steps = [
    set(['runs', 'w1'], { lengthM: 1 }),
    set(['runs', 'w1', 'lengthM'], 2),
    set(['runs', 'w2'], { lengthM: 3 }),
  ];
  for (const patch of steps) {
    history = remember(history, document, 'Change', [patch]);
    document = applyPatches(document, [patch]);
  }
  const end = document;

  for (let i = 0; i < steps.length; i++) {
    const back = stepBack(history, document)!;
    document = applyPatches(document, back.patches);
    history = back.history;
  }
  expect(document).toEqual({ runs: {} });
  expect(stepBack(history, document)).toBeNull();

  for (let i = 0; i < steps.length; i++) {
    const forth = stepForward(history, document)!;
    document = applyPatches(document, forth.patches);
    history = forth.history;
  }
  expect(document).toEqual(end);
  expect(stepForward(history, document)).toBeNull();
});

it('leaves what another person did between a change and its undo', () => {
  const before = { runs: { w1: { lengthM: 1, note: 'mine' } } };
  const patch = set(['runs', 'w1', 'lengthM'], 2);
  const history = remember(noHistory, before, 'Length of W1', [patch]);
  const withTheirs = applyPatches(applyPatches(before, [patch]), [set(['runs', 'w1', 'note'], 'theirs')]);

  const back = stepBack(history, withTheirs)!;
  expect(applyPatches(withTheirs, back.patches)).toEqual({ runs: { w1: { lengthM: 1, note: 'theirs' } } });
});

it('forgets what could be redone once something new is done', () => {
  const patch = set(['a'], 1);
  const undone = stepBack(remember(noHistory, {}, 'One', [patch]), { a: 1 })!.history;
  expect(undone.future).toHaveLength(1);
  expect(remember(undone, {}, 'Two', [patch]).future).toEqual([]);
});
