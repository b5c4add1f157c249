import { readFileSync } from 'node:fs';

import { expect, test } from 'vitest';

import { readDesign } from '#shared/files/read-design.ts';
import { writeDesign } from '#shared/files/write-design.ts';
import { boxOf, terminalsOf, UNIT } from '#shared/kinds/place.ts';
import { layoutSheet } from '#shared/layout/layout-sheet.ts';
import { frameBox, titleBlockBox } from '#shared/layout/paper.ts';
import { faultsOf } from '#shared/layout/picture-faults.ts';
import { partsList } from '#shared/lists/parts-list.ts';
import { analyse } from '#shared/rules/analyse.ts';

const text = readFileSync(new URL('./minnow.ampwright.json', import.meta.url), 'utf8');

function minnow() {
  const read = readDesign(text);
  if (!read.ok) throw new Error(`${read.path}: ${read.reason}`);
  return read.design;
}

test('the file of Minnow reads, and is written as our own export would write it', () => {
  expect(writeDesign(minnow())).toBe(text);
});

test('a surveyor finds nothing that must or should be fixed aboard Minnow', () => {
  const { findings, modes } = analyse(minnow());
  expect(findings.filter((finding) => finding.severity !== 'note').map((finding) => finding.message)).toEqual([]);
  for (const mode of Object.values(modes)) expect(mode.converged).toBe(true);
});

test('every device stands on the grid, inside the frame and clear of the title block and of every other', () => {
  const design = minnow();
  const [sheet] = Object.values(design.sheets);
  const frame = frameBox(sheet!);
  const title = titleBlockBox(sheet!);
  const devices = Object.values(design.devices);
  for (const device of devices) {
    const box = boxOf(device);
    expect(
      terminalsOf(device).every(({ x, y }) => x % UNIT === 0 && y % UNIT === 0),
      device.mark,
    ).toBe(true);
    expect(box.x > frame.x && box.y > frame.y, device.mark).toBe(true);
    expect(box.x + box.width < frame.x + frame.width && box.y + box.height < title.y, device.mark).toBe(true);
    const others = devices.filter((other) => other !== device && other.mountedOn === undefined);
    if (device.mountedOn !== undefined) continue;
    for (const other of others) {
      const over = boxOf(other);
      const isApart =
        box.x + box.width <= over.x ||
        over.x + over.width <= box.x ||
        box.y + box.height <= over.y ||
        over.y + over.height <= box.y;
      expect(isApart, `${device.mark} and ${other.mark}`).toBe(true);
    }
  }
});

test('the drawing of Minnow has nothing on top of anything, and a name at everything', () => {
  const design = minnow();
  const layout = layoutSheet(design, 'dc');
  expect(faultsOf(design, 'dc', layout)).toEqual([]);
  expect(Object.values(layout.runs).flatMap(({ label }) => label?.leader ?? [])).toEqual([]);
  expect(Object.values(layout.runs).flatMap(({ hops }) => hops).length).toBeLessThanOrEqual(1);
});

test('every mark aboard Minnow is there once', () => {
  const { devices, runs } = minnow();
  const marks = [...Object.values(devices), ...Object.values(runs)].map(({ mark }) => mark);
  expect(new Set(marks).size).toBe(marks.length);
});

test('the bilge pump is fed ahead of every switch but its own', () => {
  const { runs } = minnow();
  const feed = Object.values(runs).find((run) => run.to.device === 'bilge-breaker');
  expect(feed?.from).toEqual({ device: 'house-battery', terminal: 'pos' });
  // 7 in, E-11: bare from the post.
  expect(feed?.lengthM).toBeLessThanOrEqual(0.1778);
});

test('the outboard stays: what she buys is what the job fits', () => {
  const parts = partsList(minnow());
  expect(parts.map((line) => line.part)).not.toContain('Starter motor');
  expect(parts.find((line) => line.part === 'Fuse with holder, blade' && line.rating.startsWith('5 A'))?.quantity).toBe(
    3,
  );
  // 6 AWG red: W6 0.4 m and W7 2.6 m: 0.4 × 1.1 + 0.3 + 2.6 × 1.1 + 0.3 = 3.9 m, so 4 m.
  expect(parts.find((line) => line.part === 'Boat cable, red' && line.rating.startsWith('6 AWG'))?.quantity).toBe(4);
});
