import fc from 'fast-check';
import { describe, expect, test } from 'vitest';

import type { ModeAnalysis } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';
import { generateDesign, randomFrom } from '#shared/testing/generate-design.ts';
import { spellNetwork, type Spelled } from '#shared/testing/spell-network.ts';

import { solveFaults } from './solve-faults.ts';
import { solveMode } from './solve-mode.ts';

const MODES = ['all-on', 'all-charging', 'motoring'] as const;

const anyWish = fc.record({
  seed: fc.nat(),
  batteries: fc.integer({ min: 1, max: 4 }),
  busbars: fc.integer({ min: 1, max: 7 }),
  loads: fc.integer({ min: 0, max: 14 }),
  rings: fc.integer({ min: 0, max: 5 }),
  alternators: fc.integer({ min: 0, max: 3 }),
  strength: fc.constantFrom(0.1, 1, 1, 40),
});
const CASES = { seed: 4310, numRuns: 25 };
const SLOW = { timeout: 60_000 };

describe('on any system, in any mode', SLOW, () => {
  test('what flows into a device flows out of it, and what leaves a run arrives at a terminal', () => {
    fc.assert(
      fc.property(anyWish, fc.constantFrom(...MODES), (wish, mode) => {
        const design = generateDesign(wish);
        const solved = solveMode(design, mode);
        const slack = 1e-11 * greatestA(solved);
        for (const [id, { terminals }] of Object.entries(solved.devices)) {
          const sum = Object.values(terminals).reduce((all, { currentA }) => all + currentA, 0);
          if (Math.abs(sum) > slack) expect.fail(`${id} of seed ${wish.seed} keeps ${sum} A`);
        }
        for (const [end, lackingA] of lackingAtEnds(design, solved)) {
          if (Math.abs(lackingA) > slack) expect.fail(`${end} of seed ${wish.seed} lacks ${lackingA} A`);
        }
      }),
      CASES,
    );
  });

  test('all that is given is taken: the power of devices and the loss of runs come to nothing', () => {
    fc.assert(
      fc.property(anyWish, fc.constantFrom(...MODES), (wish, mode) => {
        const solved = solveMode(generateDesign(wish), mode);
        const watts = [
          ...Object.values(solved.devices).map(({ powerW }) => powerW),
          ...Object.values(solved.runs).map(({ lossW }) => lossW),
        ];
        const greatestW = Math.max(...watts.map(Math.abs), 0);
        expect(Math.abs(watts.reduce((all, each) => all + each, 0))).toBeLessThanOrEqual(1e-10 * greatestW);
      }),
      CASES,
    );
  });

  test('the order of the keys of a document changes nothing', () => {
    fc.assert(
      fc.property(anyWish, (wish) => {
        const design = generateDesign(wish);
        const turned = {
          ...design,
          devices: Object.fromEntries(Object.entries(design.devices).toReversed()),
          runs: Object.fromEntries(Object.entries(design.runs).toReversed()),
        };
        expect(solveMode(turned, 'motoring')).toEqual(solveMode(design, 'motoring'));
        expect(solveFaults(turned)).toEqual(solveFaults(design));
      }),
      { ...CASES, numRuns: 8 },
    );
  });

  test('a charging source never takes current, never gives more than its most, and is told limited when it gives that', () => {
    fc.assert(
      fc.property(anyWish, (wish) => {
        const design = generateDesign(wish);
        const solved = solveMode(design, 'motoring');
        for (const device of Object.values(design.devices).filter(({ kind }) => kind === 'alternator')) {
          const { maxA, regulatedV } = device.ratings as { maxA: number; regulatedV: number };
          const { terminals, currentA, state } = solved.devices[device.id]!;
          const volts = terminals['pos']!.potentialV - terminals['neg']!.potentialV;
          expect(currentA).toBeLessThanOrEqual(1e-6);
          expect(-currentA).toBeLessThanOrEqual(maxA * (1 + 1e-9));
          expect(volts).toBeGreaterThanOrEqual(0);
          if (state === 'limited') expect(-currentA).toBeCloseTo(maxA, 6);
          else if (currentA < -1e-6) expect(volts).toBeCloseTo(regulatedV, 6);
          if (state === 'limited') expect(volts).toBeLessThanOrEqual(regulatedV + 1e-6);
        }
      }),
      CASES,
    );
  });

  test('in all-charging every alternator gives its rated current and no load is on', () => {
    const solved = solveMode(generateDesign({ seed: 5, alternators: 2 }), 'all-charging');
    const design = generateDesign({ seed: 5, alternators: 2 });
    for (const id of ['h0', 'h1']) expect(-solved.devices[id]!.currentA).toBe(design.devices[id]!.ratings['maxA']);
    expect(solved.devices['l0']).toMatchObject({ state: 'off', currentA: 0 });
    expect(solved.devices['g0']!.currentA + solved.devices['g1']!.currentA).toBeCloseTo(
      (design.devices['h0']!.ratings['maxA'] as number) + (design.devices['h1']!.ratings['maxA'] as number),
      9,
    );
  });
});

