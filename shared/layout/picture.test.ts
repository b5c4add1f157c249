import { describe, expect, it } from 'vitest';

import type { Design, Device, Run } from '#shared/model/design.ts';

import { placeOf } from './device-place.ts';
import { layoutSheet } from './layout-sheet.ts';
import { faultsOf } from './picture-faults.ts';

describe('the picture of a sheet as a person would lay it', () => {
  it.each([1, 2, 3, 4, 5, 6, 7, 8, 9, 10, 11, 12])('has nothing on top of anything (sheet %i)', (seed) => {
    const design = aSheet(seed);
    expect(faultsOf(design, 's', layoutSheet(design, 's'))).toEqual([]);
  });

  it('is found at fault when a label is put on a device', () => {
    const design = aSheet(5);
    const layout = layoutSheet(design, 's');
    const { w1 } = layout.runs;
    const onDevice = { ...w1!.label!, box: placeOf(design.devices.e1!).box };
    const spoilt = { ...layout, runs: { ...layout.runs, w1: { ...w1!, label: onDevice } } };
    expect(faultsOf(design, 's', spoilt)).toContain(`label ${w1!.label!.text} on device E1`);
  });

  it('stays so for runs nobody touched while a device is moved and put back', () => {
    const design = aSheet(5);
    const before = layoutSheet(design, 's');
    const { f2 } = design.devices;
    const moved = { ...design, devices: { ...design.devices, f2: { ...f2!, y: f2!.y + 16 } } };
    const after = layoutSheet(moved, 's', before);
    for (const { id, from, to } of Object.values(design.runs)) {
      if (from.device === 'f2' || to.device === 'f2') continue;
      expect(after.runs[id]!.points, id).toBe(before.runs[id]!.points);
    }
    expect(faultsOf(moved, 's', after)).toEqual([]);
  });

  it('leads a run that nobody touched round a device that is put on it', () => {
    const design = aSheet(5);
    const before = layoutSheet(design, 's');
    const onRun = before.runs.w3!.points[0]!;
    const wall: Device = {
      id: 'wall',
      kind: 'fuse',
      mark: 'F99',
      sheetId: 's',
      x: onRun.x - 24,
      y: onRun.y + 24,
      ratings: {},
    };
    const after = layoutSheet({ ...design, devices: { ...design.devices, wall } }, 's', before);
    expect(after.runs.w3!.points.length).toBeGreaterThan(2);
    expect(after.runs.w1!.points).toBe(before.runs.w1!.points);
  });
});

/**
 * A panel drawn by hand, in one of many ways: a bar above, fuses, now and then a switch, loads of all sorts, a bar
 * below, and a battery that feeds them; rows of it, lanes 80 to 112 apart.
 */
function aSheet(seed: number): Design {
  const random = randomFrom(seed);
  const pick = <T>(values: readonly T[]): T => values[Math.floor(random() * values.length)]!;
  const devices: Record<string, Device> = {};
  const runs: Record<string, Run> = {};
  let count = 0;
  const add = (device: Omit<Device, 'sheetId'>) => {
    devices[device.id] = { ...device, sheetId: 's' };
  };
  const connect = (from: string, to: string, size: string) => {
    const id = `w${++count}`;
    const end = (text: string) => ({ device: text.split('.')[0]!, terminal: text.split('.')[1]! });
    runs[id] = { id, mark: `W${count}`, from: end(from), to: end(to), conductor: { size } } as Run;
  };
  const pitch = pick([80, 88, 96, 112]);
  const lanes = Math.min(3 + Math.floor(random() * 7), Math.floor(648 / pitch));
  const left = 232;
  const top = 64 + 8 * Math.floor(random() * 4);
  const bottom = top + 408;
  add({
    id: 'p',
    kind: 'busbar',
    mark: 'X1',
    name: 'Positive',
    x: left,
    y: top,
    pitch,
    ratings: { ratedA: 100, studs: lanes + 1, role: 'dc+' },
  });
  add({
    id: 'n',
    kind: 'busbar',
    mark: 'X2',
    name: 'Negative',
    x: left,
    y: bottom,
    pitch,
    ratings: { ratedA: 100, studs: lanes + 1, role: 'dc-' },
  });
  for (let i = 1; i <= lanes; i++) {
    const x = left + 8 + i * pitch;
    add({
      id: `f${i}`,
      kind: 'fuse',
      mark: `F${i}`,
      x: x - 24,
      y: top + 48,
      rotation: 90,
      ratings: { ratedA: pick([3, 5, 10, 15]) },
    });
    connect(`p.${i + 1}`, `f${i}.a`, '14 AWG');
    const isSwitched = random() < 0.4;
    if (isSwitched) {
      add({
        id: `q${i}`,
        kind: 'switch',
        mark: `Q${i}`,
        name: pick(['Nav', 'Cabin', 'Deck']),
        x: x - 24,
        y: top + 160,
        rotation: 90,
        ratings: { continuousA: 20 },
      });
      connect(`f${i}.b`, `q${i}.a`, '14 AWG');
    }
    const symbol = pick(['lamp', 'pump', 'radio', 'socket', 'heater']);
    add({
      id: `e${i}`,
      kind: 'load',
      symbol,
      mark: `E${i}`,
      name: pick(['Plotter', 'Anchor light', 'Pump', 'Heater', 'Radio']),
      x: x - 16,
      y: top + 264,
      ratings: { nominalV: 12, ratedA: pick([0.5, 2, 6]) },
    });
    connect(isSwitched ? `q${i}.b` : `f${i}.b`, `e${i}.pos`, pick(['14 AWG', '10 AWG', '16 AWG']));
    connect(`e${i}.neg`, `n.${i + 1}`, '14 AWG');
  }
  add({
    id: 'g',
    kind: 'battery',
    mark: 'G1',
    name: 'House battery',
    x: 96,
    y: top + 232,
    ratings: { chemistry: 'agm', nominalV: 12, capacityAh: 100 },
  });
  add({
    id: 'm',
    kind: 'switch',
    symbol: 'battery',
    mark: 'Q20',
    name: 'Main',
    x: 96,
    y: top + pick([0, 0, 40]),
    ratings: { continuousA: 200 },
  });
  add({
    id: 'fm',
    kind: 'fuse',
    mark: 'F20',
    name: 'Main',
    x: 88,
    y: top + 152,
    rotation: 270,
    ratings: { ratedA: 100 },
  });
  connect('g.pos', 'fm.a', '2 AWG');
  connect('fm.b', 'm.a', '2 AWG');
  connect('m.b', 'p.1', '2 AWG');
  connect('g.neg', 'n.1', '2 AWG');
  return {
    format: 'ampwright-design',
    version: 1,
    basis: {},
    sheets: { s: { id: 's', number: 1, paper: 'A3' } },
    zones: {},
    devices,
    runs,
    modes: {},
    notes: {},
  };
}

/** Lehmer's generator: the same sheets on every machine. */
function randomFrom(seed: number): () => number {
  let state = seed * 7919;
  return () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
}
