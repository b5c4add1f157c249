import { beforeAll, describe, expect, it } from 'vitest';

import { exportDesign, getDesign, listChanges, makeChange } from '#shared/api/design.ts';
import { getVessel } from '#shared/api/vessels.ts';
import { readDesign } from '#shared/files/read-design.ts';
import { applyPatches, type Patch } from '#shared/model/patch.ts';
import type { Design } from '#shared/model/design.ts';
import { newId } from '#server/db/ids.ts';
import { aDevice, aRun, aSmallDesign } from '#server/testing/designs.ts';
import { openHouse, type TestHouse } from '#server/testing/open-house.ts';
import { aMember, aVessel, type TestPerson, type TestVessel } from '#server/testing/people.ts';

let house: TestHouse;
beforeAll(async () => {
  house = await openHouse();
});

const set = (path: string, value: unknown): Patch => ({ op: 'set', path: path.split('.'), value });
const remove = (path: string): Patch => ({ op: 'remove', path: path.split('.') });

function change(who: TestPerson, { vesselId }: TestVessel, base: number, patches: readonly unknown[], id = newId()) {
  return who.ask(makeChange, { params: { vesselId }, body: { id, base, label: 'Change it', patches } });
}

async function read(who: TestPerson, { vesselId }: TestVessel): Promise<{ seq: number; design: Design }> {
  return (await who.ask(getDesign, { params: { vesselId } })).body;
}

async function aBoatWithTwoDesigners() {
  const vessel = await aVessel(house, { design: aSmallDesign() });
  const other = await aMember(house, vessel, 'designer');
  return { vessel, mine: vessel.admin, other };
}

