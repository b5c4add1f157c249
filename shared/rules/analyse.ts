import type {
  Analysis,
  EnergyAnalysis,
  Finding,
  ModeAnalysis,
  PartsLine,
  RunAnalysis,
} from '#shared/model/analysis.ts';
import type { Design, EntityId } from '#shared/model/design.ts';
import { ownModes, proveDesign, type Proof, type ProvedRun } from '#shared/solve/proof.ts';

import { readable } from './readable.ts';
import { compareNaturally, compareText } from './marks.ts';
import { withoutHarm } from './harmless.ts';
import { applyRule, type Rule } from './rule.ts';
import { RULES } from './index.ts';

/** Whoever lists the parts; the lists stand above the engine, so they are handed in. */
export interface Catalogue {
  partsOf?(design: Design): readonly PartsLine[];
}

/**
 * The whole answer for a design: the modes solved, every run proved, what protective devices must break, energy,
 * parts and findings. It never throws and never answers NaN, whatever it is given.
 */
export function analyse(given: Design, catalogue: Catalogue = {}): Analysis {
  const design = readable(given);
  const proof = proveDesign(design);
  return {
    modes: Object.fromEntries(proof.modes),
    runs: Object.fromEntries(proof.runs.map((run) => [run.id, analysisOfRun(run)])),
    faults: proof.faults,
    energy: energyOf(proof),
    parts: catalogue.partsOf?.(design) ?? [],
    findings: withoutHarm(findingsOf(proof), proof, (mended) => findingsOf(mended)),
  };
}

const SEVERITIES = ['must', 'should', 'note'] as const;

/** In the order of severity, rule, mark and id, whatever the order of keys in the document. */
export function findingsOf(proof: Proof, rules: readonly Rule[] = RULES): Finding[] {
  const rank = new Map(RULES.map((rule, index) => [rule.id, index]));
  const { accepted } = proof.design;
  return rules
    .flatMap((rule) => applyRule(rule, proof))
    .map((finding) =>
      accepted && Object.hasOwn(accepted, finding.id) ? { ...finding, accepted: true as const } : finding,
    )
    .toSorted(
      (a, b) =>
        SEVERITIES.indexOf(a.severity) - SEVERITIES.indexOf(b.severity) ||
        rank.get(a.rule)! - rank.get(b.rule)! ||
        compareNaturally(markOf(proof.design, a), markOf(proof.design, b)) ||
        compareText(a.id, b.id),
    );
}

function markOf(design: Design, { subject }: Finding): string {
  const { device, run } = subject;
  return (device !== undefined ? design.devices[device]?.mark : run !== undefined ? design.runs[run]?.mark : '') ?? '';
}

function analysisOfRun(run: ProvedRun): RunAnalysis {
  const drop = run.worstDrop;
  return {
    designCurrentA: run.designCurrentA,
    governingMode: run.governingMode,
    ampacity: run.ampacity,
    drop: drop
      ? {
          volts: drop.volts,
          totalV: drop.totalV,
          fraction: drop.fraction,
          limit: drop.limit,
          dropClass: drop.dropClass,
          worstLoad: drop.load.device.id,
          path: drop.path.map(({ id }) => id),
        }
      : null,
    protection: run.protection.map(({ device, ratedA, allowedRatingA, stub, fromEnd }) => ({
      ...(device && { device: device.id }),
      ...(ratedA !== undefined && { ratedA }),
      ...(allowedRatingA !== undefined && { allowedRatingA }),
      ...(stub?.isLengthKnown && { stubM: stub.lengthM }),
      fromEnd,
    })),
    smallestSize: run.smallestSize,
    recommendedSize: run.recommendedSize,
  };
}

/** What the modes use and make in their hours. The day over time is a work of its own and not told yet. */
function energyOf(proof: Proof): EnergyAnalysis {
  const perMode = Object.fromEntries(
    ownModes(proof.design).map((mode): [EntityId, EnergyAnalysis['perMode'][string]] => {
      const hours = proof.design.modes[mode]?.hoursPerDay ?? 0;
      const { usedW, madeW } = powersOf(proof, proof.modes.get(mode)!);
      return [mode, { hours, usedWh: usedW * hours, madeWh: madeW * hours }];
    }),
  );
  const sums = Object.values(perMode);
  return {
    perMode,
    dailyWh: {
      used: sums.reduce((sum, each) => sum + each.usedWh, 0),
      made: sums.reduce((sum, each) => sum + each.madeWh, 0),
    },
    soc: [],
    autonomyDays: null,
  };
}

function powersOf(proof: Proof, solved: ModeAnalysis): { usedW: number; madeW: number } {
  let [usedW, madeW] = [0, 0];
  for (const edge of proof.circuits.network.edges) {
    if (edge.type === 'load') usedW += solved.devices[edge.device.id]?.powerW ?? 0;
    if (edge.type === 'source' && edge.element.type === 'charging')
      madeW -= solved.devices[edge.device.id]?.powerW ?? 0;
  }
  return { usedW, madeW };
}
