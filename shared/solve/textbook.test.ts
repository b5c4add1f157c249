import { describe, expect, test } from 'vitest';

import type { Design, Device, Run } from '#shared/model/design.ts';

import { solveFaults } from './solve-faults.ts';
import { solveMode } from './solve-mode.ts';

/** Expected values are typed from the sources named; nothing here reads the engine's tables. */

describe('a short circuit (I = V / R, and a loop of 2/0 AWG at 0.2557 mΩ/m)', () => {
  test('of a 12 V battery of 5 mΩ is 2,400 A', () => {
    const design = circuit([battery('g1', 12, 5), fuse('f1', 0)], [wire('w1', 'g1.pos', 'f1.a', 0)]);
    expect(solveFaults(design)['f1']!.nodeA).toBeCloseTo(2400, 1);
    expect(solveFaults(design)['f1']!.greatestA).toBeCloseTo(2400, 1);
  });

  test('through 4 m of 2/0 AWG and a fuse of 0.3 mΩ is 2,404.8 A', () => {
    const feed: Run = {
      ...wire('w1', 'g1.pos', 'f1.a', 0),
      milliohm: undefined,
      lengthM: 4,
      conductor: { size: '2/0 AWG' },
    };
    const design = circuit([battery('g1', 12.8, 4), fuse('f1', 0.3)], [feed]);
    expect(Math.abs(solveFaults(design)['f1']!.greatestA / 2404.8 - 1)).toBeLessThan(0.001);
  });

  test('adds parallel strings and not the units in series: six 6 V units of 2,400 A give 7,200 A', () => {
    const units = Array.from({ length: 6 }, (_, i) => battery(`g${i}`, 6, 2.5));
    const strings = [0, 2, 4].flatMap((i) => [
      wire(`s${i}`, `g${i}.pos`, `g${i + 1}.neg`, 0),
      wire(`p${i}`, `g${i + 1}.pos`, 'x1.1', 0),
      wire(`n${i}`, `g${i}.neg`, 'x2.1', 0),
    ]);
    const design = circuit(
      [...units, bus('x1'), bus('x2'), fuse('f1', 0)],
      [...strings, wire('w1', 'x1.2', 'f1.a', 0)],
    );
    expect(solveFaults(design)['f1']!.greatestA).toBeCloseTo(7200, 0);
  });

  test('is told on a device between two banks from the side that gives more, never their sum', () => {
    const design = circuit(
      [battery('g1', 12, 4), battery('g2', 12, 12), fuse('f1', 0)],
      [wire('w1', 'g1.pos', 'f1.a', 0), wire('w2', 'f1.b', 'g2.pos', 0), wire('w3', 'g1.neg', 'g2.neg', 0)],
    );
    const { greatestA, nodeA } = solveFaults(design)['f1']!;
    expect(greatestA).toBeCloseTo(3000, 1); // 12 V / 4 mΩ
    expect(nodeA).toBeCloseTo(4000, 1); // with 12 V / 12 mΩ from the other
  });
});

test('two sources, one load: 28 V behind 4 Ω gives 5 A, 7 V behind 1 Ω takes 1 A, the load has 8 V (Lessons in Electric Circuits I, 10)', () => {
  const { devices } = solveMode(
    circuit([battery('g1', 28, 4000), battery('g2', 7, 1000), resistor('e1', 2)], pairs(['g1', 'e1'], ['g2', 'e1'])),
    'all-on',
  );
  expect(devices['g1']!.currentA).toBeCloseTo(-5, 12);
  expect(devices['g2']!.currentA).toBeCloseTo(1, 12);
  expect(devices['e1']!.currentA).toBeCloseTo(4, 12);
  expect(devices['e1']!.terminals['pos']!.potentialV).toBeCloseTo(8, 12);
});

