import type { Finding, Remedy } from '#shared/model/analysis.ts';
import { applyPatches } from '#shared/model/patch.ts';
import { proveDesign, type Proof } from '#shared/solve/proof.ts';

/** Runs worked out again for remedies, in all: what keeps a large design with many findings quick. */
const MOST_RUNS_AGAIN = 4000;

/**
 * The findings without the remedies that would add a must-fix. Where batteries stand side by side a thicker run
 * draws current to itself, and another may no longer carry its part; so such a remedy is tried before it is offered.
 */
export function withoutHarm(findings: Finding[], proof: Proof, findingsOf: (proof: Proof) => Finding[]): Finding[] {
  if (!mayShift(proof)) return findings;
  const must = new Set(mustFix(findings));
  let left = Math.floor(MOST_RUNS_AGAIN / Math.max(1, proof.runs.length));
  const isHarmless = ({ patch }: Remedy): boolean => {
    if (!patch.some(({ path }) => path.at(-1) === 'size') || left-- <= 0) return true;
    const mended = proveDesign(applyPatches(proof.design, patch));
    return mustFix(findingsOf(mended)).every((id) => must.has(id));
  };
  return findings.map((finding) => {
    const remedies = finding.remedies.filter(isHarmless);
    return remedies.length === finding.remedies.length ? finding : { ...finding, remedies };
  });
}

function mayShift({ circuits }: Proof): boolean {
  return circuits.nets.some(
    ({ positives }) => positives.filter(({ element }) => element.type === 'battery').length > 1,
  );
}

function mustFix(findings: readonly Finding[]): string[] {
  return findings.filter(({ severity }) => severity === 'must').map(({ id }) => id);
}
