import fc from 'fast-check';
import { expect, test } from 'vitest';

import { readDesignValue } from '#shared/files/read-design.ts';
import { writeDesign } from '#shared/files/write-design.ts';
import { KINDS } from '#shared/kinds/index.ts';
import { terminalsOf, UNIT } from '#shared/kinds/place.ts';
import type { Design } from '#shared/model/design.ts';
import { applyPatches, invertPatches } from '#shared/model/patch.ts';

import { addBend } from './bends.ts';
import { copy, duplicate, paste } from './clipboard.ts';
import { connect } from './connect.ts';
import { deleteSelection } from './delete.ts';
import type { Edit } from './edit.ts';
import { moveDevices } from './move-devices.ts';
import { newDesign } from './new-design.ts';
import { placeDevice } from './place-device.ts';
import { placeFusePanel } from './place-fuse-panel.ts';
import { rotateDevices } from './rotate-devices.ts';
import { setField, setLength } from './set-field.ts';
import { addSheet, deleteSheet } from './sheets.ts';
import { addZone, deleteZone } from './zones.ts';

const PARTS = KINDS.flatMap((kind) => kind.offers.map((offer) => offer.partId));

/** One thing a person does, told by a few numbers so that any of them fits any drawing. */
function act(design: Design, [verb, a, b, c]: readonly number[], newId: () => string): Edit {
  const pick = (record: object, n: number) =>
    Object.keys(record)[n % Math.max(1, Object.keys(record).length)] ?? 'none';
  const device = pick(design.devices, a!);
  const other = pick(design.devices, b!);
  const run = pick(design.runs, a!);
  const sheetId = pick(design.sheets, c!);
  const at = { x: b! * 3, y: c! * 5 };
  const terminal = (id: string, n: number) => {
    const terminals = design.devices[id] ? terminalsOf(design.devices[id]) : [];
    return terminals[n % Math.max(1, terminals.length)]?.name ?? 'none';
  };
  const verbs: readonly (() => Edit)[] = [
    () => placeDevice(design, { partId: PARTS[a! % PARTS.length]!, sheetId, at }, newId),
    () => placeFusePanel(design, { sheetId, at, ways: 1 + (a! % 6) }, newId),
    () =>
      connect(
        design,
        { from: { device, terminal: terminal(device, b!) }, to: { device: other, terminal: terminal(other, c!) } },
        newId,
      ),
    () => moveDevices(design, [device, other], { x: b! - 50, y: c! - 50 }),
    () => rotateDevices(design, [device, other]),
    () => setLength(design, run, c! / 10),
    () => addBend(design, run, 0, at),
    () => setField(design, ['devices', device, 'ratings', 'studs'], 1 + (c! % 8)),
    () => setField(design, ['devices', device, 'zoneId'], pick(design.zones, b!)),
    () => duplicate(design, { devices: [device, other] }, newId),
    () => paste(design, copy(design, { devices: Object.keys(design.devices) }), { sheetId, at }, newId),
    () => deleteSelection(design, { devices: [device], runs: [run] }),
    () => addSheet(design, { title: 'More' }, newId),
    () => deleteSheet(design, sheetId),
    () => addZone(design, { name: 'Hold' }, newId),
    () => deleteZone(design, pick(design.zones, a!)),
  ];
  // Drawing more often than deleting, and never doubling a large drawing again and again.
  const weights = [0, 0, 0, 0, 1, 2, 2, 2, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12, 13, 14, 15];
  const index = weights[verb! % weights.length]!;
  if ((index === 9 || index === 10) && Object.keys(design.devices).length > 60)
    return moveDevices(design, [device], at);
  return verbs[index]!();
}

test('whatever a person does, in whatever order, the drawing reads back, stands on the grid, and can be undone', () => {
  const step = fc.tuple(fc.nat(1000), fc.nat(100), fc.nat(100), fc.nat(100));
  fc.assert(
    fc.property(fc.array(step, { minLength: 1, maxLength: 40 }), (steps) => {
      let count = 0;
      const newId = () => `n${++count}`;
      let design = newDesign({ name: 'Any', zones: [{ name: 'Cabin' }] }, newId);
      for (const numbers of steps) {
        const edit = act(design, numbers, newId);
        expect(edit.label).not.toBe('');
        const next = applyPatches(design, edit.patches);
        expect(applyPatches(next, invertPatches(design, edit.patches))).toEqual(design);
        design = next;
      }
      const read = readDesignValue(JSON.parse(writeDesign(design)));
      expect(read).toMatchObject({ ok: true });
      for (const device of Object.values(design.devices)) {
        for (const { x, y } of terminalsOf(device)) expect([x % UNIT, y % UNIT].map(Math.abs)).toEqual([0, 0]);
      }
      const marks = Object.values(design.devices).map((device) => device.mark);
      expect(new Set(marks).size).toBe(marks.length);
    }),
    { seed: 15, numRuns: 60 },
  );
});
