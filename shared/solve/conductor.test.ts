import { describe, expect, it } from 'vitest';

import { basisOf } from '#shared/model/defaults.ts';
import type { Basis, Zone } from '#shared/model/design.ts';
import { AWG_SIZES, sizeOf, type InsulationC, type Size } from '#shared/model/size.ts';

import { ampacityWith, workingOhmPerMetre } from './conductor.ts';

const ENGINE: Zone = { id: 'engine', name: 'Engine space', engineSpace: true };

function carriedA(
  size: string,
  insulationC: number,
  more: { engine?: true; bundled?: number; basis?: Basis; zone?: Zone; volts?: number } = {},
) {
  const conductor = { size: sizeOf(size)!, insulationC: insulationC as InsulationC, parallel: 1, bundled: 1 };
  const zones = more.zone ? [more.zone] : more.engine ? [ENGINE] : [];
  return ampacityWith(conductor, zones, basisOf({ basis: more.basis }), more.bundled ?? 1, more.volts ?? 12).allowedA;
}

/** Rows of a table as it is printed: the size, then a figure a column. */
function rowsOf(printed: string): { name: string; figures: (number | undefined)[] }[] {
  return printed
    .trim()
    .split('\n')
    .map((line) => line.trim().split(/\s+/))
    .map(([name = '', ...figures]) => ({
      name,
      figures: figures.map((each) => (each === '–' ? undefined : Number(each))),
    }));
}

const CFR_COLUMNS = [60, 75, 80, 90, 105, 125, 200];

/** 33 CFR 183.425, Table 5: A at 30 °C; columns 60, 75, 80, 90, 105, 125, 200 °C. */
const CFR_TABLE_5 = `
  18 10 10 15 20 20 25 25
  16 15 15 20 25 25 30 35
  14 20 20 25 30 35 40 45
  12 25 25 35 40 45 50 55
  10 40 40 50 55 60 70 70
  8 55 65 70 70 80 90 100
  6 80 95 100 100 120 125 135
  4 105 125 130 135 160 170 180
  3 120 145 150 155 180 195 210
  2 140 170 175 180 210 225 240
  1 165 195 210 210 245 265 280
  1/0 195 230 245 245 285 305 325
  2/0 225 265 285 285 330 355 370
  3/0 260 310 330 330 385 410 430
  4/0 300 360 385 385 445 475 510
`;

/** The same in engine spaces at 50 °C: Table 5 x Note 1. */
const CFR_ENGINE_SPACE = `
  18 5.8 7.5 11.7 16.4 17 22.25 25
  16 8.7 11.25 15.6 20.5 21.25 26.7 35
  14 11.6 15 19.5 24.6 29.75 35.6 45
  12 14.5 18.75 27.3 32.8 38.25 44.5 55
  10 23.2 30 39 45.1 51 62.3 70
  8 31.9 48.75 54.6 57.4 68 80.1 100
  6 46.4 71.25 78 82 102 111.25 135
  4 60.9 93.75 101.4 110.7 136 151.3 180
  3 69.6 108.75 117 127.1 153 173.55 210
  2 81.2 127.5 136.5 147.6 178.5 200.25 240
  1 95.7 146.25 163.8 172.2 208.25 235.85 280
  1/0 113.1 172.5 191.1 200.9 242.25 271.45 325
  2/0 130.5 198.75 222.3 233.7 280.5 315.95 370
  3/0 150.8 232.5 257.4 270.6 327.25 364.9 430
  4/0 174 270 300.3 315.7 378.25 422.75 510
`;

/** ISO 13297:2020 Table A.1, from memory; columns 60, 70, 85 to 90, 105, 125, 200 °C. */
const ISO_A_1 = `
  0.75 6 10 12 16 20 25
  1 8 14 18 20 25 35
  1.5 12 18 21 25 30 40
  2.5 17 25 30 35 40 45
  4 22 35 40 45 50 55
  6 29 45 50 60 70 75
  10 40 65 70 90 100 120
  16 54 90 100 130 150 170
  25 71 120 140 170 185 200
  35 87 160 185 210 225 240
  50 105 210 230 270 300 325
  70 135 265 285 330 360 375
  95 165 310 330 390 410 430
  120 190 360 400 450 480 520
  150 220 380 430 475 520 560
`;

