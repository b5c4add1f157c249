import { expect, it } from 'vitest';

import { KINDS } from '#shared/kinds/index.ts';

import { ratingFieldsOf } from './rating-fields.ts';

it('reads every number it prints back as the same number, for every rating of every kind', () => {
  for (const kind of KINDS) {
    for (const { key, entry } of ratingFieldsOf(kind.ratings)) {
      if (entry.is !== 'number') continue;
      for (const value of [0.5, 12, 120]) {
        expect(entry.read(entry.print(value)), `${kind.kind}.${key} ${entry.print(value)}`).toBeCloseTo(value, 6);
      }
    }
  }
});

it('asks for what a fuse must have and leaves open what it may have', () => {
  const fuse = KINDS.find((kind) => kind.kind === 'fuse')!;
  const required = ratingFieldsOf(fuse.ratings).filter((field) => field.isRequired);
  expect(required.map((field) => field.caption)).toEqual(['Rated current']);
});

it('offers the chemistries of a battery as a choice', () => {
  const battery = KINDS.find((kind) => kind.kind === 'battery')!;
  const field = ratingFieldsOf(battery.ratings).find(({ key }) => key === 'chemistry')!;
  expect(field.entry).toEqual({ is: 'choice', choices: ['flooded', 'agm', 'gel', 'lifepo4'] });
});
