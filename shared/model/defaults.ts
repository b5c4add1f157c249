import type { Basis, Device, Run, Sheet, Zone } from './design.ts';
import { sizeOf, type InsulationC, type Size } from './size.ts';

/** Everything the document leaves unsaid, in one place. Nothing here is ever written into a document. */

export type FullBasis = Required<Omit<Basis, 'dropLimits' | 'cable' | 'peakSunHours' | 'autonomyDays'>> & {
  dropLimits: { critical: number; general: number };
  cable: { insulationC: InsulationC; slackFraction: number; endAllowanceM: number };
  peakSunHours?: number;
  autonomyDays?: number;
};

export function basisOf(design: { readonly basis?: Basis }): FullBasis {
  const basis = design.basis ?? {};
  const profile = basis.profile ?? 'abyc-e11';
  return {
    profile,
    ambientC: basis.ambientC ?? 30,
    engineSpaceC: basis.engineSpaceC ?? 50,
    minAmbientC: basis.minAmbientC ?? -10,
    dropLimits: { critical: basis.dropLimits?.critical ?? 0.03, general: basis.dropLimits?.general ?? 0.1 },
    cable: {
      insulationC: basis.cable?.insulationC ?? 105,
      slackFraction: basis.cable?.slackFraction ?? 0.1,
      endAllowanceM: basis.cable?.endAllowanceM ?? 0.15,
    },
    currency: basis.currency ?? 'USD',
    units: basis.units ?? 'us',
    hull: basis.hull ?? 'plastic',
    fuel: basis.fuel ?? 'petrol',
    dcSystem: basis.dcSystem ?? 'grounded',
    acPolarized: basis.acPolarized ?? true,
    resistance: basis.resistance ?? (profile === 'iso-13297' ? 'iec-60228' : 'circular-mil'),
    conductorC: basis.conductorC ?? 50,
    bundling: basis.bundling ?? 'all',
    ratingAbove: basis.ratingAbove ?? (profile === 'iso-13297' ? '150-percent' : 'next-standard'),
    ratingOf: basis.ratingOf ?? 'corrected',
    peakSunHours: basis.peakSunHours,
    autonomyDays: basis.autonomyDays,
  };
}

export interface FullConductor {
  readonly size: Size;
  readonly insulationC: InsulationC;
  readonly parallel: number;
  readonly bundled: number;
}

/** A size no table knows (only a document that was never read by `readDesign` can hold one) counts as the thinnest. */
export function conductorOf(run: Run): FullConductor {
  const { size, insulationC, parallel, bundled } = run.conductor;
  return {
    size: sizeOf(size) ?? '20 AWG',
    insulationC: insulationC ?? 105,
    parallel: parallel ?? 1,
    bundled: bundled ?? 1,
  };
}

export function workOf(entity: Device | Run): 'new' | 'existing' | 'remove' {
  return entity.work ?? 'new';
}

export function sheetOf(sheet: Sheet): Required<Sheet> {
  return {
    id: sheet.id,
    number: sheet.number ?? 1,
    title: sheet.title ?? '',
    paper: sheet.paper ?? 'A4',
    orientation: sheet.orientation ?? 'landscape',
  };
}

/** The temperature of a zone: its own, or the basis's for an engine space or for any other place. */
export function zoneAmbientC(zone: Zone | undefined, basis: FullBasis): number {
  return zone?.ambientC ?? (zone?.engineSpace ? basis.engineSpaceC : basis.ambientC);
}
