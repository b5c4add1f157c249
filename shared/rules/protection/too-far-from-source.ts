import type { Device } from '#shared/model/design.ts';
import type { Remedy } from '#shared/model/analysis.ts';
import { mayChange, listOf } from '#shared/rules/mending.ts';
import { defineRule } from '#shared/rules/rule.ts';
import type { Proof, ProvedRun } from '#shared/solve/proof.ts';
import type { Stub } from '#shared/solve/protection.ts';
import { callOf } from '#shared/solve/ratings.ts';
import { coveringOf } from '#shared/solve/regions.ts';

/**
 * The first fuse or breaker stands close to the source of the current: within 7 in along the conductors, or within
 * 72 in of a battery and 40 in of any other source where all of the way is in a sheath, conduit or enclosure.
 *
 * The cables between a battery and a starter are exempt; what leaves them is measured from the stud where it leaves
 * (183.455(b): at the source of power of each conductor), as from any source that is no battery terminal.
 *
 * Why: nothing protects the stub before the device. The way is summed from the terminal of the source through
 * switches, selectors and studs. Where nobody has told whether a run is enclosed it should be told, not passed.
 * Source: ABYC E-11 and 33 CFR 183.455(b); ISO 13297:2020 12.3 and, from memory, ISO 10133:2012 8.1.
 * Says nothing where a length on the way is not known: `conductor/length-missing` does.
 */
export const tooFarFromSource = defineRule({
  id: 'protection/too-far-from-source',
  title: 'Protection stands too far from the source',
  severity: 'must',
  sources: {
    'abyc-e11': { title: 'ABYC E-11 and 33 CFR 183', clause: 'overcurrent protection, location; 183.455(b)' },
    'iso-13297': { title: 'ISO 13297:2020 and ISO 10133:2012', clause: '12.3; 8.1 (from memory)' },
  },
  message: '{device} stands {stubM} from {source} along {runs}; {limitM} is the most {how}.',

  *check(proof) {
    for (const run of proof.runs) {
      for (const { stub, source } of run.protection) {
        if (!stub || stub.verdict === 'right' || isFoundEarlier(proof, run, stub, source)) continue;
        const isUntold = stub.verdict === 'not told';
        const isShortEnough = stub.lengthM <= stub.enclosedLimitM + 1e-9;
        yield {
          subject: { run: run.id },
          severity: isUntold ? 'should' : 'must',
          message: isUntold
            ? '{device} stands {stubM} from {source} along {runs}. Bare, {bareLimitM} is the most; up to {enclosedLimitM} it must be in a sheath or enclosure, which nobody has told.'
            : undefined,
          figures: {
            device: callOf(stub.device),
            source: source ? callOf(source) : 'its source',
            runs: listOf(stub.runs.map((id) => callOf(proof.runOf.get(id)!.run))),
            stubM: stub.lengthM,
            limitM: isShortEnough ? stub.limitM : stub.enclosedLimitM,
            bareLimitM: stub.limitM,
            enclosedLimitM: stub.enclosedLimitM,
            how: isShortEnough && stub.covering !== 'enclosed' ? 'for a bare run' : 'in a sheath or enclosure',
          },
          remedies: [...sheatheStub(proof, stub), ...putOnStud(proof, stub)],
        };
      }
    }
  },
});

/** A stub that is too long already at its beginning is one cause, whatever hangs on its end: it is said of its first run. */
function isFoundEarlier(proof: Proof, run: ProvedRun, stub: Stub, source: Device | undefined): boolean {
  const nearer = stub.runs.slice(0, Math.max(0, stub.runs.indexOf(run.id)));
  return nearer.some((id) =>
    proof.runOf.get(id)?.protection.some((end) => {
      if (!end.stub || end.stub.verdict === 'right') return false;
      const isSame = end.stub.device === stub.device || end.source === source;
      return isSame && (end.stub.verdict === 'too far' || stub.verdict === 'not told');
    }),
  );
}

function sheatheStub(proof: Proof, stub: Stub): Remedy[] {
  if (stub.lengthM > stub.enclosedLimitM + 1e-9) return [];
  const open = stub.runs.map((id) => proof.runOf.get(id)!.run).filter((run) => coveringOf(run) !== 'enclosed');
  if (open.length === 0 || !open.every(mayChange)) return [];
  return [
    {
      title: `Sheathe ${listOf(open.map(callOf))}`,
      patch: open.map((run) => ({ op: 'set', path: ['runs', run.id, 'enclosed'], value: 'sheath' })),
    },
  ];
}

/** A stud fuse at the end of a single run goes onto the battery's own stud; its wire on the other side gets longer. */
function putOnStud(proof: Proof, stub: Stub): Remedy[] {
  const { device } = stub;
  const [only, ...more] = stub.runs.map((id) => proof.runOf.get(id)!.run);
  const sitsOnStud = device.kind === 'fuse' && (device.symbol === 'stud' || device.ratings.family === 'terminal');
  if (!only || more.length > 0 || !sitsOnStud || device.mountedOn || ![device, only].every(mayChange)) return [];
  const [fuseEnd, stud] = only.from.device === device.id ? [only.from, only.to] : [only.to, only.from];
  if (
    fuseEnd.device !== device.id ||
    fuseEnd.terminal !== 'a' ||
    proof.design.devices[stud.device]?.kind !== 'battery'
  ) {
    return [];
  }
  const onwards = proof.runs.filter(({ run }) => endsAt(run, device.id) && run.id !== only.id).map(({ run }) => run);
  if (!onwards.every((run) => mayChange(run) && endsAt(run, device.id, 'b') && run.lengthM !== undefined)) return [];
  return [
    {
      title: `Put ${callOf(device)} on the stud of ${callOf(proof.design.devices[stud.device]!)}`,
      patch: [
        { op: 'remove', path: ['runs', only.id] },
        { op: 'set', path: ['devices', device.id, 'mountedOn'], value: stud },
        ...onwards.map((run) => ({
          op: 'set' as const,
          path: ['runs', run.id, 'lengthM'],
          value: run.lengthM! + (only.lengthM ?? 0),
        })),
      ],
    },
  ];
}

function endsAt(run: ProvedRun['run'], device: string, terminal?: string): boolean {
  return [run.from, run.to].some((end) => end.device === device && (terminal ?? end.terminal) === end.terminal);
}