describe('a change', () => {
  it('is in the design that is read afterwards, and in its history with who made it', async () => {
    const { vessel, mine } = await aBoatWithTwoDesigners();
    const made = await change(mine, vessel, 0, [set('runs.w1.lengthM', 1.9), set('devices.f1.name', 'House fuse')]);
    expect(made.body).toEqual({ seq: 1 });
    const { seq, design } = await read(mine, vessel);
    expect(seq).toBe(1);
    expect(design.runs['w1']?.lengthM).toBe(1.9);
    expect(design.devices['f1']?.name).toBe('House fuse');
    const log = await mine.ask(listChanges, { params: { vesselId: vessel.vesselId }, query: { since: 0 } });
    expect(log.body).toMatchObject({ more: false, changes: [{ seq: 1, label: 'Change it', by: { name: mine.name } }] });
  });

  it('sent twice is applied once and answers the same number', async () => {
    const { vessel, mine } = await aBoatWithTwoDesigners();
    const id = newId();
    const first = await change(mine, vessel, 0, [set('runs.w1.lengthM', 3)], id);
    await change(mine, vessel, 1, [set('runs.w1.lengthM', 4)]);
    const again = await change(mine, vessel, 0, [set('runs.w1.lengthM', 3)], id);
    expect([first.body, again.body]).toEqual([{ seq: 1 }, { seq: 1 }]);
    const { seq, design } = await read(mine, vessel);
    expect([seq, design.runs['w1']?.lengthM]).toEqual([2, 4]);
  });

  it('leaves the design as applying its patches to the document would, whatever they are', async () => {
    const { vessel, mine } = await aBoatWithTwoDesigners();
    const before = (await read(mine, vessel)).design;
    const patches = [
      set('basis.ambientC', 35),
      set('basis.dropLimits.general', 0.05),
      set('vessel.lengthM', 7.2),
      set('zones.engine', { id: 'engine', name: 'Engine space', engineSpace: true }),
      set('devices.q1', aDevice('q1', 'switch', { continuousA: 20 }, { zoneId: 'engine' })),
      remove('runs.w2'),
      set('runs.w4', aRun('w4', 'f1.b', 'q1.a')),
      set('runs.w5', aRun('w5', 'q1.b', 'e1.pos')),
      set('runs.w5.conductor.size', '8 AWG'),
      set('cables.c1', { id: 'c1', type: '10/2' }),
      set('runs.w5.cable', 'c1'),
      set('accepted.conductor/voltage-drop:e1', { reason: 'a lamp only', by: 'Ada', at: '2026-01-01' }),
      remove('devices.e1.symbol'),
    ];
    expect((await change(mine, vessel, 0, patches)).body).toEqual({ seq: 1 });
    expect((await read(mine, vessel)).design).toEqual(applyPatches(before, patches));
  });

  it('of the name in the design renames the vessel in the list too', async () => {
    const { vessel, mine } = await aBoatWithTwoDesigners();
    await change(mine, vessel, 0, [set('vessel.name', 'Curlew')]);
    const { body } = await mine.ask(getVessel, { params: { vesselId: vessel.vesselId } });
    expect(body.name).toBe('Curlew');
  });

  it('may hold 5,000 patches, and not one more', async () => {
    const { vessel, mine } = await aBoatWithTwoDesigners();
    const many = Array.from({ length: 5000 }, (_, i) =>
      set(`notes.n${i}`, { id: `n${i}`, sheetId: 's1', x: i, y: 0, text: 'x' }),
    );
    const made = await change(mine, vessel, 0, many);
    expect(made.body).toEqual({ seq: 1 });
    expect(Object.keys((await read(mine, vessel)).design.notes)).toHaveLength(5000);
    const more = await change(mine, vessel, 1, [...many, set('notes.n0.text', 'y')]);
    expect([more.status, more.problem.code]).toEqual([400, 'invalid']);
  });

  it('can set or remove a family whole', async () => {
    const { vessel, mine } = await aBoatWithTwoDesigners();
    await change(mine, vessel, 0, [set('accepted', { 'a/b:w1': { reason: 'r', by: 'b', at: 'now' } })]);
    const swapped = await change(mine, vessel, 1, [
      remove('accepted'),
      set('runs', { w9: aRun('w9', 'g1.pos', 'e1.pos') }),
    ]);
    expect(swapped.body).toEqual({ seq: 2 });
    const { design } = await read(mine, vessel);
    expect(design.accepted).toBeUndefined();
    expect(Object.keys(design.runs)).toEqual(['w9']);
  });

  it('from forty people at once gets forty numbers without a gap, and all of them hold', async () => {
    const { vessel, mine, other } = await aBoatWithTwoDesigners();
    const answers = await Promise.all(
      Array.from({ length: 40 }, (_, i) =>
        change(i % 2 === 0 ? mine : other, vessel, 0, [
          set(`notes.n${i}`, { id: `n${i}`, sheetId: 's1', x: 0, y: 0, text: String(i) }),
        ]),
      ),
    );
    expect(answers.map((answer) => answer.body.seq).sort((a, b) => a - b)).toEqual(
      Array.from({ length: 40 }, (_, i) => i + 1),
    );
    expect(Object.keys((await read(mine, vessel)).design.notes)).toHaveLength(40);
  });

  it('leaves a design that can be exported and read again', async () => {
    const { vessel, mine } = await aBoatWithTwoDesigners();
    await change(mine, vessel, 0, [set('cables.c1', { id: 'c1', type: '3G2.5' }), set('runs.w1.cable', 'c1')]);
    const file = await mine.ask(exportDesign, { params: { vesselId: vessel.vesselId } });
    expect(file.headers.get('content-disposition')).toBe('attachment; filename=sandpiper.ampwright.json');
    expect(readDesign(JSON.stringify(file.body))).toMatchObject({ ok: true });
  });
});

