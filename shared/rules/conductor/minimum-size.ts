import { conductorOf } from '#shared/model/defaults.ts';
import { defineRule } from '#shared/rules/rule.ts';
import { mayChange, useSize } from '#shared/rules/mending.ts';
import { callOf } from '#shared/solve/ratings.ts';
import { isSheathed, isThinner } from '#shared/solve/sizes.ts';

/**
 * No run is thinner than the profile's smallest conductor, whatever it carries.
 *
 * Why: thin wire breaks at its ends from vibration and handling. One size less is allowed with others in a sheath.
 * Exempt: electronics under 1 A and 50 V behind their own device, pigtails, wiring inside panels and enclosures.
 * Source: ABYC E-11 11.14.1.2 and 33 CFR 183.425(e); ISO 10133:2012 7.7.
 * Says nothing about what the run carries or loses.
 */
export const minimumSize = defineRule({
  id: 'conductor/minimum-size',
  title: 'A run is thinner than the smallest conductor allowed',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'ABYC E-11 and 33 CFR 183', clause: '11.14.1.2; 183.425(e)' },
    'iso-13297': { title: 'ISO 10133:2012', clause: '7.7' },
  },
  message: '{run} is {size}; {minimum} is the smallest allowed {how}.',

  *check(proof) {
    for (const run of proof.runs) {
      const { size } = conductorOf(run.run);
      if (run.minimum === undefined || !isThinner(size, run.minimum)) continue;
      const mended = run.recommendedSize ?? run.minimum;
      yield {
        subject: { run: run.id },
        figures: {
          run: callOf(run.run),
          size,
          minimum: run.minimum,
          how: isSheathed(run.run) ? 'in a sheath with others' : 'for a conductor on its own',
        },
        remedies: mayChange(run.run) ? [useSize(proof, run, mended)] : [],
      };
    }
  },
});
