import { defineRule } from '#shared/rules/rule.ts';
import { openTerminals } from '#shared/solve/openings.ts';
import type { Proof } from '#shared/solve/proof.ts';
import { callOf } from '#shared/solve/ratings.ts';
import type { LoadDemand } from '#shared/solve/demand.ts';
import { compareMarks } from '#shared/rules/marks.ts';

/**
 * Every load can be reached from a source and back, with the switches and selectors in one position or another.
 *
 * Why: a load that cannot is drawn but would never run, and nothing about it is proved. Loads that one missing
 * connection leaves dead are one finding, on the first of them.
 * Source: none; it is what a drawing shows.
 * Says nothing where an open terminal is the reason: `topology/terminal-open` does.
 */
export const deviceUnsupplied = defineRule({
  id: 'topology/device-unsupplied',
  title: 'A device has no supply',
  severity: 'should',
  sources: {
    'abyc-e11': { title: 'Ampwright', clause: 'what a drawing shows' },
    'iso-13297': { title: 'Ampwright', clause: 'what a drawing shows' },
  },
  message: '{device} is connected, but no source reaches it and leads back.',

  *check(proof) {
    const open = new Set(openTerminals(proof).map(({ device }) => device.id));
    const byCause = new Map<string, LoadDemand[]>();
    for (const load of proof.loads) {
      const isAcrossShort = [load.edge.a, load.edge.b].some((node) => proof.shorts.isShorted(node));
      if (isSupplied(proof, load) || open.has(load.device.id) || isAcrossShort) continue;
      const cause = causeOf(proof, load);
      byCause.set(cause, [...(byCause.get(cause) ?? []), load]);
    }
    for (const loads of byCause.values()) {
      const [first, ...more] = loads.map(({ device }) => device).toSorted(compareMarks);
      if (deadNetHasOpening(proof, loads[0]!, open)) continue;
      yield {
        subject: { device: first!.id },
        message:
          more.length > 0
            ? '{device} and {moreCount} more are connected, but no source reaches them and leads back.'
            : undefined,
        figures: { device: callOf(first!), moreCount: more.length },
      };
    }
  },
});

function isSupplied({ circuits }: Proof, { edge }: LoadDemand): boolean {
  const [pos, neg] = [circuits.netOf(edge.a), circuits.netOf(edge.b)];
  return pos !== neg && pos.side !== 'dead' && neg.side !== 'dead' && circuits.islandOf(pos) === circuits.islandOf(neg);
}

/** The dead net at either end; a load across one net, or between two islands, is a cause of its own. */
function causeOf({ circuits }: Proof, { edge, device }: LoadDemand): string {
  const dead = [circuits.netOf(edge.a), circuits.netOf(edge.b)].find((net) => net.side === 'dead');
  return dead && circuits.netOf(edge.a) !== circuits.netOf(edge.b) ? `net ${dead.index}` : device.id;
}

/** A fuse or switch with an open end on the dead net, or one on every source about: that is the reason, and is said there. */
function deadNetHasOpening({ circuits }: Proof, { edge }: LoadDemand, open: ReadonlySet<string>): boolean {
  const nets = [circuits.netOf(edge.a), circuits.netOf(edge.b)];
  const dead = new Set(nets.filter((net) => net.side === 'dead'));
  const sources = nets.flatMap(({ positives, negatives }) => [...positives, ...negatives]);
  if (dead.size === 1 && sources.length > 0 && sources.every(({ device }) => open.has(device.id))) return true;
  return circuits.network.edges.some(
    (each) => each.type === 'contact' && dead.has(circuits.netOf(each.a)) && open.has(each.device.id),
  );
}