test('an unbalanced bridge carries what nodal analysis says (Principles of Analog Electronics, p. 158)', () => {
  const arm = (id: string, ohm: number, from: string, to: string) => wire(id, from, to, ohm * 1000);
  const { runs, devices } = solveMode(
    circuit(
      [battery('g1', 15, 0), bus('a'), bus('b'), bus('c'), bus('d')],
      [
        wire('w1', 'g1.pos', 'a.1', 0),
        wire('w2', 'g1.neg', 'b.1', 0),
        arm('ac', 50, 'a.2', 'c.1'),
        arm('cb', 10, 'c.2', 'b.2'),
        arm('ad', 30, 'a.3', 'd.1'),
        arm('db', 20, 'd.2', 'b.3'),
        arm('dc', 40, 'd.3', 'c.3'),
      ],
    ),
    'all-on',
  );
  expect(runs['ac']!.currentA).toBeCloseTo(0.240331, 6);
  expect(runs['cb']!.currentA).toBeCloseTo(0.298343, 6);
  expect(runs['ad']!.currentA).toBeCloseTo(0.323204, 6);
  expect(runs['db']!.currentA).toBeCloseTo(0.265193, 6);
  expect(runs['dc']!.currentA).toBeCloseTo(0.058011, 6);
  expect(devices['g1']!.currentA).toBeCloseTo(-0.563536, 6);
  expect(devices['c']!.terminals['1']!.potentialV).toBeCloseTo(2.983425, 6);
  expect(devices['d']!.terminals['1']!.potentialV).toBeCloseTo(5.303867, 6);
});

test.each([
  [1, 2],
  [2, 5 / 3],
  [3, 13 / 8],
  [4, 34 / 21],
  [5, 89 / 55],
  [6, 233 / 144],
])('a ladder of %i sections of 1 Ω looks like %f Ω (Fibonacci)', (sections, ohm) => {
  const ids = Array.from({ length: sections }, (_, i) => i);
  const { devices } = solveMode(
    circuit(
      [battery('g1', 1, 0), bus('x0'), bus('n'), ...ids.map((i) => bus(`x${i + 1}`))],
      [
        wire('w1', 'g1.pos', 'x0.1', 0),
        wire('w2', 'g1.neg', 'n.1', 0),
        ...ids.map((i) => wire(`s${i}`, `x${i}.2`, `x${i + 1}.1`, 1000)),
        ...ids.map((i) => wire(`p${i}`, `x${i + 1}.3`, 'n.2', 1000)),
      ],
    ),
    'all-on',
  );
  expect(-1 / devices['g1']!.currentA).toBeCloseTo(ohm, 12);
});

describe('a load of constant power behind 12 V and 0.1 Ω (upper root of the quadratic)', () => {
  const loaded = (ratedW: number) =>
    circuit([battery('g1', 12, 100), load('e1', { ratedW, model: 'power' })], pairs(['g1', 'e1']));

  test.each([
    [100, 11.09902, 9.009805],
    [300, 8.44949, 35.505103],
    [356.4, 6.6, 54], // 99 % of what collapses
  ])('of %f W has %f V and %f A', (watts, volts, amps) => {
    const { converged, heldFraction, devices } = solveMode(loaded(watts), 'all-on');
    expect({ converged, heldFraction }).toEqual({ converged: true, heldFraction: 1 });
    expect(devices['e1']!.terminals['pos']!.potentialV).toBeCloseTo(volts, 6);
    expect(devices['e1']!.currentA).toBeCloseTo(amps, 5);
  });

  test.each([
    [361, 360 / 361],
    [720, 0.5],
    [36_000, 0.01],
  ])('of %f W can not be held: 360 W is the most, a share of %f', (watts, share) => {
    const { converged, heldFraction, devices } = solveMode(loaded(watts), 'all-on');
    expect(converged).toBe(false);
    expect(heldFraction).toBeCloseTo(share, 6);
    expect(devices['e1']!.powerW).toBeCloseTo(360, 3);
  });

  test('a current that would turn the voltage round can not be held either', () => {
    const design = circuit([battery('g1', 12, 100), load('e1', { ratedA: 240 })], pairs(['g1', 'e1']));
    expect(solveMode(design, 'all-on')).toMatchObject({ converged: false });
    expect(solveMode(design, 'all-on').heldFraction).toBeCloseTo(0.5, 6); // 12 V / 0.1 Ω = 120 A
  });
});

