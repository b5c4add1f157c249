import type { Device, Run } from '#shared/model/design.ts';
import type { FullBasis } from '#shared/model/defaults.ts';

import type { Circuits } from './circuits.ts';
import type { LoadDrop } from './drop.ts';
import type { NetworkEdge } from './network.ts';
import type { PathStep } from './paths.ts';

/** What is lost between a source and a panel with all that its branches ask for, there and back. */
export interface FeederDrop {
  /** The busbar or block that the branches leave. */
  readonly panel: Device;
  readonly nominalV: number;
  readonly volts: number;
  readonly limit: number;
  readonly path: readonly Run[];
  readonly voltsOf: readonly number[];
  readonly isKnown: boolean;
  /** Panels on the way: what already is wrong at one of them is said there. */
  readonly ahead: readonly Device[];
}

interface Panel {
  readonly node: number;
  readonly gates: Set<number>;
  readonly feed: readonly PathStep[];
  /** From the source outwards, as far as all its loads share the way. */
  back: readonly PathStep[];
}

/**
 * A panel is a busbar or block from which the ways of loads leave by two or more protective devices. Its feeder
 * reaches from the source to it, and from where the returns of its loads have met back to the source.
 */
export function feederDrops(
  drops: readonly LoadDrop[],
  circuits: Circuits,
  basis: FullBasis,
  demandOn: (edge: NetworkEdge) => number,
): FeederDrop[] {
  const panels = panelsOn(drops, circuits);
  return [...panels.values()].flatMap((panel): FeederDrop[] => {
    const device = joinAt(circuits, panel.node);
    const nominalV = circuits.nominalVOf(panel.node);
    if (panel.gates.size < 2 || !device || !(nominalV > 0)) return [];
    const runs = [...panel.feed, ...panel.back].flatMap(({ edge }) => (edge.type === 'run' ? [edge] : []));
    if (runs.length === 0) return [];
    const voltsOf = runs.map((edge) => demandOn(edge) * edge.ohm);
    const ahead = panel.feed.flatMap(({ from }) => {
      const before = panels.get(from);
      return before && before.gates.size >= 2 ? (joinAt(circuits, from) ?? []) : [];
    });
    return [
      {
        panel: device,
        nominalV,
        volts: voltsOf.reduce((sum, each) => sum + each, 0),
        limit: basis.dropLimits.critical,
        path: runs.map(({ run }) => run),
        voltsOf,
        isKnown: runs.every(({ run }) => run.milliohm !== undefined || run.lengthM !== undefined),
        ahead,
      },
    ];
  });
}

function panelsOn(drops: readonly LoadDrop[], circuits: Circuits): ReadonlyMap<number, Panel> {
  const panels = new Map<number, Panel>();
  for (const { feed, back } of drops) {
    // The last join on the way, so long as nothing but conductors has come since.
    let join = -1;
    feed.forEach(({ edge, from }, at) => {
      if (joinAt(circuits, from)) join = at;
      if (edge.type !== 'contact') return;
      if (edge.element.protective && join !== -1) {
        const { from: node } = feed[join]!;
        const panel = panels.get(node);
        if (!panel) panels.set(node, { node, gates: new Set([edge.index]), feed: feed.slice(0, join), back });
        else {
          panel.gates.add(edge.index);
          panel.back = sharedStart(panel.back, back);
        }
      }
      join = -1;
    });
  }
  return panels;
}

function sharedStart(one: readonly PathStep[], other: readonly PathStep[]): readonly PathStep[] {
  const apart = one.findIndex((step, i) => step.edge.index !== other[i]?.edge.index);
  return apart === -1 ? one : one.slice(0, apart);
}

function joinAt({ network }: Circuits, node: number): Device | undefined {
  return network.nodes[node]!.join;
}
