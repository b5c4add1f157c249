import { describe, expect, test } from 'vitest';

import { boxOf, terminalAt } from '#shared/kinds/place.ts';
import type { Design } from '#shared/model/design.ts';
import { applyPatches } from '#shared/model/patch.ts';
import { aSmallDesign } from '#shared/testing/small-design.ts';

import { acceptFinding, withdrawAcceptance } from './accept-finding.ts';
import { addBend, moveBend, removeBend, setBends } from './bends.ts';
import { copy, duplicate, paste, readFragment } from './clipboard.ts';
import { connect } from './connect.ts';
import { deleteDevices, deleteRuns } from './delete.ts';
import type { Edit } from './edit.ts';
import { moveDevices } from './move-devices.ts';
import { newDesign } from './new-design.ts';
import { placeDevice } from './place-device.ts';
import { placeFusePanel } from './place-fuse-panel.ts';
import { replaceDesign } from './replace-design.ts';
import { rotateDevices } from './rotate-devices.ts';
import { rename, setField, setFields, setLength, setLoadRating } from './set-field.ts';
import { addSheet, deleteSheet } from './sheets.ts';
import { addZone, deleteZone } from './zones.ts';

function counting(prefix = 'new'): () => string {
  let count = 0;
  return () => `${prefix}-${++count}`;
}

function apply(design: Design, edit: Edit): Design {
  expect(edit.refused).toBeUndefined();
  return applyPatches(design, edit.patches);
}

const sheetId = 's1';
const boat = aSmallDesign();

function withPanel(): { design: Design; ids: string[] } {
  const edit = placeFusePanel(boat, { sheetId, at: { x: 200, y: 64 }, ways: 3 }, counting('p'));
  return { design: apply(boat, edit), ids: edit.deviceIds };
}

describe('placing', () => {
  test('puts a part on the grid with its ratings and the next mark of its letter', () => {
    const edit = placeDevice(
      boat,
      { partId: 'fuse-bolt-100', sheetId, at: { x: 101, y: 59 }, zoneId: 'helm' },
      counting(),
    );
    expect(edit.label).toBe('Place F2');
    expect(apply(boat, edit).devices['new-1']).toMatchObject({
      kind: 'fuse',
      mark: 'F2',
      x: 104,
      y: 56,
      zoneId: 'helm',
      ratings: { ratedA: 100, family: 'bolt-down' },
    });
  });

  test('takes the highest number used plus one, so that a printed number does not come back', () => {
    const numbered = applyPatches(boat, [{ op: 'set', path: ['devices', 'f1', 'mark'], value: 'F9' }]);
    expect(placeDevice(numbered, { partId: 'fuse-bolt-100', sheetId, at: { x: 0, y: 0 } }, counting()).label).toBe(
      'Place F10',
    );
  });

  test('a part that the locker does not hold is refused', () => {
    expect(placeDevice(boat, { partId: 'warp-core', sheetId, at: { x: 0, y: 0 } }, counting()).refused).toBeDefined();
  });

  test('hangs each fuse of a panel with its a on a stud of the bar', () => {
    const { design, ids } = withPanel();
    const [bar, ...fuses] = ids.map((id) => design.devices[id]!);
    expect(fuses).toHaveLength(3);
    for (const fuse of fuses) {
      const stud = terminalAt(bar!, fuse.mountedOn!.terminal)!;
      expect(fuse.parent).toBe(bar!.id);
      expect(terminalAt(fuse, 'a')).toMatchObject({ x: stud.x, y: stud.y });
      expect(boxOf(fuse).y).toBeGreaterThanOrEqual(boxOf(bar!).y + boxOf(bar!).height / 2);
      expect(terminalAt(fuse, 'b')!.y).toBeGreaterThan(terminalAt(fuse, 'a')!.y);
    }
    expect(fuses.map((fuse) => fuse.mark)).toEqual(['F2', 'F3', 'F4']);
    expect(new Set(fuses.map((fuse) => fuse.mountedOn!.terminal))).toEqual(new Set(['2', '3', '4']));
  });
});