describe('four batteries of 12.6 V and 20 mΩ in parallel by links of 1.5 mΩ, 100 A (NGSPICE)', () => {
  test.each([
    ['both leads at unit 1', 1, 1, [35.753, 26.116, 20.396, 17.736], 11.8849],
    ['positive at unit 1, negative at unit 4', 1, 4, [26.744, 23.256, 23.256, 26.744], 11.8401],
    ['both leads at unit 2', 2, 2, [26.116, 30.033, 23.455, 20.396], 11.9993],
    ['positive at unit 2, negative at unit 3', 2, 3, [23.256, 26.744, 26.744, 23.256], undefined],
  ] as const)('%s', (_, positive, negative, amps, volts) => {
    const units = [1, 2, 3, 4];
    const links = [1, 2, 3].flatMap((i) => [
      wire(`p${i}`, `g${i}.pos`, `g${i + 1}.pos`, 1.5),
      wire(`n${i}`, `g${i}.neg`, `g${i + 1}.neg`, 1.5),
    ]);
    const { devices } = solveMode(
      circuit(
        [...units.map((i) => battery(`g${i}`, 12.6, 20)), load('e1', { ratedA: 100 })],
        [...links, wire('wp', `g${positive}.pos`, 'e1.pos', 0), wire('wn', `g${negative}.neg`, 'e1.neg', 0)],
      ),
      'all-on',
    );
    units.forEach((i) => expect(Math.abs(-devices[`g${i}`]!.currentA - amps[i - 1]!)).toBeLessThan(1e-3));
    const { pos, neg } = devices['e1']!.terminals;
    if (volts !== undefined) expect(pos!.potentialV - neg!.potentialV).toBeCloseTo(volts, 4);
  });
});

function circuit(devices: readonly Device[], runs: readonly Run[]): Design {
  return {
    format: 'ampwright-design',
    version: 1,
    basis: {},
    sheets: { s1: { id: 's1' } },
    zones: {},
    devices: Object.fromEntries(devices.map((device) => [device.id, device])),
    runs: Object.fromEntries(runs.map((run) => [run.id, run])),
    modes: {},
    notes: {},
  };
}

function device(id: string, kind: string, ratings: Device['ratings']): Device {
  return { id, kind, ratings, sheetId: 's1', x: 0, y: 0 };
}

function battery(id: string, emfV: number, internalMilliohm: number): Device {
  return device(id, 'battery', { chemistry: 'flooded', nominalV: 12, capacityAh: 100, emfV, internalMilliohm });
}

function fuse(id: string, coldMilliohm: number): Device {
  return device(id, 'fuse', { ratedA: 200, coldMilliohm });
}

function bus(id: string): Device {
  return device(id, 'busbar', { ratedA: 500 });
}

function load(id: string, ratings: Device['ratings']): Device {
  return device(id, 'load', { nominalV: 12, ...ratings });
}

function resistor(id: string, ohm: number): Device {
  return load(id, { ratedA: 12 / ohm, model: 'resistance' });
}

function wire(id: string, from: string, to: string, milliohm: number): Run {
  const end = (spelled: string) => ({ device: spelled.split('.')[0]!, terminal: spelled.split('.')[1]! });
  return { id, from: end(from), to: end(to), milliohm, conductor: { size: '2/0 AWG' } };
}

/** A feed and a return without resistance between the posts of two devices. */
function pairs(...joined: readonly (readonly [string, string])[]): Run[] {
  return joined.flatMap(([one, other], i) => [
    wire(`wp${i}`, `${one}.pos`, `${other}.pos`, 0),
    wire(`wn${i}`, `${one}.neg`, `${other}.neg`, 0),
  ]);
}
