import type { Analysis, Finding } from '#shared/model/analysis.ts';
import { sheetOf } from '#shared/model/defaults.ts';
import type { Design, EntityId } from '#shared/model/design.ts';

/** Where a finding's subject is: what it is called, its sheet, its zones. */
export interface FindingPlace {
  readonly mark: string;
  readonly sheetId: EntityId | null;
  readonly sheet: string;
  readonly zoneIds: readonly EntityId[];
}

export function placeOfFinding(design: Design, finding: Finding): FindingPlace {
  const { device: deviceId, run: runId, zone: zoneId } = finding.subject;
  const run = runId === undefined ? undefined : design.runs[runId];
  const device = deviceId === undefined ? design.devices[run?.from.device ?? ''] : design.devices[deviceId];
  const sheet = design.sheets[device?.sheetId ?? ''];
  const zone = zoneId === undefined ? undefined : design.zones[zoneId];
  return {
    mark:
      run?.mark ??
      (deviceId === undefined ? undefined : device?.mark) ??
      zone?.name ??
      (run ? 'run' : device ? 'device' : 'design'),
    sheetId: sheet?.id ?? null,
    sheet: sheet === undefined ? '' : `sheet ${sheetOf(sheet).number}`,
    zoneIds: run?.zoneIds ?? (device?.zoneId === undefined ? (zoneId === undefined ? [] : [zoneId]) : [device.zoneId]),
  };
}

/** The address at which a subject is shown, chosen, on its sheet. */
export function addressOnSheet(vesselId: string, finding: Finding, place: FindingPlace): string | null {
  const id = finding.subject.run ?? finding.subject.device;
  if (id === undefined || place.sheetId === null) return null;
  return `/vessels/${vesselId}/draw?sheet=${place.sheetId}&select=${encodeURIComponent(id)}`;
}

export function nameOfMode(design: Design, modeId: string): string {
  if (modeId === 'all-on') return 'All on';
  if (modeId === 'all-charging') return 'All charging';
  return design.modes[modeId]?.name ?? modeId;
}

/** The group of a rule, by which findings are sorted out: `conductor` of `conductor/ampacity`. */
export function groupOfRule(rule: string): string {
  return rule.split('/')[0] ?? rule;
}

/** What flows into all batteries together in a mode: less than nothing while they give. */
export function bankCurrentA(design: Design, analysis: Analysis, modeId: string): number {
  const devices = analysis.modes[modeId]?.devices ?? {};
  return Object.values(design.devices)
    .filter((device) => device.kind === 'battery')
    .reduce((sum, battery) => sum + (devices[battery.id]?.currentA ?? 0), 0);
}
