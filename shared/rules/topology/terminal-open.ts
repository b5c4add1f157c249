import { defineRule } from '#shared/rules/rule.ts';
import { openTerminals } from '#shared/solve/openings.ts';
import { callOf } from '#shared/solve/ratings.ts';

/**
 * Every terminal a device needs has a run on it, or sits on a stud.
 *
 * Why: a drawing with an open terminal is not finished, and what is behind it is not proved.
 * Source: none; it is what a drawing shows.
 * Says nothing about terminals that may stay open, such as the spare studs of a busbar or a sense lead.
 */
export const terminalOpen = defineRule({
  id: 'topology/terminal-open',
  title: 'A terminal is open',
  severity: 'should',
  sources: {
    'abyc-e11': { title: 'Ampwright', clause: 'what a drawing shows' },
    'iso-13297': { title: 'Ampwright', clause: 'what a drawing shows' },
  },
  message: 'Nothing is connected to terminal {terminal} of {device}.',

  *check(proof) {
    for (const { device, terminal } of openTerminals(proof)) {
      yield { subject: { device: device.id, terminal }, figures: { device: callOf(device), terminal } };
    }
  },
});
