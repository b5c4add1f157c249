import type { Remedy } from '#shared/model/analysis.ts';
import { defineRule } from '#shared/rules/rule.ts';
import { mayChange, useSize } from '#shared/rules/mending.ts';
import { ampacityWith } from '#shared/solve/conductor.ts';
import { smallestByAmpacity } from '#shared/solve/sizes.ts';
import { conductorOf } from '#shared/model/defaults.ts';
import type { Proof, ProvedRun } from '#shared/solve/proof.ts';
import { callOf } from '#shared/solve/ratings.ts';

/**
 * A run carries no more than its ampacity: the published value for its size and insulation, less what heat and
 * neighbours take, times the conductors in parallel.
 *
 * Why: a conductor loaded beyond its ampacity passes the temperature of its insulation, which softens and fails.
 * The current held against it is the worst of the modes, with the demand of the loads it serves.
 * Source: 33 CFR 183.425 Table 5 and ABYC E-11; ISO 13297 Table A.1 (from memory).
 * Says nothing about cranking current, from which the path of a starter is exempt, about signal runs, nor about what a
 * short circuit drives: `topology/direct-short` does.
 */
export const ampacity = defineRule({
  id: 'conductor/ampacity',
  title: 'A run carries more than its ampacity',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'ABYC E-11 and 33 CFR 183', clause: '183.425, Table 5' },
    'iso-13297': { title: 'ISO 13297:2020', clause: 'Table A.1 (from memory)' },
  },
  message: '{run} has to carry {designCurrentA}; {size} carries {allowedA} there.',

  *check(proof) {
    for (const run of proof.runs) {
      if (run.isSignal) continue;
      const { allowedA, baseA } = run.ampacity;
      const figures = {
        run: callOf(run.run),
        size: conductorOf(run.run).size,
        designCurrentA: run.designCurrentA,
        allowedA,
        baseA,
        insulationC: conductorOf(run.run).insulationC,
        ambientC: run.sizing.warmestC,
      };
      const mode = run.governingMode ?? undefined;
      if (allowedA <= 0) {
        const message = '{run} passes a place of {ambientC}, where insulation for {insulationC} may not be used.';
        yield { subject: { run: run.id }, mode, figures, message, remedies: betterInsulation(run) };
        continue;
      }
      if (run.designCurrentA <= allowedA * (1 + 1e-9) || proof.shorts.isShorted(run.edge.a)) continue;
      yield { subject: { run: run.id }, mode, figures, remedies: thickerConductor(proof, run) };
    }
  },
});

function thickerConductor(proof: Proof, run: ProvedRun): Remedy[] {
  const size = run.recommendedSize ?? smallestByAmpacity(run.sizing);
  return size !== null && mayChange(run.run) ? [useSize(proof, run, size)] : [];
}

/** The insulation of the usual boat cable, where it may be used and carries enough at the run's own size. */
function betterInsulation(run: ProvedRun): Remedy[] {
  const { basis, zones, bundled, nominalV } = run.sizing;
  const conductor = { ...conductorOf(run.run), insulationC: basis.cable.insulationC };
  const { allowedA } = ampacityWith(conductor, zones, basis, bundled, nominalV);
  if (!mayChange(run.run) || allowedA <= 0 || allowedA < run.designCurrentA) return [];
  return [
    {
      title: `Use ${basis.cable.insulationC} °C insulation for ${callOf(run.run)}`,
      patch: [{ op: 'set', path: ['runs', run.id, 'conductor', 'insulationC'], value: basis.cable.insulationC }],
    },
  ];
}
