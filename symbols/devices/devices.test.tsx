import { createElement } from 'react';
import { renderToStaticMarkup } from 'react-dom/server';
import { describe, expect, it } from 'vitest';

import { KINDS } from '#shared/kinds/index.ts';
import type { Kind } from '#shared/kinds/kind.ts';
import { boxOf, terminalsOf, UNIT } from '#shared/kinds/place.ts';
import type { Device } from '#shared/model/design.ts';
import { monoInk, paperInk, screenInk } from '#symbols/ink.ts';
import { DeviceSymbol } from '#symbols/sheet/device-symbol.tsx';

import { DRAWINGS, artOf } from './index.ts';

const TURNS = [0, 90, 180, 270] as const;

/** Every drawing of every kind, and of each one every number of poles, ways and roles that changes it. */
const drawn: Device[] = KINDS.flatMap((entry) => {
  const kind = entry as unknown as Kind;
  return kind.symbols.flatMap((symbol) =>
    ratingsOf(kind.kind).map((extra): Device => ({
      id: 'd1',
      kind: kind.kind,
      symbol,
      sheetId: 's1',
      x: 80,
      y: 160,
      ratings: { ...kind.offers[0].ratings, ...extra },
    })),
  );
});

function ratingsOf(kind: string): Record<string, unknown>[] {
  if (kind === 'breaker' || kind === 'switch') return [{ poles: 1 }, { poles: 2 }, { poles: 3 }];
  if (kind === 'busbar') return [{ studs: 1 }, { studs: 8 }];
  if (kind === 'terminal') return [{ ways: 1 }, { ways: 3 }, { ways: 4 }];
  if (kind === 'bond') {
    const roles = ['common', 'engine', 'plate', 'hull', 'anode', 'lightning'];
    return roles.flatMap((role) => [
      { role, ways: 1 },
      { role, ways: 4 },
    ]);
  }
  return [{}];
}

describe('device drawings', () => {
  it('every kind of device has a drawing of its own', () => {
    expect(DRAWINGS.map(({ kind }) => kind).sort()).toEqual(KINDS.map(({ kind }) => kind).sort());
  });

  it('two drawings of one kind never look the same', () => {
    for (const kind of KINDS as unknown as Kind[]) {
      const looks = kind.symbols.map((symbol) =>
        JSON.stringify(
          artOf({ id: 'd', kind: kind.kind, symbol, sheetId: 's', x: 0, y: 0, ratings: kind.offers[0].ratings }),
        ),
      );
      expect(new Set(looks).size, kind.kind).toBe(looks.length);
    }
  });

  it.each(
    drawn.map((device) => [`${device.kind} ${device.symbol} ${JSON.stringify(device.ratings)}`, device] as const),
  )('a run meets every terminal of %s however it is turned', (_name, device) => {
    for (const rotation of TURNS) {
      const turned = { ...device, rotation };
      const box = boxOf(turned);
      const markup = renderToStaticMarkup(createElement(DeviceSymbol, { device: turned, ink: paperInk }));
      if (artOf(turned).terminals === 'none') continue;
      for (const terminal of terminalsOf(turned)) {
        const r = artOf(turned).terminals === 'studs' ? 2.5 : 2.25;
        expect(markup).toContain(`M${terminal.x - box.x - r} ${terminal.y - box.y}a${r} ${r} `);
        expect(Number.isInteger(terminal.x / UNIT) && Number.isInteger(terminal.y / UNIT)).toBe(true);
      }
      expect((box.width / UNIT) % 2).toBe(0);
      expect((box.height / UNIT) % 2).toBe(0);
    }
  });

  it('a splice has a lead to each of its ways instead of circles', () => {
    const splice: Device = {
      id: 'x',
      kind: 'terminal',
      symbol: 'splice',
      sheetId: 's',
      x: 0,
      y: 0,
      ratings: { ratedA: 30, ways: 4 },
    };
    for (const { x, y } of terminalsOf(splice)) {
      const axis = y === 8 ? `H${x}` : `V${y}`;
      const start = `M${x} ${y}`;
      const { strokes } = artOf(splice);
      expect(strokes.includes(axis) || strokes.includes(start), `${x},${y} in ${strokes}`).toBe(true);
    }
  });

  it('print can set everything that is drawn', () => {
    for (const device of drawn) {
      for (const ink of [paperInk, monoInk, screenInk]) {
        const markup = renderToStaticMarkup(createElement(DeviceSymbol, { device, ink }));
        expect(markup).not.toMatch(/dominant-baseline|paint-order|letter-spacing|<use|<defs|class="[^"]*sheet/);
        for (const text of markup.match(/<text[^>]*>/g) ?? []) expect(text).toContain('font-family');
        if (ink !== screenInk) expect(markup).not.toContain('var(');
      }
    }
  });

  it('letters stay upright in a symbol that is turned', () => {
    const motor: Device = {
      id: 'm',
      kind: 'load',
      symbol: 'motor',
      sheetId: 's',
      x: 0,
      y: 0,
      ratings: { nominalV: 12 },
      rotation: 90,
    };
    const markup = renderToStaticMarkup(createElement(DeviceSymbol, { device: motor, ink: paperInk }));
    const turnedPart = /<g transform="[^"]*rotate\(90\)[^"]*"[^>]*>(.*?)<\/g>/.exec(markup)?.[1];
    expect(turnedPart).toContain('<path');
    expect(turnedPart).not.toContain('<text');
    expect(markup).toContain('>M</text>');
  });
});
