import { terminalAt } from '#shared/kinds/place.ts';
import { runColour } from '#shared/layout/run-colour.ts';
import type { Analysis, Finding, Severity } from '#shared/model/analysis.ts';
import { zoneAmbientC, basisOf } from '#shared/model/defaults.ts';
import type { Design, End, Run } from '#shared/model/design.ts';
import { formatA } from '#shared/units/current.ts';
import { formatC } from '#shared/units/temperature.ts';

/** What is said of a run in the ledger, the particulars and the line over the ledger. */

export function sayEnd(design: Design, end: End): string {
  return `${design.devices[end.device]?.mark ?? '?'} : ${end.terminal}`;
}

/** `Run, DC positive, House bank to Main switch`. */
export function sayRun(design: Design, run: Run): string {
  return `Run, ${sayDuty(design, run)}, ${nameEnd(design, run.from)} to ${nameEnd(design, run.to)}`;
}

function nameEnd(design: Design, end: End): string {
  const device = design.devices[end.device];
  return device?.name || device?.mark || 'nothing';
}

const DUTIES: Readonly<Record<string, string>> = {
  bond: 'bonding',
  pe: 'grounding',
  'dc-': 'DC negative',
  'dc+': 'DC positive',
  signal: 'signal',
  data: 'data',
};

export function sayDuty(design: Design, run: Run): string {
  const roles = [run.from, run.to].map((end) => {
    const device = design.devices[end.device];
    return device === undefined ? undefined : terminalAt(device, end.terminal)?.role;
  });
  const telling = ['bond', 'pe', 'dc-', 'dc+', 'signal', 'data'].find((role) => roles.includes(role as never));
  return DUTIES[telling ?? ''] ?? 'DC positive';
}

export function isReturn(design: Design, run: Run): boolean {
  return sayDuty(design, run) === 'DC negative';
}

/** `F3, 100 A`; a return needs none of its own. */
export function sayProtection(design: Design, analysis: Analysis | null, run: Run): string {
  const protections = analysis?.runs[run.id]?.protection ?? [];
  const found = protections.find((protection) => protection.device !== undefined);
  if (found?.device !== undefined) {
    const mark = design.devices[found.device]?.mark ?? '?';
    return found.ratedA === undefined ? mark : `${mark}, ${formatA(found.ratedA)}`;
  }
  if (isReturn(design, run)) return 'return';
  return protections.length > 0 ? 'none' : '';
}

export function sayZones(design: Design, run: Run): string {
  return (run.zoneIds ?? [])
    .map((id) => design.zones[id]?.name ?? '')
    .filter(Boolean)
    .join(', ');
}

/** `Engine space, 50 °C; Cabin`. */
export function sayZonesWithHeat(design: Design, run: Run): string {
  const basis = basisOf(design);
  return (run.zoneIds ?? [])
    .flatMap((id) => {
      const zone = design.zones[id];
      if (zone === undefined) return [];
      const heat = zoneAmbientC(zone, basis);
      return [heat === basis.ambientC ? zone.name : `${zone.name}, ${formatC(heat)}`];
    })
    .join('; ');
}

export function sayColour(design: Design, run: Run): string {
  return runColour(design, run);
}

const GRAVITY: Readonly<Record<Severity, number>> = { must: 0, should: 1, note: 2 };

/** The findings that speak of a device or a run, the gravest first. */
export function findingsOf(
  findings: readonly Finding[] | undefined,
  subject: { readonly device?: string; readonly run?: string },
): Finding[] {
  return (findings ?? [])
    .filter(
      (finding) =>
        (subject.run !== undefined && finding.subject.run === subject.run) ||
        (subject.device !== undefined && finding.subject.device === subject.device),
    )
    .toSorted((a, b) => GRAVITY[a.severity] - GRAVITY[b.severity]);
}

/** What the check says of it in one word: the gravest severity that is not accepted, else good. */
export function verdictOf(findings: readonly Finding[]): Severity | 'good' {
  return findings.find((finding) => finding.accepted !== true)?.severity ?? 'good';
}
