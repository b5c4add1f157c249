import { describe, expect, it } from 'vitest';

import type { Finding } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';
import { applyPatches } from '#shared/model/patch.ts';
import { analyse, findingsOf } from '#shared/rules/analyse.ts';
import { readable } from '#shared/rules/readable.ts';
import type { Rule } from '#shared/rules/rule.ts';
import { proveDesign } from '#shared/solve/proof.ts';

export interface RightCase {
  readonly name: string;
  readonly given: Design;
}

export interface WrongCase extends RightCase {
  /** The messages of this rule, all of them, in order. */
  readonly says: readonly string[];
  readonly severity?: Finding['severity'];
  /** Titles of all remedies. */
  readonly remedies?: readonly string[];
  readonly figures?: Readonly<Record<string, number | string>>;
}

/**
 * Holds a rule to its table of cases, and each remedy to its word: applied, the finding is gone and no must-fix is
 * new. A rule that says nothing any more fails every wrong case, and that is tried.
 */
export function testRule(rule: Rule, cases: { right: readonly RightCase[]; wrong: readonly WrongCase[] }): void {
  describe(rule.id, () => {
    it('has at least four right and four wrong cases', () => {
      expect(cases.right.length).toBeGreaterThanOrEqual(4);
      expect(cases.wrong.length).toBeGreaterThanOrEqual(4);
    });
    for (const { name, given } of cases.right) {
      it(`leaves in peace: ${name}`, () => expect(saidBy(rule, given).map(({ message }) => message)).toEqual([]));
    }
    for (const wrong of cases.wrong) {
      it(`says of ${wrong.name}`, () => holdToCase(rule, wrong));
    }
    it('fails each wrong case once its check says nothing', () => {
      const silent: Rule = { ...rule, check: () => [] };
      for (const wrong of cases.wrong) expect(() => holdToCase(silent, wrong), wrong.name).toThrow();
    });
  });
}

function holdToCase(rule: Rule, { given, says, severity, remedies, figures }: WrongCase): void {
  const findings = saidBy(rule, given);
  expect(findings.map(({ message }) => message)).toEqual(says);
  expect(says.length).toBeGreaterThan(0);
  for (const finding of findings) expect(finding.severity).toBe(severity ?? rule.severity);
  if (remedies) expect(findings.flatMap((finding) => finding.remedies.map(({ title }) => title))).toEqual(remedies);
  for (const [name, value] of Object.entries(figures ?? {})) {
    const figure = findings[0]!.figures[name];
    if (typeof value === 'number') expect(figure).toBeCloseTo(value, 2);
    else expect(figure).toBe(value);
  }
  proveRemedies(given, findings);
}

/** Each remedy removes its finding and adds nothing that must be fixed. */
export function proveRemedies(given: Design, findings: readonly Finding[]): void {
  const before = new Set(mustFix(given));
  for (const finding of findings) {
    for (const { title, patch } of finding.remedies) {
      const mended = applyPatches(given, patch);
      const after = analyse(mended).findings;
      expect(
        after.map(({ id }) => id),
        `${title} removes the finding`,
      ).not.toContain(finding.id);
      const added = mustFix(mended).filter((id) => !before.has(id));
      expect(added, `${title} adds no must-fix`).toEqual([]);
    }
  }
}

export function mustFix(design: Design): string[] {
  return analyse(design)
    .findings.filter(({ severity }) => severity === 'must')
    .map(({ id }) => id);
}

function saidBy(rule: Rule, design: Design): Finding[] {
  return findingsOf(proveDesign(readable(design)), [rule]);
}