describe('beside a dense solution by Gaussian elimination', SLOW, () => {
  const compare = (design: Design, strong: string) => {
    const ours = solveMode(design, 'all-on');
    expect(ours.converged, strong).toBe(true);
    const dense = solveDensely(spellNetwork(design));
    for (const [id, { currentA }] of Object.entries(ours.runs)) {
      expect(Math.abs(currentA - dense.currents.get(id)!), `${id}, ${strong}`).toBeLessThan(1e-9 * dense.greatestA);
    }
    for (const [id, { kind }] of Object.entries(design.devices)) {
      if (kind !== 'load' && kind !== 'fuse') continue;
      for (const [name, { potentialV }] of Object.entries(ours.devices[id]!.terminals)) {
        const theirs = dense.potentials.get(`${id}_${name}`)!;
        expect(Math.abs(potentialV - theirs), `${id}.${name}, ${strong}`).toBeLessThan(1e-9 * dense.greatestV);
      }
    }
  };

  test.each(Array.from({ length: 20 }, (_, i) => i))('system %i has the same currents and voltages to 1e-9', (i) => {
    compare(
      generateDesign({ seed: 900 + i, batteries: 1 + (i % 3), busbars: 1 + (i % 4), loads: 3 + (i % 5), rings: i % 3 }),
      `seed ${900 + i}`,
    );
  });

  test.each(Array.from({ length: 8 }, (_, i) => i))(
    'system %i is still held at 99 percent of the load at which it collapses',
    (i) => {
      const wish = { seed: 700 + i, batteries: 1 + (i % 2), busbars: 1 + (i % 3), loads: 4, rings: i % 2 };
      const asPower = (strength: number): Design => {
        const design = generateDesign({ ...wish, strength });
        const devices = Object.entries(design.devices).map(([id, device]) =>
          device.kind === 'load' ? [id, { ...device, ratings: { ...device.ratings, model: 'power' } }] : [id, device],
        );
        return { ...design, devices: Object.fromEntries(devices) };
      };
      const { converged, heldFraction } = solveMode(asPower(200), 'all-on');
      expect(converged).toBe(false);
      compare(asPower(200 * heldFraction * 0.99), `seed ${wish.seed}`);
      expect(solveMode(asPower(200 * heldFraction * 1.001), 'all-on').converged).toBe(false);
    },
  );
});

describe('whatever a document holds', SLOW, () => {
  test('solving answers with finite numbers and does not throw', () => {
    fc.assert(
      fc.property(fc.nat(), (seed) => {
        const broken = breakDesign(generateDesign({ seed, alternators: 2, strength: 3 }), randomFrom(seed));
        for (const mode of [...MODES, 'no-such-mode']) expect(findUnfinished(solveMode(broken, mode))).toBeUndefined();
        expect(findUnfinished(solveFaults(broken))).toBeUndefined();
      }),
      { seed: 4310, numRuns: 30 },
    );
  });
});

function greatestA(solved: ModeAnalysis): number {
  const devices = Object.values(solved.devices).flatMap(({ terminals }) => Object.values(terminals));
  return Math.max(...[...devices, ...Object.values(solved.runs)].map(({ currentA }) => Math.abs(currentA)), 0);
}

/** What runs and mountings bring to each place of one potential, less what its devices take there; a fuse on a stud shares its place. */
function lackingAtEnds(design: Design, { devices, runs }: ModeAnalysis): Map<string, number> {
  const place = (device: string, terminal: string): string => {
    const { mountedOn } = design.devices[device]!;
    if (mountedOn && terminal === 'a') return place(mountedOn.device, mountedOn.terminal);
    return `${device}.${terminal}`;
  };
  const lacking = new Map<string, number>();
  const add = (at: string, amps: number) => lacking.set(at, (lacking.get(at) ?? 0) + amps);
  for (const [id, { currentA }] of Object.entries(runs)) {
    const { from, to } = design.runs[id]!;
    add(place(from.device, from.terminal), -currentA);
    add(place(to.device, to.terminal), currentA);
  }
  for (const [id, { terminals }] of Object.entries(devices)) {
    for (const [name, { currentA }] of Object.entries(terminals)) add(place(id, name), -currentA);
  }
  return lacking;
}

