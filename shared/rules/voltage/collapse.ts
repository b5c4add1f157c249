import { defineRule } from '#shared/rules/rule.ts';

/**
 * The sources can hold the load: in every mode the network has an operating point.
 *
 * Why: a constant-power load takes more current the lower its voltage; where batteries and wires cannot give it, the
 * voltage falls until something trips. The figures are those of the greatest share of the load that can be held.
 * Source: none; it is arithmetic.
 * Says nothing where a short circuit is the reason: `topology/direct-short` does.
 */
export const collapse = defineRule({
  id: 'voltage/collapse',
  title: 'The network cannot hold its load',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'Ampwright', clause: 'the network solved' },
    'iso-13297': { title: 'Ampwright', clause: 'the network solved' },
  },
  message:
    'In the mode {mode} the sources and their wires hold no more than {heldFraction} of the load; the voltage collapses.',

  *check(proof) {
    if (proof.shorts.all.length > 0) return;
    const failing = [...proof.modes]
      .filter(([, solved]) => !solved.converged)
      .toSorted(([, a], [, b]) => a.heldFraction - b.heldFraction);
    const worst = failing[0];
    if (!worst) return;
    const [mode, { heldFraction }] = worst;
    const name = proof.design.modes?.[mode]?.name ?? mode.replace('-', ' ');
    yield { subject: {}, mode, figures: { mode: name, heldFraction } };
  },
});
