/// <reference types="vite/client" />
import { describe, expect, it } from 'vitest';

import { RULES } from './index.ts';

const FILES: Readonly<Record<string, string>> = import.meta.glob('./*/*.ts', {
  query: '?raw',
  import: 'default',
  eager: true,
});
const GROUPS = ['conductor', 'protection', 'voltage', 'topology', 'record'];
const read = (file: string) => FILES[`./${file}`] ?? '';

/** A rule is its file, its table of cases and its line in the list; its doc comment is its page. */
describe('the rules', () => {
  it('are all in the list, and each file of a group is one', () => {
    const files = Object.keys(FILES)
      .filter((file) => !file.endsWith('.test.ts'))
      .map((file) => file.replace('./', '').replace('.ts', ''));
    expect(RULES.map(({ id }) => id).toSorted()).toEqual(files.toSorted());
  });

  it('stand in the order of the groups, as findings do', () => {
    const groups = [...new Set(RULES.map(({ id }) => id.split('/')[0]))];
    expect(groups).toEqual(GROUPS);
  });

  it.each(RULES.map((rule) => [rule.id, rule] as const))(
    '%s has a page, sources, a message with figures',
    (id, rule) => {
      const text = read(`${id}.ts`);
      const page = /\/\*\*\n \* [\s\S]*?\*\/\nexport const \w+ = defineRule/.exec(text)?.[0] ?? '';
      for (const heading of ['Why: ', 'Source: ', 'Says nothing']) expect(page).toContain(`\n * ${heading}`);
      expect(rule.message).toMatch(/\{\w+\}/);
      expect(rule.message).not.toContain('!');
      for (const source of Object.values(rule.sources)) {
        expect(source.title.length).toBeGreaterThan(2);
        expect(source.clause.length).toBeGreaterThan(2);
      }
      expect(text).not.toMatch(/from '#shared\/rules\/(conductor|protection|voltage|topology|record)\//);
    },
  );

  it.each(RULES.map(({ id }) => id))('%s has a table of cases in both profiles', (id) => {
    const text = read(`${id}.test.ts`);
    expect(text).toContain('testRule(');
    expect(text).toContain('iso');
  });
});
