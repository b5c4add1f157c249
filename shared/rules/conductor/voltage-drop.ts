import type { Remedy } from '#shared/model/analysis.ts';
import { conductorOf, workOf } from '#shared/model/defaults.ts';
import { seriesOf, type Size } from '#shared/model/size.ts';
import { defineRule, type Spoken } from '#shared/rules/rule.ts';
import { listOf, mayChange, sizePatches } from '#shared/rules/mending.ts';
import { workingOhmPerMetre } from '#shared/solve/conductor.ts';
import type { LoadDrop } from '#shared/solve/drop.ts';
import type { FeederDrop } from '#shared/solve/feeders.ts';
import type { Proof, ProvedRun } from '#shared/solve/proof.ts';
import { callOf } from '#shared/solve/ratings.ts';

/**
 * A load loses no more of its voltage on the way there and back than its class allows: 3 % where it is critical,
 * 10 % elsewhere, unless the basis is stricter.
 *
 * Why: navigation lights dim, pumps slow and radios drop out long before a wire is warm. The conductors alone are
 * held against the limit; with fuses and contacts the same figure is a thing that should be mended. Other loads'
 * momentary currents are left out, and told in a note. A starter's path may lose 10 %. The feeder of a panel, a
 * busbar from which two or more protected branches lead, is held on its own to the limit of critical loads.
 * Source: ABYC E-11 11.14.2.6; ISO 10133:2012 4.8 note and, from memory, ISO 13297.
 * Says nothing where the length of a run on the path is not known: `conductor/length-missing` does.
 */
export const voltageDrop = defineRule({
  id: 'conductor/voltage-drop',
  title: 'A load loses too much voltage on the way',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'ABYC E-11', clause: '11.14.2.6' },
    'iso-13297': { title: 'ISO 10133:2012 and ISO 13297:2020', clause: '4.8, note (10 % from memory)' },
  },
  message:
    '{load} loses {lostV} of its {nominalV} on the way there and back, {fraction}; {limit} is the limit. {worstRun} has the greatest part, {worstRunV}.',

  *check(proof) {
    yield* ofFeeders(proof);
    for (const drop of proof.drops) {
      if (!drop.isKnown || !(drop.load.nominalV > 0) || drop.path.length === 0) continue;
      const limitV = drop.limit * drop.load.nominalV;
      const verdict = verdictOn(drop, limitV);
      if (!verdict) continue;
      const worst = drop.voltsOf.indexOf(Math.max(...drop.voltsOf));
      const figures = {
        load: callOf(drop.load.device),
        nominalV: drop.load.nominalV,
        lostV: verdict.lostV,
        fraction: verdict.lostV / drop.load.nominalV,
        limit: drop.limit,
        conductorsV: drop.volts,
        totalV: drop.totalV,
        dropClass: drop.dropClass,
        worstRun: callOf(drop.path[worst]!),
        worstRunV: drop.voltsOf[worst]!,
        resistance:
          proof.basis.resistance === 'circular-mil' ? 'K = 10.75' : `IEC 60228 at ${proof.basis.conductorC} °C`,
      };
      yield {
        subject: { device: drop.load.device.id },
        mode: drop.mode,
        severity: verdict.severity,
        message: verdict.message,
        figures,
        remedies: remediesFor(proof, drop, limitV, verdict),
      };
    }
  },
});

/** The feeder of a panel on its own; a panel behind one that already is wrong has the same cause. */
function* ofFeeders(proof: Proof): Iterable<Spoken> {
  const isWrong = ({ isKnown, volts, limit, nominalV }: FeederDrop) => isKnown && volts > limit * nominalV * (1 + 1e-9);
  const wrong = new Set(proof.feeders.filter(isWrong).map(({ panel }) => panel));
  for (const feeder of proof.feeders) {
    const { panel, nominalV, volts, limit, path, voltsOf, ahead } = feeder;
    if (!isWrong(feeder) || ahead.some((device) => wrong.has(device))) continue;
    const worst = voltsOf.indexOf(Math.max(...voltsOf));
    yield {
      subject: { device: panel.id },
      mode: 'all-on',
      message:
        'The feeder of {panel} loses {lostV} of {nominalV} there and back with all that its branches ask for, {fraction}; {limit} is the limit. {worstRun} has the greatest part, {worstRunV}.',
      figures: {
        panel: callOf(panel),
        nominalV,
        lostV: volts,
        fraction: volts / nominalV,
        limit,
        worstRun: callOf(path[worst]!),
        worstRunV: voltsOf[worst]!,
      },
      remedies: thickerPath(proof, { volts, path, voltsOf, nominalV }, limit * nominalV, 0),
    };
  }
}