describe('moving and turning', () => {
  test('moves by whole squares of the grid', () => {
    const moved = apply(boat, moveDevices(boat, ['g1'], { x: 13, y: -3 }));
    expect(moved.devices.g1).toMatchObject({ x: 112, y: 160 });
    expect(moveDevices(boat, ['g1'], { x: 3, y: 3 }).patches).toEqual([]);
  });

  test('an assembly moves as one piece', () => {
    const { design, ids } = withPanel();
    const moved = apply(design, moveDevices(design, [ids[0]!], { x: 16, y: 32 }));
    for (const id of ids) {
      expect(moved.devices[id]!.x - design.devices[id]!.x).toBe(16);
      expect(moved.devices[id]!.y - design.devices[id]!.y).toBe(32);
    }
  });

  test('bends go along where both ends move, and stay where one does', () => {
    const bent = apply(boat, setBends(boat, 'w1', [{ x: 48, y: 48 }]));
    expect(apply(bent, moveDevices(bent, ['g1', 'f1'], { x: 8, y: 8 })).runs.w1!.bends).toEqual([{ x: 56, y: 56 }]);
    expect(apply(bent, moveDevices(bent, ['g1'], { x: 8, y: 8 })).runs.w1!.bends).toEqual([{ x: 48, y: 48 }]);
  });

  test('an assembly turns as one piece, its fuses still on their studs, and four turns are none', () => {
    const { design, ids } = withPanel();
    let turned = design;
    for (let quarter = 1; quarter <= 4; quarter++) {
      turned = apply(turned, rotateDevices(turned, ids));
      const bar = turned.devices[ids[0]!]!;
      for (const id of ids.slice(1)) {
        const a = terminalAt(turned.devices[id]!, 'a')!;
        const stud = terminalAt(bar, turned.devices[id]!.mountedOn!.terminal)!;
        expect([a.x, a.y]).toEqual([stud.x, stud.y]);
        expect([a.x % 8, a.y % 8].map(Math.abs)).toEqual([0, 0]);
      }
    }
    for (const id of ids)
      expect(turned.devices[id]).toMatchObject({ x: design.devices[id]!.x, y: design.devices[id]!.y });
  });
});

describe('deleting', () => {
  test('a device takes its runs, and all that pointed at it, with it', () => {
    const held = applyPatches(boat, [
      { op: 'set', path: ['devices', 'f1', 'mountedOn'], value: { device: 'g1', terminal: 'pos' } },
      { op: 'set', path: ['devices', 'f1', 'ratings', 'backedUpBy'], value: 'g1' },
      {
        op: 'set',
        path: ['modes', 'm'],
        value: { id: 'm', name: 'Anchor', states: { g1: { soc: 0.5 }, p1: { on: true } } },
      },
      { op: 'set', path: ['accepted'], value: { 'conductor/ampacity:w1': { reason: 'r', by: 'b', at: 'a' } } },
    ]);
    const left = apply(held, deleteDevices(held, ['g1']));
    expect(Object.keys(left.devices)).toEqual(['f1', 'p1']);
    expect(Object.keys(left.runs)).toEqual(['w2']);
    expect(left.devices.f1).not.toHaveProperty('mountedOn');
    expect(left.devices.f1!.ratings).not.toHaveProperty('backedUpBy');
    expect(left.modes.m!.states).toEqual({ p1: { on: true } });
    expect(left.accepted).toEqual({});
  });

  test('a fuse panel goes with its fuses', () => {
    const { design, ids } = withPanel();
    expect(apply(design, deleteDevices(design, [ids[0]!]))).toEqual(boat);
  });

  test('a run goes alone', () => {
    const edit = deleteRuns(boat, ['w1']);
    expect(edit.label).toBe('Delete W1');
    expect(Object.keys(apply(boat, edit).runs)).toEqual(['w2', 'w3']);
    expect(Object.keys(apply(boat, edit).devices)).toHaveLength(3);
  });
});

