import type { Remedy } from '#shared/model/analysis.ts';
import { nextMark } from '#shared/rules/next-mark.ts';
import { mayChange } from '#shared/rules/mending.ts';
import { defineRule } from '#shared/rules/rule.ts';
import { terminalAt } from '#shared/kinds/place.ts';
import type { Device, End } from '#shared/model/design.ts';
import type { Proof, ProvedRun } from '#shared/solve/proof.ts';
import { allowedRatingA } from '#shared/solve/protection.ts';
import { callOf } from '#shared/solve/ratings.ts';
import { CONTINUOUS_LOAD_FACTOR, standardRatings } from '#shared/tables/protection.ts';

/**
 * Every ungrounded run that a source can feed has a fuse or breaker between it and that source.
 *
 * Why: a battery gives thousands of amperes into a chafed wire, and nothing else stops it before the insulation burns.
 * Each end that fault current can come from is asked; runs that follow one another without a branch are one finding,
 * on the run nearest the source. Exempt: the path of a starter, jumpers inside a bank, self-limiting sources.
 * Source: ABYC E-11 and 33 CFR 183.455(a); ISO 10133:2012 8.1 (from memory).
 * Says nothing about protection that is there but too far off or rated too high.
 */
export const missing = defineRule({
  id: 'protection/missing',
  title: 'Nothing protects a run',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'ABYC E-11 and 33 CFR 183', clause: 'overcurrent protection; 183.455(a)' },
    'iso-13297': { title: 'ISO 10133:2012 and ISO 13297:2020', clause: '8.1 (from memory)' },
  },
  message: 'No fuse or breaker stands between {source} and {run}; its {size} would burn on a short circuit.',

  *check(proof) {
    for (const run of proof.runs) {
      for (const end of run.protection) {
        if (end.how !== 'none' || isFoundAhead(proof, end.ahead) || proof.shorts.isFedByShort(run.edge)) continue;
        yield {
          subject: { run: run.id },
          figures: {
            source: end.source ? callOf(end.source) : 'a source',
            run: callOf(run.run),
            size: run.run.conductor.size,
            allowedA: run.ampacity.allowedA,
          },
          remedies: end.ahead === undefined ? fuseAtSource(proof, run, end.fromEnd) : [],
        };
      }
    }
  },
});

/** The run nearer the source lacks protection too: one device there serves both. */
function isFoundAhead(proof: Proof, ahead: string | undefined): boolean {
  return ahead !== undefined && proof.runOf.get(ahead)?.protection.some((end) => end.how === 'none') === true;
}

/** Breaks 20 kA, which is more than any bank of its size here can give. */
const FUSE = { family: 'class T', interruptA: 20_000, maxV: 125 } as const;

/** A fuse on the very stud the run starts at, rated for what the run and all that follows can take. */
function fuseAtSource(proof: Proof, run: ProvedRun, fromEnd: 'from' | 'to'): Remedy[] {
  const stud = run.run[fromEnd];
  const source = proof.design.devices[stud.device];
  const place = source && terminalAt(source, stud.terminal);
  const ratedA = fuseRating(proof, run);
  if (!source || !place || ratedA === undefined || !mayChange(run.run)) return [];
  const id = freeId(proof, `fuse-${run.id}`);
  const fuse: Device = {
    id,
    kind: 'fuse',
    mark: nextMark(proof.design, 'F'),
    ratings: { ratedA, ...FUSE },
    symbol: 'class-t',
    sheetId: source.sheetId,
    x: Math.round(place.x / 16) * 16 + 16,
    y: Math.round(place.y / 16) * 16 - 32,
    mountedOn: stud,
  };
  const own: End = { device: id, terminal: 'b' };
  return [
    {
      title: `Put a fuse of ${ratedA} A on ${callOf(source)}`,
      patch: [
        { op: 'set', path: ['devices', id], value: fuse },
        { op: 'set', path: ['runs', run.id, fromEnd], value: own },
      ],
    },
  ];
}

function fuseRating(proof: Proof, run: ProvedRun): number | undefined {
  const behind = new Set([run.id]);
  for (const id of behind) {
    for (const each of proof.runsBehind.get(id) ?? []) behind.add(each);
  }
  const mostA = Math.min(
    ...[...behind].map((id) => {
      const each = proof.runOf.get(id)!;
      return allowedRatingA(each.edge, each.ampacity, FUSE.family, proof.basis);
    }),
  );
  const neededA = run.designCurrentA * CONTINUOUS_LOAD_FACTOR;
  const isAllowed = (ratedA: number) => ratedA <= mostA * (1 + 1e-9);
  // What no mode sends current through is for what nobody has reckoned with: no rating can be named.
  if (neededA < 1e-3) return undefined;
  return standardRatings(FUSE.family).find((ratedA) => ratedA >= neededA && isAllowed(ratedA));
}

function freeId(proof: Proof, wanted: string): string {
  const base = wanted.slice(0, 58);
  for (let n = 1; ; n++) {
    const id = n === 1 ? base : `${base}-${n}`;
    if (!Object.hasOwn(proof.design.devices, id)) return id;
  }
}
