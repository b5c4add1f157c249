import { describe, expect, it } from 'vitest';

import type { Design, Device, Run, Sheet } from '#shared/model/design.ts';

import { placeOf } from './device-place.ts';
import { layoutSheet } from './layout-sheet.ts';
import { squareOf } from './paper.ts';
import { routeRuns } from './route-runs.ts';
import { overlaps } from './space.ts';

describe('a sheet that is laid out', () => {
  it('leaves every run square, from terminal to terminal', () => {
    const design = aPanel();
    for (const { points, runId } of Object.values(layoutSheet(design, 's1').runs)) {
      const run = design.runs[runId]!;
      const ends = [run.from, run.to].map((end) => placeOf(design.devices[end.device]!).byName.get(end.terminal)!);
      expect([points[0], points.at(-1)]).toEqual(ends.map(({ x, y }) => ({ x, y })));
      points.slice(1).forEach((point, i) => {
        expect(point.x === points[i]!.x || point.y === points[i]!.y).toBe(true);
      });
    }
  });

  it('sends no run through a device', () => {
    const design = aPanel();
    const layout = layoutSheet(design, 's1');
    for (const { points, runId } of Object.values(layout.runs)) {
      const run = design.runs[runId]!;
      for (const device of Object.values(design.devices)) {
        if (device.id === run.from.device || device.id === run.to.device) continue;
        const { box } = placeOf(device);
        const inside = { x: box.x + 1, y: box.y + 1, width: box.width - 2, height: box.height - 2 };
        points.slice(1).forEach((point, i) => {
          expect(overlaps(spanOf(points[i]!, point), inside), `${runId} through ${device.id}`).toBe(false);
        });
      }
    }
  });

  it('goes round a device that stands in the straight way', () => {
    const design = aDesign({
      a: fuse('a', 80, 200),
      b: fuse('b', 400, 200),
      wall: fuse('wall', 232, 200),
    });
    const withRun = { ...design, runs: { w1: aRun('w1', 'a.b', 'b.a') } };
    const { points } = layoutSheet(withRun, 's1').runs.w1!;
    expect(points.length).toBeGreaterThan(2);
  });

  it('keeps the corner that a person put', () => {
    const design = aDesign({ a: fuse('a', 80, 200), b: fuse('b', 400, 200) });
    const withRun = { ...design, runs: { w1: { ...aRun('w1', 'a.b', 'b.a'), bends: [{ x: 240, y: 120 }] } } };
    const { points } = layoutSheet(withRun, 's1').runs.w1!;
    const isOnRun = points
      .slice(1)
      .some((point, i) => overlaps(spanOf(points[i]!, point), { x: 239, y: 119, width: 2, height: 2 }));
    expect(isOnRun).toBe(true);
  });

  it('hops once where two runs cross, and the later mark hops', () => {
    const design = aDesign({
      a: fuse('a', 80, 200),
      b: fuse('b', 400, 200),
      c: { ...fuse('c', 216, 64), rotation: 90 },
      d: { ...fuse('d', 216, 320), rotation: 90 },
    });
    const crossed = { ...design, runs: { w1: aRun('w1', 'a.b', 'b.a'), w2: aRun('w2', 'c.b', 'd.a') } };
    const { runs } = layoutSheet(crossed, 's1');
    expect(runs.w1!.hops).toEqual([]);
    expect(runs.w2!.hops).toEqual([{ x: 240, y: 208 }]);
  });

  it('puts no label or tag on a device, a run, or another label', () => {
    const design = aPanel();
    const layout = layoutSheet(design, 's1');
    const texts = [
      ...Object.values(layout.runs).flatMap(({ label }) => label?.box ?? []),
      ...Object.values(layout.tags).map(({ box }) => box),
    ];
    expect(texts).toHaveLength(Object.keys(design.runs).length + Object.keys(design.devices).length);
    texts.forEach((text, i) => {
      for (const other of texts.slice(i + 1)) expect(overlaps(text, other)).toBe(false);
      for (const device of Object.values(design.devices)) expect(overlaps(text, placeOf(device).box)).toBe(false);
      for (const { points } of Object.values(layout.runs)) {
        points.slice(1).forEach((point, j) => expect(overlaps(text, spanOf(points[j]!, point))).toBe(false));
      }
    });
  });

  it('draws a run to another sheet as a stub that names sheet and square', () => {
    const design = aDesign({ a: fuse('a', 240, 200), b: { ...fuse('b', 100, 60), sheetId: 's2' } });
    const withRun = { ...design, runs: { w1: aRun('w1', 'a.b', 'b.a') } };
    const here = layoutSheet(withRun, 's1').runs.w1!;
    const there = layoutSheet(withRun, 's2').runs.w1!;
    expect(here.stubs.map(({ text, points }) => [text, points])).toEqual([['2.A2', 'right']]);
    expect(there.stubs).toHaveLength(1);
    expect(there.stubs[0]!.text).toMatch(/^1\.[A-D][1-6]$/);
  });

  it('is the same picture whatever the order of keys', () => {
    const design = aPanel();
    const turned = {
      ...design,
      devices: Object.fromEntries(Object.entries(design.devices).reverse()),
      runs: Object.fromEntries(Object.entries(design.runs).reverse()),
    };
    expect(layoutSheet(turned, 's1')).toEqual(layoutSheet(design, 's1'));
  });

  it('keeps what did not move as the same object', () => {
    const design = aPanel();
    const before = layoutSheet(design, 's1');
    expect(layoutSheet(design, 's1', before)).toBe(before);
    const renamed = { ...design, devices: { ...design.devices, f2: { ...design.devices.f2!, name: 'Radio' } } };
    const after = layoutSheet(renamed, 's1', before);
    expect(after.tags.f2).not.toBe(before.tags.f2);
    expect(after.runs.w1).toBe(before.runs.w1);
  });

  it('routes only the runs of what is dragged, and leaves the others as they are', () => {
    const design = aPanel();
    const before = layoutSheet(design, 's1');
    const dragged = {
      ...design,
      devices: { ...design.devices, l2: { ...design.devices.l2!, x: design.devices.l2!.x + 16 } },
    };
    const after = routeRuns(dragged, 's1', ['w6'], before);
    expect(after.runs.w6!.points.at(-1)).toEqual({
      x: placeOf(dragged.devices.l2!).byName.get('pos')!.x,
      y: placeOf(dragged.devices.l2!).byName.get('pos')!.y,
    });
    expect(after.runs.w1).toBe(before.runs.w1);
  });

  it('never fails at a document that makes no sense', () => {
    const design = aDesign({
      a: fuse('a', 1e300, -1e300),
      b: { ...fuse('b', 3.7, 9.1), kind: 'unheard-of' },
      c: fuse('c', 101.5, 77.25),
      d: fuse('d', 300.5, 77.25),
    });
    const odd = {
      ...design,
      runs: {
        w1: aRun('w1', 'a.b', 'b.a'),
        w2: aRun('w2', 'c.b', 'd.a'),
        w3: aRun('w3', 'c.b', 'c.b'),
        w4: aRun('w4', 'a.b', 'c.a'),
      },
    };
    const { w2 } = layoutSheet(odd, 's1').runs;
    expect(w2!.points[0]).toEqual({ x: 149.5, y: 85.25 });
    expect(w2!.points.at(-1)).toEqual({ x: 300.5, y: 85.25 });
  });
});