describe('wiring', () => {
  const from = { device: 'g1', terminal: 'neg' };
  const to = { device: 'p1', terminal: 'neg' };

  test('gives a run the next number, a size for what it feeds, the insulation of the basis and the zones of its ends', () => {
    const edit = connect(boat, { from, to }, counting());
    expect(edit.label).toBe('Wire G1 to M1');
    expect(apply(boat, edit).runs['new-1']).toEqual({
      id: 'new-1',
      mark: 'W4',
      from,
      to,
      conductor: { size: '14 AWG', insulationC: 105 },
      zoneIds: ['helm'],
    });
  });

  test('sizes in mm² under the ISO profile', () => {
    const iso = applyPatches(boat, [{ op: 'set', path: ['basis', 'profile'], value: 'iso-13297' }]);
    expect(apply(iso, connect(iso, { from, to }, counting())).runs['new-1']!.conductor.size).toBe('2.5 mm²');
  });

  test('a terminal is not wired to itself, nor to one that is not there', () => {
    expect(connect(boat, { from, to: from }, counting()).refused).toBeDefined();
    expect(connect(boat, { from, to: { device: 'p1', terminal: 'x' } }, counting()).refused).toBeDefined();
  });

  test('bends are put on the grid, moved and taken out; without any the router has the run again', () => {
    let bent = apply(boat, addBend(boat, 'w1', 0, { x: 49, y: 50 }));
    bent = apply(bent, addBend(bent, 'w1', 1, { x: 80, y: 80 }));
    bent = apply(bent, moveBend(bent, 'w1', 1, { x: 88, y: 80 }));
    expect(bent.runs.w1!.bends).toEqual([
      { x: 48, y: 48 },
      { x: 88, y: 80 },
    ]);
    bent = apply(bent, removeBend(bent, 'w1', 0));
    bent = apply(bent, removeBend(bent, 'w1', 0));
    expect(bent.runs.w1).not.toHaveProperty('bends');
  });
});

describe('changing a value', () => {
  test('is one small patch, and none where nothing changes', () => {
    expect(setLength(boat, 'w1', 1.5)).toEqual({
      label: 'Set the length of W1',
      patches: [{ op: 'set', path: ['runs', 'w1', 'lengthM'], value: 1.5 }],
    });
    expect(setLength(boat, 'w1', 0.1).patches).toEqual([]);
    expect(setLength(boat, 'w1', undefined).patches).toEqual([{ op: 'remove', path: ['runs', 'w1', 'lengthM'] }]);
    expect(rename(boat, 'p1', 'Aft pump').label).toBe('Rename M1');
    expect(setField(boat, ['basis', 'hull'], 'steel').patches).toHaveLength(1);
  });

  test('is refused with a sentence where the document may not say it', () => {
    expect(setLength(boat, 'w1', 0).refused).toBe('This must be greater than 0.');
    expect(setField(boat, ['runs', 'w1', 'colour'], 'puce').refused).toBe('This must be a colour, or two joined by /.');
    expect(setField(boat, ['devices', 'g1', 'zoneId'], 'hold').refused).toBe(
      'This names zone hold, which is not there.',
    );
    expect(setField(boat, ['devices', 'g1', 'id'], 'g2').refused).toBeDefined();
    expect(setField(boat, ['devices', 'g9', 'name'], 'x').refused).toBe('It is not there any more.');
    expect(setField(boat, ['devices', 'p1', 'ratings', 'ratedA'], undefined).refused).toBeDefined();
  });

  test('does not take a terminal from under a run', () => {
    const { design, ids } = withPanel();
    const wired = apply(
      design,
      connect(design, { from: { device: 'g1', terminal: 'pos' }, to: { device: ids[0]!, terminal: '4' } }, counting()),
    );
    expect(setField(wired, ['devices', ids[0]!, 'ratings', 'studs'], 2).refused).toBe(
      'A run ends on a terminal that this would take away.',
    );
  });

  test('of several at once is all or nothing', () => {
    const size = (id: string, value: string) => ({ path: ['runs', id, 'conductor', 'size'], value });
    expect(setFields(boat, [size('w1', '12 AWG'), size('w2', '12 AWG')], 'Re-size 2 runs').patches).toHaveLength(2);
    expect(setFields(boat, [size('w1', '12 AWG'), size('w2', '11 AWG')], 'Re-size 2 runs').patches).toEqual([]);
  });

  test('of a load to watts takes its amperes out', () => {
    const rated = apply(boat, setLoadRating(boat, 'p1', { ratedW: 60 }));
    expect(rated.devices.p1!.ratings).toEqual({ nominalV: 12, duty: 'bilge', ratedW: 60 });
  });
});

