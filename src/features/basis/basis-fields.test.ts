import { describe, expect, it } from 'vitest';

import { setField } from '#shared/edits/set-field.ts';
import { basisOf } from '#shared/model/defaults.ts';
import { applyPatches } from '#shared/model/patch.ts';
import { aSmallDesign } from '#shared/testing/small-design.ts';

import { BASIS_GROUPS, readChoiceOf } from './basis-fields.ts';

const FIELDS = BASIS_GROUPS.flatMap((group) => group.fields);
const field = (path: string) => FIELDS.find((one) => one.path.join('.') === path)!;
const read = (path: string, text: string) => field(path).read!(text, 'us');

describe('a field of the basis', () => {
  it('reads what people type for a temperature, a share and a length', () => {
    expect(read('engineSpaceC', '122 F')).toEqual({ ok: true, value: 50 });
    expect(read('dropLimits.critical', '3 %')).toEqual({ ok: true, value: 0.03 });
    expect(read('cable.endAllowanceM', '6 in')).toEqual({ ok: true, value: 0.1524 });
    expect(read('currency', ' eur ')).toEqual({ ok: true, value: 'EUR' });
    expect(read('peakSunHours', '4.5 h')).toEqual({ ok: true, value: 4.5 });
  });

  it('says what it accepts where a text means nothing, or more than all of the voltage', () => {
    for (const [path, text] of [
      ['engineSpaceC', 'warm'],
      ['dropLimits.general', '140 %'],
      ['cable.endAllowanceM', 'a hand'],
      ['currency', 'pounds'],
      ['autonomyDays', '-1'],
    ] as const) {
      expect([path, read(path, text).ok]).toEqual([path, false]);
    }
  });

  it('keeps each of its choices in the drawing', () => {
    const chosen = FIELDS.flatMap((one) => (one.choices ?? []).map(({ value }) => [one, value] as const));
    expect(chosen.length).toBeGreaterThan(20);
    for (const [one, value] of chosen) {
      const design = aSmallDesign();
      const edit = setField(design, ['basis', ...one.path], readChoiceOf(one, value), 'Basis');
      expect([one.caption, value, edit.refused]).toEqual([one.caption, value, undefined]);
      expect([one.caption, String(one.of(basisOf(applyPatches(design, edit.patches))))]).toEqual([one.caption, value]);
    }
  });

  it('reads back what it prints, in feet and in metres', () => {
    const basis = basisOf(aSmallDesign());
    for (const one of FIELDS.filter(({ print, of }) => print !== undefined && of(basis) !== undefined)) {
      for (const units of ['us', 'metric'] as const) {
        const value = one.of(basis);
        const back = one.read!(one.print!(value, units), units);
        expect([one.caption, back.ok]).toEqual([one.caption, true]);
        if (back.ok && typeof value === 'number') expect(back.value).toBeCloseTo(value, 3);
      }
    }
  });
});
