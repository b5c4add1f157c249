import { Ajv2020 } from 'ajv/dist/2020.js';
import { describe, expect, test } from 'vitest';

import { aSmallDesign, edited } from '#shared/testing/small-design.ts';

import { designJsonSchema } from './json-schema.ts';

describe('the published JSON Schema, held against a validator that is not ours', () => {
  const isValid = new Ajv2020({ strict: false, validateFormats: false }).compile(designJsonSchema());

  test('accepts a design', () => {
    expect(isValid(aSmallDesign())).toBe(true);
  });

  test.each([
    ['runs.w1.lengthM', -1],
    ['runs.w1.lenghtM', 1],
    ['runs.w1.conductor.size', '5 AWG'],
    ['runs.w1.colour', 'puce'],
    ['devices.g1.kind', 'flux'],
    ['devices.g1.ratings.chemistry', undefined],
    ['devices.f1.ratings.ccaA', 1],
    ['devices.g1.rotation', 45],
    ['basis.profile', 'none'],
    ['version', 2],
    ['sheets.s1.paper', 'A0'],
    ['zones', undefined],
  ])('refuses %s as %j', (path, value) => {
    expect(isValid(edited(path, value))).toBe(false);
  });
});
