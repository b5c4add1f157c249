import { defineRule } from '#shared/rules/rule.ts';
import { callOf } from '#shared/solve/ratings.ts';

/**
 * Every run has its length.
 *
 * Why: without it there is no verdict on the voltage drop of any load it serves nor on how far protection stands
 * from its source, and the run is not in the cut list.
 * Source: none; it is what the other rules need.
 * Says nothing about a length that is there but wrong.
 */
export const lengthMissing = defineRule({
  id: 'conductor/length-missing',
  title: 'The length of a run is not known',
  severity: 'should',
  sources: {
    'abyc-e11': { title: 'Ampwright', clause: 'what a proof needs' },
    'iso-13297': { title: 'Ampwright', clause: 'what a proof needs' },
  },
  message:
    '{run} has no length, so the voltage drop and the distances over it are not proved and it is not in the cut list.',

  *check(proof) {
    for (const { id, run } of proof.runs) {
      if (run.lengthM !== undefined) continue;
      yield {
        subject: { run: id },
        message:
          run.milliohm === undefined
            ? undefined
            : '{run} has no length, so the distances over it are not proved and it is not in the cut list.',
        figures: { run: callOf(run) },
      };
    }
  },
});