/** A boat-cable table to UL 1426, 105 °C: outside and inside engine spaces for 2, 3, 4 to 6, 7 to 24, 25 and more bundled. */
const BUNDLED = `
  18 20 17 14 11.9 12 10.2 10 8.5 8 6.8
  16 25 21.3 17.5 14.9 15 12.8 12.5 10.6 10 8.5
  14 35 29.8 24.5 20.8 21 17.9 17.5 14.9 14 11.9
  12 45 38.3 31.5 26.8 27 23 22.5 19.1 18 15.3
  10 60 51 42 35.7 36 30.6 30 25.5 24 20.4
  8 80 68 56 47.6 48 40.8 40 34 32 27.2
  6 120 102 84 71.4 72 61.2 60 51 48 40.8
  4 160 136 112 95.2 96 81.6 80 68 64 54.4
  3 180 153 126 107.1 108 91.8 90 76.5 72 61.2
  2 210 178.5 147 125 126 107.1 105 89.3 84 71.4
  1 245 208.3 171.5 145.8 147 125 122.5 104.1 98 83.3
  1/0 285 242.3 199.5 169.6 171 145.4 142.5 121.1 114 96.9
  2/0 330 280.5 231 196.4 198 168.3 165 140.3 132 112.2
  3/0 385 327.3 269.5 229.1 231 196.4 192.5 163.6 154 130.9
  4/0 445 378.3 311.5 264.8 267 227 222.5 189.1 178 151.3
`;

describe('ampacity', () => {
  it('is that of 33 CFR 183.425 Table 5, every row and column', () => {
    for (const { name, figures } of rowsOf(CFR_TABLE_5)) {
      figures.forEach((amperes, i) => expect(carriedA(`${name} AWG`, CFR_COLUMNS[i]!), `${name} AWG`).toBe(amperes));
    }
    expect(rowsOf(CFR_TABLE_5)).toHaveLength(15);
  });

  it('is that of Table 5 x Note 1 in an engine space, every row and column', () => {
    for (const { name, figures } of rowsOf(CFR_ENGINE_SPACE)) {
      figures.forEach((amperes, i) => {
        expect(carriedA(`${name} AWG`, CFR_COLUMNS[i]!, { engine: true }), `${name} AWG`).toBeCloseTo(amperes!, 6);
      });
    }
    expect(carriedA('4/0 AWG', 105, { engine: true })).toBeCloseTo(378.25, 6);
    expect(carriedA('16 AWG', 75, { engine: true })).toBeCloseTo(11.25, 6);
    expect(carriedA('8 AWG', 90, { engine: true })).toBeCloseTo(57.4, 6);
  });

  it('is that of ISO 13297 Table A.1, every row and column', () => {
    const columns = [60, 70, 85, 105, 125, 200];
    for (const { name, figures } of rowsOf(ISO_A_1)) {
      figures.forEach((amperes, i) => {
        const basis = { profile: 'iso-13297' } as const;
        expect(carriedA(`${name} mm²`, columns[i]!, { basis }), `${name} mm²`).toBe(amperes);
        if (columns[i] === 85) expect(carriedA(`${name} mm²`, 90, { basis })).toBe(amperes);
      });
    }
    expect(rowsOf(ISO_A_1)).toHaveLength(15);
  });

  it('is that of printed boat-cable tables for every bundle and space, to 0.1 A', () => {
    for (const { name, figures } of rowsOf(BUNDLED)) {
      [2, 3, 6, 24, 25].forEach((bundled, i) => {
        const out = carriedA(`${name} AWG`, 105, { bundled });
        const inside = carriedA(`${name} AWG`, 105, { bundled, engine: true });
        expect(Math.abs(out - figures[2 * i]!), `${name} AWG, ${bundled}`).toBeLessThan(0.1);
        expect(Math.abs(inside - figures[2 * i + 1]!), `${name} AWG, ${bundled}, engine space`).toBeLessThan(0.1);
      });
    }
  });

  it('counts bundles from four in the ISO profile: 0.7, 0.6, 0.5', () => {
    const basis = { profile: 'iso-13297' } as const;
    const shares = [3, 4, 6, 7, 24, 25].map((bundled) => carriedA('10 mm²', 105, { basis, bundled }) / 90);
    expect(shares.map((share) => Math.round(share * 100) / 100)).toEqual([1, 0.7, 0.7, 0.6, 0.6, 0.5]);
  });

  it('leaves DC bundles out where the basis says so, but not from 50 V on', () => {
    const basis = { bundling: 'ac-only' } as const;
    expect(carriedA('10 AWG', 105, { basis, bundled: 3, volts: 48 })).toBe(60);
    expect(carriedA('10 AWG', 105, { basis, bundled: 3, volts: 50 })).toBeCloseTo(42, 9);
  });

  it('follows √((Tc − Ta) / (Tc − 30)) for any other ambient, never above 1', () => {
    const at = (ambientC: number, insulationC = 75) =>
      carriedA('10 AWG', insulationC, { zone: { id: 'z', name: 'Z', ambientC } });
    expect(at(60) / 40).toBeCloseTo(Math.sqrt(15 / 45), 9); // NEC 310.15(B)(1): 0.58
    expect(at(10) / 40).toBe(1);
    expect(at(75)).toBe(0);
    expect(at(90)).toBe(0);
    // An engine space that is not at the table's 50 °C goes by the formula as well.
    expect(carriedA('10 AWG', 105, { zone: { ...ENGINE, ambientC: 60 } }) / 60).toBeCloseTo(Math.sqrt(45 / 75), 9);
  });

  it('reads the next lower column for insulation the profile lacks, and no thicker copper for a foreign size', () => {
    expect(carriedA('10 AWG', 85)).toBe(50);
    expect(carriedA('10 AWG', 70)).toBe(40);
    // 6 mm², 3.39 Ω/km tinned, holds no less copper than 10 AWG; 35 mm² holds less than 2 AWG and reads 3 AWG.
    expect(carriedA('6 mm²', 105)).toBe(60);
    expect(carriedA('35 mm²', 105)).toBe(180);
    expect(carriedA('20 AWG', 105)).toBeLessThan(20);
    expect(carriedA('20 AWG', 105)).toBeGreaterThan(0);
  });

  it('forbids insulation of 60 °C in an engine space of the ISO profile', () => {
    expect(carriedA('10 mm²', 60, { engine: true, basis: { profile: 'iso-13297' } })).toBe(0);
  });
});