describe('copy and paste', () => {
  test('makes new ids and marks, keeps what lies between, and lets go of what points outside', () => {
    const fragment = readFragment(JSON.stringify(copy(boat, { devices: ['f1', 'p1'] })))!;
    expect(Object.keys(fragment.runs)).toEqual(['w2']);
    const edit = paste(boat, fragment, { sheetId, at: { x: 400, y: 200 } }, counting());
    const pasted = apply(boat, edit);
    expect(edit.label).toBe('Paste 2 devices');
    expect(edit.deviceIds.map((id) => pasted.devices[id]!.mark)).toEqual(['F2', 'M2']);
    expect(pasted.runs[edit.runIds[0]!]).toMatchObject({ mark: 'W4', lengthM: 3, from: { device: edit.deviceIds[0] } });
    const [fuse, pump] = edit.deviceIds.map((id) => boxOf(pasted.devices[id]!));
    expect([fuse!.x, fuse!.y]).toEqual([400, 200]);
    expect([pump!.x - fuse!.x, pump!.y - fuse!.y]).toEqual([160, 64]);
  });

  test('works into another vessel, whose zones are not these', () => {
    const other = newDesign({ name: 'Shoveler' }, counting('o'));
    const target = Object.keys(other.sheets)[0]!;
    const edit = paste(
      other,
      copy(boat, { devices: ['g1', 'f1', 'p1'] }),
      { sheetId: target, at: { x: 80, y: 80 } },
      counting(),
    );
    const pasted = apply(other, edit);
    expect(Object.keys(pasted.devices)).toHaveLength(3);
    expect(Object.keys(pasted.runs)).toHaveLength(3);
    for (const device of Object.values(pasted.devices)) expect(device.zoneId).toBeUndefined();
    for (const run of Object.values(pasted.runs)) expect(run.zoneIds ?? []).toEqual([]);
  });

  test('an assembly is copied whole by its bar', () => {
    const { design, ids } = withPanel();
    const doubled = apply(design, duplicate(design, { devices: [ids[0]!] }, counting('d')));
    const fuses = Object.values(doubled.devices).filter(
      (device) => device.parent === 'd-1' || device.mountedOn?.device.startsWith('d-'),
    );
    expect(fuses).toHaveLength(3);
    for (const fuse of fuses) expect(doubled.devices[fuse.parent!]!.kind).toBe('busbar');
  });

  test.each(['', 'F3', '{}', '{"format":"ampwright-fragment","devices":{"a":{"kind":"flux"}},"runs":{}}'])(
    'text that is no fragment is not pasted: %s',
    (text) => {
      expect(readFragment(text)).toBeUndefined();
    },
  );
});

describe('sheets, zones, findings and whole designs', () => {
  test('a sheet goes with what is on it, and the last one stays', () => {
    expect(deleteSheet(boat, 's1').refused).toBe('A design has at least one sheet.');
    const two = apply(boat, addSheet(boat, { title: 'AC', paper: 'A3' }, counting()));
    expect(two.sheets['new-1']).toEqual({ id: 'new-1', number: 2, title: 'AC', paper: 'A3' });
    const left = apply(two, deleteSheet(two, 's1'));
    expect([Object.keys(left.sheets), left.devices, left.runs]).toEqual([['new-1'], {}, {}]);
  });

  test('a zone goes and what stood in it stays', () => {
    const more = apply(boat, addZone(boat, { name: 'Bilge', bilge: true }, counting()));
    expect(more.zones['new-1']).toEqual({ id: 'new-1', name: 'Bilge', bilge: true });
    const left = apply(boat, deleteZone(boat, 'helm'));
    expect(left.zones).toEqual({});
    expect(left.devices.g1).not.toHaveProperty('zoneId');
    expect(left.runs.w1!.zoneIds).toEqual([]);
  });

  test('an acceptance is kept under its finding and can be withdrawn', () => {
    const accepted = apply(
      boat,
      acceptFinding('conductor/ampacity:w1', { reason: 'short', by: 'Ines Halloran', at: '2026-05-02T10:00:00Z' }),
    );
    expect(accepted.accepted!['conductor/ampacity:w1']!.reason).toBe('short');
    expect(apply(accepted, withdrawAcceptance(accepted, 'conductor/ampacity:w1')).accepted).toEqual({});
  });

  test('one design is turned into another by setting only what differs', () => {
    const { design } = withPanel();
    const next = applyPatches(design, [
      { op: 'set', path: ['runs', 'w1', 'lengthM'], value: 4 },
      { op: 'remove', path: ['runs', 'w3'] },
      { op: 'set', path: ['basis', 'hull'], value: 'steel' },
    ]);
    const edit = replaceDesign(boat, next);
    expect(apply(boat, edit)).toEqual(next);
    expect(edit.patches.map((patch) => patch.path.join('.'))).not.toContain('devices.g1');
    expect(replaceDesign(boat, boat).patches).toEqual([]);
  });
});
