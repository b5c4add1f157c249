import { describe, expect, test } from 'vitest';

import type { Device } from '#shared/model/design.ts';

import { KINDS } from './index.ts';
import { boxOf, terminalAt, terminalsOf, unturnedSize, UNIT } from './place.ts';

function aDevice(kind: string, extra: Partial<Device> = {}): Device {
  const offer = KINDS.find((known) => known.kind === kind)!.offers[0];
  return { id: 'd', kind, ratings: offer.ratings, sheetId: 's', x: 160, y: 240, ...extra };
}

const places = KINDS.flatMap((kind) =>
  kind.offers.flatMap((offer) =>
    ([0, 90, 180, 270] as const).map((rotation) => ({
      title: `${offer.title} turned ${rotation}`,
      device: aDevice(kind.kind, { ratings: offer.ratings, symbol: offer.symbol, rotation }),
    })),
  ),
);

describe('where terminals stand', () => {
  test.each(places)('$title: on the grid and within its box', ({ device }) => {
    const box = boxOf(device);
    const terminals = terminalsOf(device);
    expect(terminals.length).toBeGreaterThan(0);
    for (const { x, y, sides } of terminals) {
      expect([x % UNIT, y % UNIT]).toEqual([0, 0]);
      expect(x >= box.x && x <= box.x + box.width && y >= box.y && y <= box.y + box.height).toBe(true);
      expect(sides.length).toBeGreaterThan(0);
    }
  });

  test.each(places)('$title: no two on one spot, but for the ways of a splice', ({ device }) => {
    const spots = terminalsOf(device).map(({ x, y }) => `${x},${y}`);
    expect(new Set(spots).size).toBe(spots.length);
  });

  // Worked by hand: a fuse is 48 by 16, its terminals at (0, 8) and (48, 8), its centre at (24, 8).
  test.each([
    [0, { x: 160, y: 248 }, { x: 208, y: 248 }],
    [90, { x: 184, y: 224 }, { x: 184, y: 272 }],
    [180, { x: 208, y: 248 }, { x: 160, y: 248 }],
    [270, { x: 184, y: 272 }, { x: 184, y: 224 }],
  ] as const)('a fuse turned %d about its centre', (rotation, a, b) => {
    const fuse = aDevice('fuse', { rotation });
    expect(terminalAt(fuse, 'a')).toMatchObject(a);
    expect(terminalAt(fuse, 'b')).toMatchObject(b);
  });

  test('a run leaves a fuse that was turned by its new sides', () => {
    expect(terminalAt(aDevice('fuse'), 'a')!.sides).toEqual(['left']);
    expect(terminalAt(aDevice('fuse', { rotation: 90 }), 'a')!.sides).toEqual(['top']);
    expect(terminalAt(aDevice('fuse', { rotation: 270 }), 'a')!.sides).toEqual(['bottom']);
  });

  test('the studs of a busbar stand as far apart as its pitch says', () => {
    const busbar = aDevice('busbar', { pitch: 48, ratings: { ratedA: 150, studs: 3 } });
    expect(terminalsOf(busbar).map(({ x, y }) => [x, y])).toEqual([
      [168, 248],
      [216, 248],
      [264, 248],
    ]);
    expect(unturnedSize(busbar)).toEqual({ width: 112, height: 16 });
  });

  test('a kind that is not known, or ratings that make no sense, leave a drawing standing', () => {
    expect(terminalsOf({ ...aDevice('fuse'), kind: 'flux' })).toEqual([]);
    expect(boxOf({ ...aDevice('fuse'), kind: 'flux' })).toEqual({ x: 160, y: 240, width: 32, height: 32 });
    expect(terminalsOf(aDevice('busbar', { ratings: { ratedA: 'many', studs: 4000 } }))).toHaveLength(10);
  });
});