describe('two people at one drawing', () => {
  it('who change different fields of one run both get their way', async () => {
    const { vessel, mine, other } = await aBoatWithTwoDesigners();
    await change(other, vessel, 0, [set('runs.w1.lengthM', 5)]);
    expect((await change(mine, vessel, 0, [set('runs.w1.mark', 'W77')])).body).toEqual({ seq: 2 });
    const { design } = await read(mine, vessel);
    expect(design.runs['w1']).toMatchObject({ lengthM: 5, mark: 'W77' });
  });

  it('who change the same field: the later one is told what stands there, by whom, and nothing of theirs is applied', async () => {
    const { vessel, mine, other } = await aBoatWithTwoDesigners();
    await change(other, vessel, 0, [set('runs.w1.lengthM', 5)]);
    const late = await change(mine, vessel, 0, [set('runs.w1.lengthM', 6), set('runs.w2.lengthM', 6)]);
    expect(late.status).toBe(409);
    expect(late.problem).toMatchObject({
      code: 'conflict',
      seq: 1,
      conflicts: [{ path: ['runs', 'w1', 'lengthM'], theirs: 5, by: other.name }],
    });
    expect((await read(mine, vessel)).design.runs['w2']?.lengthM).toBe(2);
    expect((await change(mine, vessel, 1, [set('runs.w1.lengthM', 6)])).body).toEqual({ seq: 2 });
  });

  it('who make the same field the same do not conflict', async () => {
    const { vessel, mine, other } = await aBoatWithTwoDesigners();
    await change(other, vessel, 0, [set('runs.w1.lengthM', 5)]);
    expect((await change(mine, vessel, 0, [set('runs.w1.lengthM', 5)])).status).toBe(200);
  });

  it('one of whom deletes what the other has changed meanwhile: a conflict', async () => {
    const { vessel, mine, other } = await aBoatWithTwoDesigners();
    await change(other, vessel, 0, [set('devices.f1.ratings.ratedA', 15)]);
    const late = await change(mine, vessel, 0, [remove('devices.f1'), remove('runs.w1'), remove('runs.w2')]);
    expect(late.problem).toMatchObject({ code: 'conflict', conflicts: [{ path: ['devices', 'f1'], by: other.name }] });
  });

  it('one of whom changes what the other has deleted meanwhile: a conflict, with nothing standing there', async () => {
    const { vessel, mine, other } = await aBoatWithTwoDesigners();
    await change(other, vessel, 0, [remove('runs.w2')]);
    const late = await change(mine, vessel, 0, [set('runs.w2.lengthM', 4)]);
    expect(late.problem).toMatchObject({ code: 'conflict', conflicts: [{ theirs: null }] });
  });

  it('one of whom replaces a family in which the other has changed something: a conflict', async () => {
    const { vessel, mine, other } = await aBoatWithTwoDesigners();
    await change(other, vessel, 0, [set('runs.w2.lengthM', 4)]);
    const late = await change(mine, vessel, 0, [set('runs', {})]);
    expect(late.problem).toMatchObject({ code: 'conflict', conflicts: [{ path: ['runs'] }] });
  });

  it('one of whom wires to a device that the other deletes: whoever comes later is told', async () => {
    const { vessel, mine, other } = await aBoatWithTwoDesigners();
    await change(mine, vessel, 0, [set('devices.e2', aDevice('e2', 'load', { nominalV: 12, ratedA: 2 }))]);
    await change(other, vessel, 1, [remove('devices.e2')]);
    const wired = await change(mine, vessel, 1, [set('runs.w9', aRun('w9', 'f1.b', 'e2.pos'))]);
    expect(wired.problem).toMatchObject({
      code: 'conflict',
      conflicts: [{ path: ['devices', 'e2'], theirs: null, by: other.name }],
    });

    await change(other, vessel, 2, [set('devices.e3', aDevice('e3', 'load', { nominalV: 12, ratedA: 2 }))]);
    await change(mine, vessel, 3, [set('runs.w8', aRun('w8', 'f1.b', 'e3.pos'))]);
    const deleted = await change(other, vessel, 3, [remove('devices.e3')]);
    expect(deleted.problem).toMatchObject({ code: 'conflict', conflicts: [{ by: mine.name }] });
  });

  it('is one person in two tabs: the later one wins without a question', async () => {
    const { vessel, mine } = await aBoatWithTwoDesigners();
    await change(mine, vessel, 0, [set('runs.w1.lengthM', 5)]);
    expect((await change(mine, vessel, 0, [set('runs.w1.lengthM', 6)])).body).toEqual({ seq: 2 });
  });
});