describe('reference squares', () => {
  // ISO 5457: 50 mm squares counted from the centring marks; an A3 sheet has 8 by 6, an A4 sheet 6 by 4
  it.each([
    [{ paper: 'A3' }, { x: 60, y: 40 }, 'A1'],
    [{ paper: 'A3' }, { x: 930, y: 650 }, 'F8'],
    [{ paper: 'A4' }, { x: 650, y: 450 }, 'D6'],
    [{ paper: 'A4', orientation: 'portrait' }, { x: 450, y: 650 }, 'F4'],
  ] as const)('of %j at %j', (paper, point, square) => {
    expect(squareOf({ id: 's', ...paper } as Sheet, point)).toBe(square);
  });
});

function aPanel(): Design {
  const devices: Record<string, Device> = {
    x1: {
      id: 'x1',
      kind: 'busbar',
      mark: 'X1',
      name: 'Positive',
      sheetId: 's1',
      x: 96,
      y: 72,
      pitch: 96,
      ratings: { ratedA: 100, studs: 4, role: 'dc+' },
    },
    x2: {
      id: 'x2',
      kind: 'busbar',
      mark: 'X2',
      name: 'Negative',
      sheetId: 's1',
      x: 96,
      y: 344,
      pitch: 96,
      ratings: { ratedA: 100, studs: 4, role: 'dc-' },
    },
  };
  const runs: Record<string, Run> = {};
  for (let i = 1; i <= 4; i++) {
    const x = 104 + 96 * (i - 1);
    devices[`f${i}`] = { ...fuse(`f${i}`, x - 24, 152), rotation: 90 };
    devices[`l${i}`] = {
      id: `l${i}`,
      kind: 'load',
      symbol: 'lamp',
      mark: `E${i}`,
      sheetId: 's1',
      x: x - 16,
      y: 240,
      ratings: { nominalV: 12, ratedA: 2 },
    };
    runs[`w${i}`] = aRun(`w${i}`, `x1.${i}`, `f${i}.a`);
    runs[`w${4 + i}`] = aRun(`w${4 + i}`, `f${i}.b`, `l${i}.pos`);
    runs[`w${8 + i}`] = aRun(`w${8 + i}`, `l${i}.neg`, `x2.${i}`);
  }
  return { ...aDesign(devices), runs };
}

function aDesign(devices: Record<string, Device>): Design {
  return {
    format: 'ampwright-design',
    version: 1,
    basis: {},
    sheets: { s1: { id: 's1', number: 1 }, s2: { id: 's2', number: 2 } },
    zones: {},
    devices,
    runs: {},
    modes: {},
    notes: {},
  };
}

function fuse(id: string, x: number, y: number): Device {
  return { id, kind: 'fuse', mark: id.toUpperCase(), sheetId: 's1', x, y, ratings: { ratedA: 10 } };
}

function aRun(id: string, from: string, to: string): Run {
  const end = (text: string) => ({ device: text.split('.')[0]!, terminal: text.split('.')[1]! });
  return { id, mark: id.toUpperCase(), from: end(from), to: end(to), conductor: { size: '14 AWG' } };
}

function spanOf(a: { x: number; y: number }, b: { x: number; y: number }) {
  return { x: Math.min(a.x, b.x), y: Math.min(a.y, b.y), width: Math.abs(a.x - b.x), height: Math.abs(a.y - b.y) };
}
