import { describe, expect, test } from 'vitest';

import type { Design, Run } from '#shared/model/design.ts';
import { applyPatches, type Patch } from '#shared/model/patch.ts';
import { aSmallDesign } from '#shared/testing/small-design.ts';

import { partsCsv, wireScheduleCsv } from '#shared/files/lists-csv.ts';
import { partsList } from './parts-list.ts';
import { wireSchedule } from './wire-schedule.ts';

function boatWith(...patches: Patch[]): Design {
  return applyPatches(aSmallDesign(), patches);
}

const set = (path: string, value: unknown): Patch => ({ op: 'set', path: path.split('.'), value });

function line(design: Design, part: string, rating?: string) {
  return partsList(design).find((found) => found.part === part && (rating === undefined || found.rating === rating));
}

describe('cable', () => {
  // W1 0.1 m and W2 3 m: (0.1 × 1.1 + 0.3) + (3 × 1.1 + 0.3) = 0.41 + 3.60 = 4.01 m, so 5 m. W1 is the battery's, red;
  // W2 runs from a fuse to a bilge pump, brown: 3.60 m, so 4 m, and W1 alone 0.41 m, so 1 m. W3 is 3.60 m of yellow.
  test('is bought by size, insulation and colour, with slack and ends, rounded up once a line', () => {
    const boat = boatWith();
    expect(line(boat, 'Boat cable, red', '14 AWG, 105 °C')).toMatchObject({ quantity: 1, unit: 'm', runs: ['w1'] });
    expect(line(boat, 'Boat cable, brown', '14 AWG, 105 °C')).toMatchObject({ quantity: 4, runs: ['w2'] });
    expect(line(boat, 'Boat cable, yellow', '14 AWG, 105 °C')).toMatchObject({ quantity: 4, runs: ['w3'] });
  });

  test('of one colour is summed before it is rounded', () => {
    const boat = boatWith(set('runs.w2.colour', 'red'));
    expect(line(boat, 'Boat cable, red')).toMatchObject({ quantity: 5, runs: ['w1', 'w2'] });
  });

  test('in parallel is bought as often as it is laid', () => {
    // 2 × 3.60 = 7.20 m, so 8 m.
    expect(line(boatWith(set('runs.w3.conductor.parallel', 2)), 'Boat cable, yellow')!.quantity).toBe(8);
  });

  test('that comes out at a whole metre is not rounded up by the arithmetic', () => {
    // 7 × 1.1 + 0.3 = 8.000000000000002 in binary.
    expect(line(boatWith(set('runs.w3.lengthM', 7)), 'Boat cable, yellow')!.quantity).toBe(8);
  });

  test('takes slack and ends of the basis', () => {
    const boat = boatWith(set('basis.cable', { slackFraction: 0, endAllowanceM: 0 }), set('runs.w3.lengthM', 3));
    expect(line(boat, 'Boat cable, yellow')!.quantity).toBe(3);
  });

  test('without a length, existing, removed or a link is not bought', () => {
    const { lengthM: _none, ...unknown } = aSmallDesign().runs.w3 as Run;
    expect(line(boatWith(set('runs.w3', unknown)), 'Boat cable, yellow')).toBeUndefined();
    for (const work of ['existing', 'remove']) {
      expect(line(boatWith(set('runs.w3.work', work)), 'Boat cable, yellow')).toBeUndefined();
    }
    expect(line(boatWith(set('runs.w3.link', true)), 'Boat cable, yellow')).toBeUndefined();
  });

  test('in one jacket is bought as the cable, as long as its longest core', () => {
    const boat = boatWith(
      set('cables', { c: { id: 'c', type: '14/2', jacket: 'white' } }),
      set('runs.w2.cable', 'c'),
      set('runs.w3.cable', 'c'),
      set('runs.w3.lengthM', 5),
    );
    // 5 × 1.1 + 0.3 = 5.8 m, so 6 m.
    expect(line(boat, 'Cable in a jacket')).toMatchObject({ rating: '14/2, white', quantity: 6, runs: ['w2', 'w3'] });
    expect(line(boat, 'Boat cable, yellow')).toBeUndefined();
  });
});

describe('devices and lugs', () => {
  test('of the same part and rating are one line that says where each goes', () => {
    const twin = { ...aSmallDesign().devices.f1, id: 'f2', mark: 'F2' };
    expect(line(boatWith(set('devices.f2', twin)), 'Fuse with holder, terminal')).toMatchObject({
      rating: '10 A, 58 V, breaks 10,000 A',
      quantity: 2,
      devices: ['f1', 'f2'],
      group: 'Protect',
    });
    expect(partsList(boatWith(set('devices.f1.work', 'existing'))).map((found) => found.group)).not.toContain(
      'Protect',
    );
  });

  test('every end of a new run has its lug, by size and stud', () => {
    // Battery posts: pos is told M8; neg takes the usual 5/16 in. Fuse a and b 5/16 in. Pump leads #8.
    const lugs = partsList(boatWith()).filter((found) => found.group === 'Lugs');
    expect(lugs.map(({ rating, quantity }) => [rating, quantity])).toEqual(
      expect.arrayContaining([
        ['14 AWG, stud M8', 1],
        ['14 AWG, stud 5/16 in', 3],
        ['14 AWG, stud #8', 2],
      ]),
    );
    expect(lugs.reduce((sum, { quantity }) => sum + quantity, 0)).toBe(6);
  });

  test('the list is the same whatever the order of the document', () => {
    const boat = boatWith();
    const backwards = { ...boat, runs: Object.fromEntries(Object.entries(boat.runs).reverse()) };
    expect(partsList(backwards)).toEqual(partsList(boat));
  });
});

describe('the wire schedule', () => {
  test('has every run by mark, W2 before W10, with its ends as they are marked', () => {
    const boat = boatWith(set('runs.w1.mark', 'W10'));
    const rows = wireSchedule(boat, null);
    expect(rows.map((row) => row.mark)).toEqual(['W2', 'W3', 'W10']);
    expect(rows[2]).toMatchObject({
      from: 'G1 pos',
      to: 'F1 a',
      lengthM: 0.1,
      size: '14 AWG',
      colour: 'red',
      fromStud: 'M8',
    });
  });

  test('opens in a spreadsheet with lengths as numbers in the unit of the basis', () => {
    const [head, , , row] = wireScheduleCsv(boatWith(), null).split('\r\n');
    expect(head).toContain('Length (ft)');
    // 3 m is 9.8425 ft.
    expect(row).toContain('W3,M1 neg,G1 neg,9.84,14 AWG,1,105,yellow,');
  });
});

test('the parts list opens in a spreadsheet, cable in feet, and a mark that looks like a formula is harmless', () => {
  const boat = boatWith(set('runs.w3.mark', '=W3'));
  const csv = partsCsv(boat, partsList(boat));
  // 4 m is 13.12 ft, so 14 ft.
  expect(csv).toContain('Cable,"Boat cable, yellow","14 AWG, 105 °C",14,ft,,\'=W3\r\n');
});
