import type { z } from 'zod';

import type { Refusal } from '#shared/kinds/references.ts';

export type Path = Refusal['path'];

type Issue = z.core.$ZodIssue;

/** What a schema found wrong, in plain words, with the path of the very key. One issue can name several keys. */
export function refusalOf(issue: Issue, document: unknown): Refusal[] {
  const path = issue.path.map((key) => (typeof key === 'number' ? key : String(key)));
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({ path: [...path, key], reason: 'is not a key of the format' }));
  }
  return [{ path, reason: reasonOf(issue, valueAt(document, path)) }];
}

/** The one that stands first in the document. What is missing stands where its surroundings end. */
export function firstOf(refusals: readonly Refusal[], document: unknown): Refusal {
  const placed = refusals.map((refusal) => ({ refusal, place: placeOf(document, refusal.path) }));
  placed.sort((a, b) => comparePlaces(a.place, b.place));
  return placed[0]?.refusal ?? { path: [], reason: 'is not a design' };
}

const TYPE_WORDS: Readonly<Record<string, string>> = {
  string: 'text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
  array: 'a list',
  object: 'an object',
  record: 'an object',
};

function reasonOf(issue: Issue, value: unknown): string {
  switch (issue.code) {
    case 'invalid_type':
      if (value === undefined) return 'is missing';
      return `must be ${TYPE_WORDS[issue.expected] ?? issue.expected}`;
    case 'invalid_value':
      return value === undefined ? 'is missing' : oneOf(issue.values.map(String), issue.path);
    case 'invalid_union':
      if (value === undefined) return 'is missing';
      return issue.path.at(-1) === 'kind' ? 'is not a kind of device that is known' : 'is not as the format has it';
    case 'invalid_key':
      return issue.issues[0] === undefined ? 'is not a key that a file may have' : reasonOf(issue.issues[0], '');
    case 'too_small':
      return ownWords(issue, `must ${issue.inclusive ? 'not be less than' : 'be greater than'} ${issue.minimum}`);
    case 'too_big':
      return ownWords(issue, `must ${issue.inclusive ? 'not be greater than' : 'be less than'} ${issue.maximum}`);
    case 'not_multiple_of':
      return ownWords(issue, `must be a multiple of ${issue.divisor}`);
    case 'invalid_format':
      return ownWords(issue, 'is not written as the format has it');
    default:
      return ownWords(issue, 'is not as the format has it');
  }
}

/** The schema's own sentence where it has one; a library's default one begins with a capital. */
function ownWords(issue: Issue, otherwise: string): string {
  return /^[a-z]/.test(issue.message) ? issue.message : otherwise;
}

function oneOf(values: readonly string[], path: readonly PropertyKey[]): string {
  if (path.at(-1) === 'size') return 'must be a size from 20 AWG to 4/0 AWG or from 0.75 mm² to 150 mm²';
  if (values.length === 1) return `must be ${values[0]}`;
  return `must be one of ${values.join(', ')}`;
}

function valueAt(document: unknown, path: Path): unknown {
  let at = document;
  for (const key of path) {
    if (typeof at !== 'object' || at === null || !Object.hasOwn(at, key)) return undefined;
    at = (at as Record<string | number, unknown>)[key];
  }
  return at;
}

function placeOf(document: unknown, path: Path): number[] {
  const place: number[] = [];
  let at = document;
  for (const key of path) {
    const keys: string[] = typeof at === 'object' && at !== null ? Object.keys(at) : [];
    const index = keys.indexOf(String(key));
    place.push(index < 0 ? keys.length : index);
    if (index < 0) break;
    at = (at as Record<string | number, unknown>)[key];
  }
  return place;
}

function comparePlaces(a: readonly number[], b: readonly number[]): number {
  for (let i = 0; i < Math.min(a.length, b.length); i++) {
    if (a[i] !== b[i]) return a[i]! - b[i]!;
  }
  return a.length - b.length;
}