describe('a change is refused, and nothing of it applied,', () => {
  const refusals: readonly [why: string, patches: readonly unknown[], status: number, field: string | undefined][] = [
    ['when it deletes a device and leaves its runs', [remove('devices.f1')], 409, undefined],
    [
      'when a run would end on a device that is not there',
      [set('runs.w9', aRun('w9', 'f1.b', 'zz.pos'))],
      409,
      undefined,
    ],
    ['when a run would end on a terminal that is not there', [set('runs.w1.to.terminal', 'c')], 400, 'runs.w1.to'],
    ['when a device would stand on no sheet', [set('devices.f1.sheetId', 's9')], 400, 'devices.f1.sheetId'],
    ['when the zone of a run is not there', [set('runs.w1.zoneIds', ['attic'])], 400, 'runs.w1.zoneIds.0'],
    ['when a zone goes that a device lies in', [remove('zones.cabin')], 400, undefined],
    ['when the only sheet goes', [set('sheets', {})], 400, undefined],
    ['when a cable is not there', [set('runs.w1.cable', 'c1')], 400, 'runs.w1.cable'],
    [
      'when a mode speaks of a device that is not there',
      [set('modes.m1', { id: 'm1', name: 'Night', states: { zz: { on: true } } })],
      400,
      'modes.m1.states.zz',
    ],
    ['when a length is nothing', [set('runs.w1.lengthM', 0)], 400, 'runs.w1.lengthM'],
    ['when a length is text', [set('runs.w1.lengthM', '2 m')], 400, 'runs.w1.lengthM'],
    ['when a key is none of the format', [set('runs.w1.length', 2)], 400, 'runs.w1.length'],
    ['when a rating is none of the kind', [set('devices.f1.ratings.poles', 2)], 400, 'devices.f1.ratings.poles'],
    ['when a kind is unknown', [set('devices.f1.kind', 'flux')], 400, 'devices.f1.kind'],
    [
      'when a load has neither amperes nor watts',
      [remove('devices.e1.ratings.ratedA')],
      400,
      'devices.e1.ratings.ratedA',
    ],
    [
      'when a stud is of a terminal that is not there',
      [set('devices.f1.studs', { z: 'M8' })],
      400,
      'devices.f1.studs.z',
    ],
    ['when a device would hold itself', [set('devices.f1.parent', 'f1')], 400, 'devices.f1.parent'],
    [
      'when two devices would hold each other',
      [set('devices.f1.parent', 'g1'), set('devices.g1.parent', 'f1')],
      400,
      'devices.f1.parent',
    ],
    ['when an id is unlike its key', [set('runs.w9', aRun('w8', 'g1.pos', 'f1.a'))], 400, 'runs.w9.id'],
    ['when it goes below what is missing', [set('runs.w9.lengthM', 2)], 400, 'runs.w9.id'],
    ['when it takes away what every design has', [remove('basis')], 400, 'patches.0.path'],
    ['when it writes the format', [set('format', 'mine')], 400, 'patches.0.path'],
    ['when it writes the version', [set('version', 2)], 400, 'patches.0.path'],
    ['when it writes something unknown', [set('wishes.w1', {})], 400, 'patches.0.path'],
    ['when it reaches for a prototype', [set('__proto__.polluted', true)], 400, 'patches.0.path'],
    ['when it reaches for one below', [set('runs.w1.__proto__.polluted', true)], 400, 'patches.0.path'],
    [
      'when an id is a name every object answers to',
      [set('devices.constructor', aDevice('constructor', 'fuse', { ratedA: 1 }))],
      400,
      'patches.0.path',
    ],
    ['when it sets nothing', [{ op: 'set', path: ['runs', 'w1', 'mark'] }], 400, 'patches.0.value'],
    ['when a family would be text', [set('runs', 'none')], 400, 'runs'],
    ['when it has no patches', [], 400, 'patches'],
    ['when a step is neither set nor remove', [{ op: 'move', path: ['runs'] }], 400, 'patches.0.op'],
    ['when a text can not be kept', [set('devices.f1.name', '\ud800')], 400, undefined],
  ];
  let vessel: TestVessel;
  beforeAll(async () => {
    vessel = await aVessel(house, { design: aSmallDesign() });
  });

  it.each(refusals)('%s', async (_why, patches, status, field) => {
    const answer = await change(vessel.admin, vessel, 0, patches);
    expect(answer.problem, JSON.stringify(answer.problem)).toMatchObject({
      status,
      code: status === 409 ? 'conflict' : 'invalid',
    });
    if (field !== undefined) expect(answer.problem.field).toBe(field);
    expect(await read(vessel.admin, vessel)).toEqual({ seq: 0, design: { ...aSmallDesign() } });
  });

  it('when a breaker loses the pole that a run ends on', async () => {
    const boat = await aVessel(house, { design: aSmallDesign() });
    const twoPoles = aDevice('q1', 'breaker', { ratedA: 30, poles: 2 });
    await change(boat.admin, boat, 0, [set('devices.q1', twoPoles), set('runs.w9', aRun('w9', 'q1.b2', 'e1.pos'))]);
    const lost = await change(boat.admin, boat, 1, [set('devices.q1.ratings.poles', 1)]);
    expect([lost.status, lost.problem.field]).toEqual([400, 'runs.w9.from']);
    const both = await change(boat.admin, boat, 1, [
      set('devices.q1.ratings.poles', 1),
      set('runs.w9.from.terminal', 'b'),
    ]);
    expect(both.body).toEqual({ seq: 2 });
  });

  it('when it was made on a number that there is not yet', async () => {
    const answer = await change(vessel.admin, vessel, 5, [set('runs.w1.lengthM', 3)]);
    expect([answer.status, answer.problem.field]).toEqual([400, 'base']);
  });
});