/** All potentials and all currents as unknowns, Newton's method from 12 V, elimination with pivoting. */
function solveDensely({ branches, loads, ground }: Spelled) {
  const nodes = [...new Set([...branches, ...loads].flatMap(({ from, to }) => [from, to]))].filter((n) => n !== ground);
  const at = new Map(nodes.map((node, i) => [node, i]));
  const size = nodes.length + branches.length;
  let loadV = loads.map(() => 12.5);
  let x: number[] = [];
  for (let round = 0; round < 80; round++) {
    const matrix = Array.from({ length: size }, () => Array.from({ length: size + 1 }, () => 0));
    const put = (row: number | undefined, column: number | undefined, value: number) => {
      if (row !== undefined && column !== undefined) matrix[row]![column]! += value;
    };
    branches.forEach(({ from, to, ohm, emfV }, i) => {
      const branch = nodes.length + i;
      put(at.get(from), branch, 1);
      put(at.get(to), branch, -1);
      put(branch, at.get(from), 1);
      put(branch, at.get(to), -1);
      put(branch, branch, -ohm);
      put(branch, size, emfV);
    });
    loads.forEach(({ from, to, model, amount }, i) => {
      const slope = model === 'power' ? -amount / loadV[i]! ** 2 : 0;
      const fixed = model === 'power' ? (2 * amount) / loadV[i]! : amount;
      const [a, b] = [at.get(from), at.get(to)];
      put(a, a, slope);
      put(a, b, -slope);
      put(b, b, slope);
      put(b, a, -slope);
      put(a, size, -fixed);
      put(b, size, fixed);
    });
    x = eliminate(matrix);
    const volts = (node: string) => (node === ground ? 0 : x[at.get(node)!]!);
    const next = loads.map(({ from, to }) => volts(from) - volts(to));
    const step = Math.max(...next.map((v, i) => Math.abs(v - loadV[i]!)), 0);
    loadV = next;
    if (step < 1e-13) break;
  }
  const currents = new Map(branches.map(({ name }, i) => [name, x[nodes.length + i]!]));
  const potentials = new Map([...nodes.map((node, i) => [node, x[i]!] as const), [ground, 0] as const]);
  const greatest = (of: Map<string, number>) => Math.max(...[...of.values()].map(Math.abs));
  return { currents, potentials, greatestA: greatest(currents), greatestV: greatest(potentials) };
}

function eliminate(matrix: number[][]): number[] {
  const size = matrix.length;
  for (let column = 0; column < size; column++) {
    let best = column;
    for (let row = column; row < size; row++) {
      if (Math.abs(matrix[row]![column]!) > Math.abs(matrix[best]![column]!)) best = row;
    }
    [matrix[column], matrix[best]] = [matrix[best]!, matrix[column]!];
    const pivotRow = matrix[column]!;
    for (let row = column + 1; row < size; row++) {
      const factor = matrix[row]![column]! / pivotRow[column]!;
      if (factor === 0) continue;
      for (let k = column; k <= size; k++) matrix[row]![k]! -= factor * pivotRow[k]!;
    }
  }
  const x = Array.from({ length: size }, () => 0);
  for (let row = size - 1; row >= 0; row--) {
    let sum = matrix[row]![size]!;
    for (let k = row + 1; k < size; k++) sum -= matrix[row]![k]! * x[k]!;
    x[row] = sum / matrix[row]![row]!;
  }
  return x;
}

const ODD = [
  0,
  -1,
  -0,
  1e-300,
  1e300,
  -1e300,
  1e-12,
  Number.NaN,
  Number.POSITIVE_INFINITY,
  null,
  undefined,
  'x',
  {},
  [],
  true,
];

/** Odd ratings, lost devices, runs to themselves and to nowhere, unknown kinds, removed work. */
function breakDesign(design: Design, random: () => number): Design {
  const copy = structuredClone(design) as unknown as Record<string, Record<string, Record<string, unknown>>>;
  const pick = <T>(from: readonly T[]): T => from[Math.floor(random() * from.length)]!;
  const times = 1 + Math.floor(random() * 12);
  for (let i = 0; i < times; i++) {
    const device = copy['devices']![pick(Object.keys(copy['devices']!))]!;
    const run = copy['runs']![pick(Object.keys(copy['runs']!))]!;
    const breaks: (() => void)[] = [
      () =>
        ((device['ratings'] as Record<string, unknown>)[pick(Object.keys(device['ratings'] as object))] = pick(ODD)),
      () => (device['kind'] = pick(['toaster', '', 'battery', 'selector', 'bond', 'starter'])),
      () => (device['work'] = 'remove'),
      () => (device['mountedOn'] = pick([run['from'], run['to'], { device: device['id'], terminal: 'a' }, 7])),
      () => (run['to'] = run['from']),
      () => (run['to'] = pick([{ device: 'nobody', terminal: '1' }, { device: device['id'], terminal: '99' }, null])),
      () => (run['milliohm'] = pick(ODD)),
      () => (run['lengthM'] = pick(ODD)),
      () => (run['conductor'] = pick([{ size: 'thick' }, { size: '2 AWG', parallel: pick(ODD) }, null, 3])),
      () =>
        (copy['modes']!['motoring']!['states'] = {
          g0: null,
          h0: { on: true, fraction: pick(ODD) },
          l0: { fraction: pick(ODD) },
        }),
      () => delete copy['devices']![device['id'] as string],
      () => (copy['basis'] = { ambientC: pick(ODD), conductorC: pick(ODD), resistance: 'iec-60228' } as never),
    ];
    if (Object.keys(copy['devices']!).length > 3) pick(breaks)();
  }
  return copy as unknown as Design;
}

/** The first place that holds no finite number where there should be one. */
function findUnfinished(value: unknown, path = ''): string | undefined {
  if (typeof value === 'number') return Number.isFinite(value) ? undefined : path;
  if (value === null || value === undefined) return path;
  if (typeof value !== 'object') return undefined;
  for (const [key, inner] of Object.entries(value)) {
    const found = findUnfinished(inner, `${path}.${key}`);
    if (found !== undefined) return found;
  }
  return undefined;
}
