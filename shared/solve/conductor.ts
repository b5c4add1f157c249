import type { Zone } from '#shared/model/design.ts';
import type { FullBasis, FullConductor } from '#shared/model/defaults.ts';
import { conductorOf, zoneAmbientC } from '#shared/model/defaults.ts';
import type { Run } from '#shared/model/design.ts';
import type { Size } from '#shared/model/size.ts';
import { AMPACITY, BUNDLING_BY_LAW_FROM_V, TABLE_AMBIENT_C, type AmpacityTable } from '#shared/tables/ampacity.ts';
import { COPPER_PER_KELVIN_AT_20_C, ohmPerMetreAt20C, ohmPerMetreByCircularMils } from '#shared/tables/copper.ts';

type Zones = Readonly<Record<string, Zone>>;

/** The resistance of a run as it works, Ω; null where neither its length nor its resistance is known. */
export function runOhm(run: Run, basis: FullBasis, zones: Zones): number | null {
  if (isAmount(run.milliohm)) return run.milliohm / 1000;
  if (!isAmount(run.lengthM)) return null;
  const conductor = conductorOf(run);
  return (workingOhmPerMetre(conductor.size, warmestC(run, basis, zones), basis) * run.lengthM) / conductor.parallel;
}

/** The resistance of a run with its copper at a given temperature, Ω: for faults, cold or hot. */
export function runOhmAt(run: Run, copperC: number): number | null {
  if (isAmount(run.milliohm)) return run.milliohm / 1000;
  if (!isAmount(run.lengthM)) return null;
  const { size, parallel } = conductorOf(run);
  return (ohmPerMetreAt(size, copperC) * run.lengthM) / parallel;
}

/**
 * The circular-mil form already is warm copper and is not corrected again; in a zone hotter than the ampacity
 * tables' ambient it would be short of the truth, so there the greater of the two forms counts.
 */
export function workingOhmPerMetre(size: Size, ambientC: number, basis: FullBasis): number {
  if (basis.resistance === 'iec-60228') return ohmPerMetreAt(size, Math.max(basis.conductorC, ambientC));
  const byCircularMils = ohmPerMetreByCircularMils(size);
  if (ambientC <= TABLE_AMBIENT_C) return byCircularMils;
  return Math.max(byCircularMils, ohmPerMetreAt(size, ambientC));
}

function ohmPerMetreAt(size: Size, copperC: number): number {
  return ohmPerMetreAt20C(size) * Math.max(0, 1 + COPPER_PER_KELVIN_AT_20_C * (copperC - 20));
}

/** The hottest place a run passes, °C. A run in no zone is in the basis's ambient. */
export function warmestC(run: Run, basis: FullBasis, zones: Zones): number {
  const passed = zonesOf(run, zones);
  if (passed.length === 0) return basis.ambientC;
  return Math.max(...passed.map((zone) => zoneAmbientC(zone, basis)));
}

export interface Ampacity {
  /** Of one conductor, at the table's ambient. */
  readonly baseA: number;
  readonly factors: readonly { readonly name: 'temperature' | 'bundling' | 'parallel'; readonly factor: number }[];
  /** Of the whole run. 0 where its insulation may not be used. */
  readonly allowedA: number;
}

/** What a run may carry: table x one temperature factor x bundling x parallel. `nominalV` is that of its circuit. */
export function ampacityOf(run: Run, basis: FullBasis, zones: Zones, bundled: number, nominalV: number): Ampacity {
  return ampacityWith(conductorOf(run), zonesOf(run, zones), basis, bundled, nominalV);
}

/** The same for a conductor that is only thought of: for finding the size that would do. */
export function ampacityWith(
  conductor: FullConductor,
  passed: readonly Zone[],
  basis: FullBasis,
  bundled: number,
  nominalV: number,
): Ampacity {
  const table = AMPACITY[basis.profile];
  const column = columnOf(table, conductor.insulationC);
  const baseA = tableAmpacityA(table, conductor.size, column);
  const temperature = temperatureFactor(table, column, passed, basis);
  const bundling = bundlingFactor(table, bundled, nominalV, basis);
  const factors: Ampacity['factors'][number][] = [];
  if (temperature !== 1) factors.push({ name: 'temperature', factor: temperature });
  if (bundling !== 1) factors.push({ name: 'bundling', factor: bundling });
  if (conductor.parallel !== 1) factors.push({ name: 'parallel', factor: conductor.parallel });
  return { baseA, factors, allowedA: factors.reduce((product, each) => product * each.factor, baseA) };
}

/** A column the profile lacks reads the next lower one. */
function columnOf(table: AmpacityTable, insulationC: number): number {
  return Math.max(
    0,
    table.columnsC.findLastIndex((columnC) => columnC <= insulationC),
  );
}

/**
 * A size of the other series reads the row of the thickest size that holds no more copper, judged by resistance:
 * an mm² size is a class of resistance, not an area. One thinner than the whole table counts by its share of
 * the first row's copper.
 */
function tableAmpacityA(table: AmpacityTable, size: Size, column: number): number {
  const own = table.rows.find(([listed]) => listed === size);
  if (own) return own[1][column]!;
  const ohm = ohmPerMetreAt20C(size);
  const lower = table.rows.findLast(([listed]) => ohmPerMetreAt20C(listed) >= ohm);
  if (lower) return lower[1][column]!;
  const [thinnest, amperes] = table.rows[0]!;
  return (amperes[column]! * ohmPerMetreAt20C(thinnest)) / ohm;
}

/** The worst over the zones, never above 1; 0 where the insulation may not be used. */
function temperatureFactor(table: AmpacityTable, column: number, passed: readonly Zone[], basis: FullBasis): number {
  if (passed.length === 0) return ambientFactor(table.columnsC[column]!, basis.ambientC);
  return Math.min(...passed.map((zone) => zoneFactor(table, column, zone, basis)));
}

function zoneFactor(table: AmpacityTable, column: number, zone: Zone, basis: FullBasis): number {
  const ambientC = zoneAmbientC(zone, basis);
  if (!zone.engineSpace) return ambientFactor(table.columnsC[column]!, ambientC);
  const published = table.engineSpace.factors[column]!;
  if (published === 0 || ambientC === table.engineSpace.ambientC) return published;
  return ambientFactor(table.columnsC[column]!, ambientC);
}

/** NEC 310.15(B)(1): √((Tc − Ta) / (Tc − 30)). */
function ambientFactor(insulationC: number, ambientC: number): number {
  const share = (insulationC - ambientC) / (insulationC - TABLE_AMBIENT_C);
  if (!(share > 0)) return 0;
  return Math.min(1, Math.sqrt(share));
}

function bundlingFactor(table: AmpacityTable, bundled: number, nominalV: number, basis: FullBasis): number {
  const isLeftOut = basis.profile === 'abyc-e11' && basis.bundling === 'ac-only' && nominalV < BUNDLING_BY_LAW_FROM_V;
  if (isLeftOut) return 1;
  return table.bundling.steps.findLast((step) => bundled >= step.from)?.factor ?? 1;
}

export function zonesOf(run: Run, zones: Zones): Zone[] {
  const ids = Array.isArray(run.zoneIds) ? run.zoneIds : [];
  return ids.flatMap((id) => (Object.hasOwn(zones, id) ? [zones[id]!] : []));
}

function isAmount(value: unknown): value is number {
  return typeof value === 'number' && Number.isFinite(value) && value >= 0;
}
