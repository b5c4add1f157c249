import { describe, expect, test } from 'vitest';

import type { Design, Device, Run } from '#shared/model/design.ts';

import { colourOf, wireColours } from './wire-colour.ts';

/** `'g.pos > f.a'` a run; ids are w1, w2 … */
function aBoat(
  devices: readonly Partial<Device>[],
  wires: readonly string[],
  profile: 'abyc-e11' | 'iso-13297',
): Design {
  const end = (text: string) => ({ device: text.split('.')[0]!, terminal: text.split('.')[1]! });
  const runs = wires.map((wire, i): Run => {
    const [from, to] = wire.split(' > ');
    return { id: `w${i + 1}`, from: end(from!), to: end(to!), conductor: { size: '14 AWG' } };
  });
  return {
    format: 'ampwright-design',
    version: 1,
    basis: { profile },
    sheets: { s: { id: 's' } },
    zones: {},
    devices: Object.fromEntries(
      devices.map((device) => [device.id!, { ratings: {}, sheetId: 's', x: 0, y: 0, ...device } as Device]),
    ),
    runs: Object.fromEntries(runs.map((run) => [run.id, run])),
    modes: {},
    notes: {},
  };
}

const devices: readonly Partial<Device>[] = [
  { id: 'g', kind: 'battery' },
  { id: 'm', kind: 'starter' },
  { id: 'f', kind: 'fuse', ratings: { ratedA: 10 } },
  { id: 'b', kind: 'switch', ratings: { continuousA: 10, role: 'float' } },
  { id: 'x', kind: 'busbar', ratings: { ratedA: 100, role: 'dc-', studs: 4 } },
  { id: 't', kind: 'terminal', ratings: { ratedA: 30, ways: 4 } },
  { id: 'e', kind: 'bond', ratings: { ways: 2 } },
  { id: 'pump', kind: 'load', symbol: 'pump', ratings: { nominalV: 12, ratedA: 5, duty: 'bilge' } },
  { id: 'nav', kind: 'load', symbol: 'lamp', ratings: { nominalV: 12, ratedA: 1, duty: 'navLight' } },
  { id: 'lamp', kind: 'load', symbol: 'lamp', ratings: { nominalV: 12, ratedA: 1 } },
  { id: 'radio', kind: 'load', symbol: 'radio', ratings: { nominalV: 12, ratedA: 6 } },
];
const wires = [
  'g.pos > f.a',
  'f.b > b.a',
  'b.b > pump.pos',
  'pump.neg > t.1',
  't.2 > x.1',
  'x.2 > g.neg',
  'g.neg > e.1',
  'f.b > nav.pos',
  'f.b > lamp.pos',
  'f.b > radio.pos',
  'g.pos > m.solenoid',
];

describe('a run without a colour of its own takes the one of its duty', () => {
  test('by the ABYC tables', () => {
    expect(Object.values(wireColours(aBoat(devices, wires, 'abyc-e11')))).toEqual([
      'red', // ahead of the fuse
      'brown', // fuse to float switch: a pump's
      'brown',
      'yellow',
      'yellow', // block to bar: no end but the bar's says so
      'yellow',
      'green',
      'grey',
      'blue',
      'red',
      'yellow/red',
    ]);
  });

  test('by ISO 13297', () => {
    const colours = Object.values(wireColours(aBoat(devices, wires, 'iso-13297')));
    expect(colours.slice(0, 7)).toEqual(['red', 'red', 'red', 'black', 'black', 'black', 'green/yellow']);
  });

  test('a colour that was given stands', () => {
    const boat = aBoat(devices, wires, 'abyc-e11');
    const given: Run = { ...boat.runs.w1!, colour: 'orange' };
    expect(wireColours({ ...boat, runs: { ...boat.runs, w1: given } }).w1).toBe('orange');
    expect(colourOf(boat, given)).toBe('orange');
  });

  test('a short between feed and return leaves every run a colour', () => {
    const shorted = aBoat(devices, [...wires, 'g.pos > t.3'], 'abyc-e11');
    expect(Object.keys(wireColours(shorted))).toHaveLength(wires.length + 1);
  });

  test('a thousand runs take a few milliseconds, not a pass each', () => {
    const many = Array.from(
      { length: 1000 },
      (_, i) => [{ id: `l${i}`, kind: 'load', ratings: { nominalV: 12, ratedA: 1 } }, `f.b > l${i}.pos`] as const,
    );
    const boat = aBoat(
      [...devices, ...many.map(([device]) => device)],
      [...wires, ...many.map(([, wire]) => wire)],
      'abyc-e11',
    );
    const began = performance.now();
    wireColours(boat);
    expect(performance.now() - began).toBeLessThan(250);
  });
});