interface Verdict {
  readonly severity: 'must' | 'should' | 'note';
  readonly lostV: number;
  readonly message?: string;
}

function verdictOn(drop: LoadDrop, limitV: number): Verdict | undefined {
  const isAbove = (volts: number) => volts > limitV * (1 + 1e-9);
  if (isAbove(drop.volts)) {
    return { severity: drop.load.demand === 'cranking' ? 'should' : 'must', lostV: drop.volts };
  }
  if (drop.load.demand === 'cranking') return undefined;
  if (isAbove(drop.totalV)) {
    const message =
      '{load} loses {lostV} of its {nominalV} with fuses and contacts counted, {fraction}; {limit} is the limit. The conductors alone lose {conductorsV}.';
    return { severity: 'should', lostV: drop.totalV, message };
  }
  if (!isAbove(drop.withMomentaryV)) return undefined;
  const message =
    '{load} loses {lostV} of its {nominalV}, {fraction}, while the short-time loads on its path run; {limit} is the limit for what lasts.';
  return { severity: 'note', lostV: drop.withMomentaryV, message };
}

/** With fuses and contacts within the limit too, so that nothing is left to say; if that can't be, the conductors alone. */
function remediesFor(proof: Proof, drop: LoadDrop, limitV: number, { severity, lostV }: Verdict): Remedy[] {
  if (severity === 'note') return [];
  const lost = { ...drop, nominalV: drop.load.nominalV };
  const whole = thickerPath(proof, lost, limitV, drop.totalV - drop.volts);
  return whole.length > 0 || lostV !== drop.volts ? whole : thickerPath(proof, lost, limitV, 0);
}

interface Lost {
  readonly volts: number;
  readonly nominalV: number;
  readonly path: LoadDrop['path'];
  readonly voltsOf: readonly number[];
}

/**
 * The thinnest step at a time on the run that loses most, new work first, until the load has its voltage. `besideV`
 * is what is lost that no conductor can mend. Less drop lets a heater take more, which is allowed for.
 */
function thickerPath(proof: Proof, drop: Lost, limitV: number, besideV: number): Remedy[] {
  const steps = drop.path.flatMap((run, i) => {
    const proved = proof.runOf.get(run.id);
    const canChange = proved && mayChange(run) && run.lengthM !== undefined && run.milliohm === undefined;
    return canChange ? [{ proved, volts: drop.voltsOf[i]!, size: conductorOf(run).size }] : [];
  });
  const fixedV = drop.volts - steps.reduce((sum, step) => sum + step.volts, 0) + besideV;
  const startV = drop.volts + besideV;
  const needed = (lostV: number) => lostV * (1 + (startV - lostV) / drop.nominalV) > limitV;
  for (const isOpen of [(step: (typeof steps)[number]) => workOf(step.proved.run) === 'new', () => true]) {
    const sizes = steps.map((step) => ({ ...step }));
    const lostV = () => fixedV + sizes.reduce((sum, step) => sum + step.volts, 0);
    while (needed(lostV())) {
      const next = sizes.filter((step) => isOpen(step) && thicker(step.size)).toSorted((a, b) => b.volts - a.volts)[0];
      if (!next) break;
      const size = thicker(next.size)!;
      const { cable } = next.proved.run;
      for (const step of sizes) {
        if (step !== next && (cable === undefined || step.proved.run.cable !== cable)) continue;
        step.volts *= ohmPerMetre(proof, step.proved, size) / ohmPerMetre(proof, step.proved, step.size);
        step.size = size;
      }
    }
    if (needed(lostV())) continue;
    const changed = sizes.filter((step, i) => step.size !== steps[i]!.size);
    return [
      { title: titleOf(changed), patch: changed.flatMap(({ proved, size }) => sizePatches(proof, proved, size)) },
    ];
  }
  return [];
}

function thicker(size: Size): Size | undefined {
  const series = seriesOf(size);
  return series[series.indexOf(size) + 1];
}

function ohmPerMetre(proof: Proof, run: ProvedRun, size: Size): number {
  return workingOhmPerMetre(size, run.sizing.warmestC, proof.basis);
}

function titleOf(changed: readonly { readonly proved: ProvedRun; readonly size: Size }[]): string {
  const bySize = new Map<Size, string[]>();
  for (const { proved, size } of changed) bySize.set(size, [...(bySize.get(size) ?? []), callOf(proved.run)]);
  return `Use ${[...bySize].map(([size, runs]) => `${size} for ${listOf(runs)}`).join(', ')}`;
}
