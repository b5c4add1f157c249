import { describe, expect, it } from 'vitest';

import type { Design } from '#shared/model/design.ts';
import { CanvasBench } from '#src/canvas/testing/canvas-bench.ts';

const design: Design = {
  format: 'ampwright-design',
  version: 1,
  basis: {},
  sheets: { s1: { id: 's1', paper: 'A3' }, s2: { id: 's2', number: 2 } },
  zones: {},
  devices: {
    g1: {
      id: 'g1',
      kind: 'battery',
      mark: 'G1',
      ratings: { chemistry: 'agm', nominalV: 12, capacityAh: 100 },
      sheetId: 's1',
      x: 160,
      y: 240,
    },
    f1: { id: 'f1', kind: 'fuse', mark: 'F1', ratings: { ratedA: 50 }, sheetId: 's1', x: 240, y: 160 },
    e1: { id: 'e1', kind: 'load', mark: 'E1', ratings: { nominalV: 12, ratedA: 5 }, sheetId: 's1', x: 480, y: 240 },
  },
  runs: {
    w1: {
      id: 'w1',
      mark: 'W1',
      from: { device: 'g1', terminal: 'neg' },
      to: { device: 'e1', terminal: 'neg' },
      conductor: { size: '10 AWG' },
    },
  },
  modes: {},
  notes: {},
};
const bench = (role?: 'designer' | 'reviewer') => new CanvasBench(design, role);

describe('drawing a run', () => {
  it('ends where the drag meets another terminal, with the next number, and is selected', () => {
    const b = bench().drawRun('G1.pos', 'F1.a');
    expect(b.run('W2')).toMatchObject({ from: { device: 'g1', terminal: 'pos' }, to: { device: 'f1', terminal: 'a' } });
    expect(b.selected).toEqual(['W2']);
    expect(b.tool.is).toBe('idle');
  });

  it('catches a terminal within 12 units and no farther', () => {
    const near = bench()
      .move('G1.pos')
      .down()
      .move({ x: 240 - 8, y: 168 - 8 })
      .up();
    expect(near.run('W2')).toBeDefined();
    const far = bench()
      .move('G1.pos')
      .down()
      .move({ x: 240 - 12, y: 168 - 12 })
      .up();
    expect(far.run('W2')).toBeUndefined();
    expect(far.tool.is).toBe('drawing-run');
  });

  it('sets a bend with each click on the grid, takes one back with Backspace, and keeps the rest', () => {
    const b = bench().move('F1.b').down().move({ x: 401, y: 169 }).up();
    b.click({ x: 400, y: 80 }).key('Backspace').click('E1.pos');
    expect(b.run('W2').bends).toEqual([{ x: 400, y: 168 }]);
  });

  it('takes the length that is typed on the way', () => {
    const b = bench().move('G1.pos').down().move({ x: 200, y: 200 });
    b.key('6', ' ', 'f', 't', ' ', '4', ' ', 'i', 'n').move('F1.a').up();
    expect(b.run('W2').lengthM).toBe(1.9304);
  });

  it('draws nothing after Escape, and nothing from a terminal to itself', () => {
    const escaped = bench().move('G1.pos').down().move({ x: 200, y: 200 }).key('Escape').up();
    expect([Object.keys(escaped.design.runs), escaped.tool.is]).toEqual([['w1'], 'idle']);
    const back = bench().move('G1.pos').down().move({ x: 200, y: 200 }).move('G1.pos').up();
    expect(Object.keys(back.design.runs)).toEqual(['w1']);
  });
});

describe('selecting', () => {
  it('takes a device by a click, another with Shift, and lets go on bare paper', () => {
    const b = bench().click('F1');
    expect(b.selected).toEqual(['F1']);
    expect(b.click('E1', true).selected).toEqual(['E1', 'F1']);
    expect(b.click('F1', true).selected).toEqual(['E1']);
    expect(b.click({ x: 700, y: 100 }).selected).toEqual([]);
  });

  it('takes a run by a click on its line', () => {
    const b = bench();
    expect(b.click(b.onRun('W1')).selected).toEqual(['W1']);
  });

  it('takes with a marquee what lies wholly inside', () => {
    expect(bench().drag({ x: 130, y: 130 }, { x: 320, y: 320 }).selected).toEqual(['F1', 'G1']);
    expect(bench().drag({ x: 130, y: 130 }, { x: 260, y: 320 }).selected).toEqual(['G1']);
  });
});

describe('moving', () => {
  it('moves a device on the grid, as one change, heard on release', () => {
    const b = bench().move('F1').down().move({ x: 297, y: 184 });
    expect([b.labels, b.device('F1').x]).toEqual([[], 240]);
    b.up();
    expect(b.labels).toEqual(['Move F1']);
    expect([b.device('F1').x, b.device('F1').y]).toEqual([272, 176]);
  });

  it('is no move when the hand only shakes', () => {
    const b = bench().move('F1').down().move({ x: 266, y: 169 }).up();
    expect([b.labels, b.selected]).toEqual([[], ['F1']]);
  });

  it('pulls a bend out of a run and keeps it where it was dropped; a double click frees it', () => {
    const b = bench();
    b.drag(b.onRun('W1'), { x: 401, y: 451 });
    expect(b.run('W1').bends).toEqual([{ x: 400, y: 448 }]);
    b.drag({ x: 400, y: 448 }, { x: 400, y: 400 });
    expect(b.run('W1').bends).toEqual([{ x: 400, y: 400 }]);
    b.double({ x: 400, y: 400 });
    expect(b.run('W1').bends).toBeUndefined();
  });
});

describe('placing from the locker', () => {
  it('puts the symbol with its middle under the click, selects it and empties the hand', () => {
    const b = bench();
    b.canvas.getState().arm({ what: 'device', partId: 'load-lamp' });
    b.click({ x: 640, y: 200 });
    expect(b.device('E2')).toMatchObject({ kind: 'load', symbol: 'lamp', sheetId: 's1', x: 624, y: 176 });
    expect([b.selected, b.tool.is]).toEqual([['E2'], 'idle']);
  });

  it('keeps it in hand with Shift, and lets go with Escape', () => {
    const b = bench();
    b.canvas.getState().arm({ what: 'device', partId: 'load-lamp' });
    b.click({ x: 640, y: 200 }, true).click({ x: 640, y: 320 }, true).key('Escape');
    expect(Object.keys(b.design.devices)).toHaveLength(5);
    expect(b.tool.is).toBe('idle');
  });

  it('places a fuse panel whole', () => {
    const b = bench();
    b.canvas.getState().arm({ what: 'fuse-panel', ways: 6 });
    b.click({ x: 500, y: 120 });
    expect(Object.values(b.design.devices).filter((device) => device.mountedOn !== undefined)).toHaveLength(6);
    expect(b.labels).toHaveLength(1);
  });
});

describe('someone who may only look', () => {
  it('selects and changes nothing', () => {
    const b = bench('reviewer').drag('F1', { x: 400, y: 400 });
    expect([b.labels, b.selected]).toEqual([[], ['F1']]);
    b.drawRun('G1.pos', 'F1.a');
    expect(b.labels).toEqual([]);
  });
});