/** The thinnest size by CM = K · I · L / E with K = 10.75, from a table of total feet by amperes. */
function sizeFor(amperes: number, totalFeet: number, lostV: number): Size | undefined {
  const ohm = lostV / amperes;
  // The tables have no 3 AWG, which boat cable is seldom made in.
  return AWG_SIZES.slice(1)
    .filter((size) => size !== '3 AWG')
    .find((size) => workingOhmPerMetre(size, 30, basisOf({})) * totalFeet * 0.3048 <= ohm * (1 + 1e-12));
}

const AMPERES = [5, 10, 15, 20, 25, 30, 40, 50, 60, 70, 80, 90, 100];

/** ABYC E-11 11.14.2.6 worked out for total feet out and back (first figure of a row) and the amperes above. */
const SIZE_TABLES: readonly [string, number, number, string][] = [
  [
    '3 % at 12 V',
    0.03,
    12,
    `
    10 18 14 12 12 10 10 8 8 6 6 6 4 4
    15 16 12 10 10 8 8 6 6 4 4 4 4 2
    20 14 12 10 8 8 6 6 4 4 2 2 2 2
    25 14 10 8 8 6 6 4 4 2 2 2 1 1
    30 12 10 8 6 6 4 4 2 2 2 1 1 1/0
    40 12 8 6 6 4 4 2 2 1 1 1/0 2/0 2/0
    50 10 8 6 4 4 2 2 1 1/0 1/0 2/0 3/0 3/0
    60 10 6 4 4 2 2 1 1/0 2/0 2/0 3/0 3/0 4/0
    70 8 6 4 2 2 2 1 1/0 2/0 3/0 3/0 4/0 4/0
    80 8 6 4 2 2 1 1/0 2/0 3/0 3/0 4/0 – –
    90 8 4 4 2 1 1 2/0 3/0 3/0 4/0 – – –
    100 8 4 2 2 1 1/0 2/0 3/0 4/0 4/0 – – –
    120 6 4 2 1 1/0 2/0 3/0 4/0 – – – – –
    150 6 2 1 1/0 2/0 3/0 4/0 – – – – – –
    `,
  ],
  [
    '10 % at 12 V',
    0.1,
    12,
    `
    10 18 18 18 16 16 14 14 12 12 12 10 10 10
    15 18 18 16 14 14 14 12 10 10 10 8 8 8
    20 18 16 14 14 12 12 10 10 8 8 8 8 6
    25 18 16 14 12 12 10 10 8 8 8 6 6 6
    30 18 14 14 12 10 10 8 8 8 6 6 6 4
    40 16 14 12 10 10 8 8 6 6 6 4 4 4
    50 16 12 10 10 8 8 6 6 4 4 4 4 2
    60 14 12 10 8 8 8 6 4 4 4 2 2 2
    70 14 12 10 8 8 6 6 4 4 2 2 2 2
    80 14 10 8 8 6 6 4 4 2 2 2 2 1
    90 14 10 8 8 6 6 4 4 2 2 2 1 1
    100 12 10 8 6 6 4 4 2 2 2 1 1 1/0
    120 12 8 8 6 4 4 2 2 2 1 1/0 1/0 2/0
    150 10 8 6 4 4 4 2 1 1 1/0 2/0 2/0 3/0
    `,
  ],
  [
    '3 % at 24 V',
    0.03,
    24,
    `
    10 18 18 16 14 14 12 12 10 10 8 8 8 8
    15 18 16 14 12 12 10 10 8 8 8 6 6 6
    20 18 14 12 12 10 10 8 8 6 6 6 4 4
    25 16 14 12 10 10 8 8 6 6 6 4 4 4
    30 16 12 10 10 8 8 6 6 4 4 4 4 2
    40 14 12 10 8 8 6 6 4 4 2 2 2 2
    50 14 10 8 8 6 6 4 4 2 2 2 1 1
    60 12 10 8 6 6 4 4 2 2 2 1 1 1/0
    70 12 8 8 6 6 4 2 2 2 1 1 1/0 1/0
    80 12 8 6 6 4 4 2 2 1 1 1/0 2/0 2/0
    90 10 8 6 4 4 4 2 1 1 1/0 2/0 2/0 3/0
    100 10 8 6 4 4 2 2 1 1/0 1/0 2/0 3/0 3/0
    120 10 6 4 4 2 2 1 1/0 2/0 2/0 3/0 3/0 4/0
    150 8 6 4 2 2 1 1/0 2/0 3/0 3/0 4/0 4/0 –
    `,
  ],
  [
    '10 % at 24 V',
    0.1,
    24,
    `
    10 18 18 18 18 18 18 16 16 14 14 14 14 12
    15 18 18 18 18 16 16 14 14 14 12 12 12 10
    20 18 18 18 16 16 14 14 12 12 12 10 10 10
    25 18 18 16 16 14 14 12 12 10 10 10 10 8
    30 18 18 16 14 14 14 12 10 10 10 8 8 8
    40 18 16 14 14 12 12 10 10 8 8 8 8 6
    50 18 16 14 12 12 10 10 8 8 8 6 6 6
    60 18 14 14 12 10 10 8 8 8 6 6 6 4
    70 18 14 12 12 10 10 8 8 6 6 6 4 4
    80 16 14 12 10 10 8 8 6 6 6 4 4 4
    90 16 14 12 10 10 8 8 6 6 4 4 4 4
    100 16 12 10 10 8 8 6 6 4 4 4 4 2
    120 14 12 10 8 8 8 6 4 4 4 2 2 2
    150 14 10 10 8 6 6 4 4 4 2 2 2 1
    `,
  ],
];

