import { mayChange, listOf } from '#shared/rules/mending.ts';
import type { Remedy } from '#shared/model/analysis.ts';
import { defineRule } from '#shared/rules/rule.ts';
import type { Proof } from '#shared/solve/proof.ts';
import { callOf } from '#shared/solve/ratings.ts';
import type { DirectShort } from '#shared/solve/shorts.ts';

/**
 * No way of wires, fuses and switches leads from the positive of a battery to its negative without a load on it.
 *
 * Why: closing it sends all that the battery can give through the wires. A battery connected the wrong way round in
 * a bank is the same. A switch that makes the short only when it is closed is named.
 * Source: none; it is arithmetic.
 * Says nothing about systems of different voltage that are joined.
 */
export const directShort = defineRule({
  id: 'topology/direct-short',
  title: 'A battery is short-circuited',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'Ampwright', clause: 'what a drawing shows' },
    'iso-13297': { title: 'Ampwright', clause: 'what a drawing shows' },
  },
  message: 'From the positive of {source} the way {runs} leads to a negative with no load on it.',

  *check(proof) {
    for (const short of proof.shorts.all) {
      yield {
        subject: { device: short.source.id },
        message: short.closing
          ? 'With {closing} closed, the way {runs} leads from the positive of {source} to a negative with no load on it.'
          : undefined,
        figures: {
          source: callOf(short.source),
          runs: listOf(short.runs.map((id) => callOf(proof.runOf.get(id)!.run))) || 'over a single stud',
          roundV: short.voltsRound,
          ...(short.closing && { closing: callOf(short.closing) }),
        },
        remedies: takeAway(proof, short),
      };
    }
  },
});

/** Where one single run joins the two poles, it is the wrong one. */
function takeAway(proof: Proof, short: DirectShort): Remedy[] {
  const [only, ...more] = short.runs.map((id) => proof.runOf.get(id)!.run);
  if (!only || more.length > 0 || !mayChange(only)) return [];
  return [{ title: `Take ${callOf(only)} away`, patch: [{ op: 'remove', path: ['runs', only.id] }] }];
}