describe('voltage drop', () => {
  it.each(SIZE_TABLES)('gives the sizes of the table for %s, every cell', (_, fraction, nominalV, printed) => {
    const rows = printed
      .trim()
      .split('\n')
      .map((line) => line.trim().split(/\s+/));
    expect(rows).toHaveLength(14);
    for (const [feet = '', ...sizes] of rows) {
      sizes.forEach((size, i) => {
        const found = sizeFor(AMPERES[i]!, Number(feet), fraction * nominalV)?.replace(' AWG', '');
        expect(found ?? '–', `${feet} ft, ${AMPERES[i]} A`).toBe(size);
      });
    }
  });

  it('asks for 6,271 circular mils for 10 A over 21 ft at 0.36 V, and 12 AWG', () => {
    expect((10.75 * 10 * 21) / 0.36).toBeCloseTo(6270.8, 1);
    expect(sizeFor(10, 21, 0.36)).toBe('12 AWG');
    expect(sizeFor(10, 21, 1.2)).toBe('16 AWG');
    expect(sizeFor(45, 40, 1.2)).toBe('8 AWG');
    expect(sizeFor(100, 10, 0.72)).toBe('8 AWG');
  });

  it('warms IEC copper: 2.5 mm² has 9.178 Ω/km at 50 °C', () => {
    const iso = basisOf({ basis: { profile: 'iso-13297' } });
    expect(workingOhmPerMetre('2.5 mm²', 30, iso) * 1000).toBeCloseTo(9.178, 3);
    expect(workingOhmPerMetre('2.5 mm²', 60, iso)).toBeGreaterThan(workingOhmPerMetre('2.5 mm²', 30, iso));
  });

  it('counts a hot zone with warm copper, never with less than the circular-mil form', () => {
    for (const size of AWG_SIZES) {
      expect(workingOhmPerMetre(size, 50, basisOf({}))).toBeGreaterThan(workingOhmPerMetre(size, 30, basisOf({})));
    }
  });
});
