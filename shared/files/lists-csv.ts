import type { Analysis, PartsLine } from '#shared/model/analysis.ts';
import { basisOf } from '#shared/model/defaults.ts';
import type { Design } from '#shared/model/design.ts';

import { toCsv, type Cell } from './csv.ts';
import { wireSchedule } from '#shared/lists/wire-schedule.ts';

const FOOT_M = 0.3048;

/** The parts list as a spreadsheet opens it; cable in the basis's unit. */
export function partsCsv(design: Design, lines: readonly PartsLine[]): string {
  const inFeet = basisOf(design).units === 'us';
  const rows = lines.map((line): Cell[] => {
    const isFeet = line.unit === 'm' && inFeet;
    return [
      line.group,
      line.part,
      line.rating,
      isFeet ? Math.ceil(line.quantity / FOOT_M - 1e-9) : line.quantity,
      isFeet ? 'ft' : line.unit,
      marksOf(line.devices.map((id) => design.devices[id]?.mark ?? id)),
      marksOf(line.runs.map((id) => design.runs[id]?.mark ?? id)),
    ];
  });
  return toCsv([['Group', 'Part', 'Rating', 'Quantity', 'Unit', 'Devices', 'Runs'], ...rows]);
}

/** The wire schedule as a spreadsheet opens it; lengths as numbers in the basis's unit. */
export function wireScheduleCsv(design: Design, analysis: Pick<Analysis, 'runs'> | null): string {
  const inFeet = basisOf(design).units === 'us';
  const length = (lengthM: number | null) => (lengthM === null ? null : round(inFeet ? lengthM / FOOT_M : lengthM, 2));
  const head = [
    'Mark',
    'From',
    'To',
    `Length (${inFeet ? 'ft' : 'm'})`,
    'Size',
    'In parallel',
    'Insulation (°C)',
    'Colour',
    'Stud, from',
    'Stud, to',
    'Current (A)',
    'Drop (%)',
    'Zones',
    'Work',
    'Note',
  ];
  const rows = wireSchedule(design, analysis).map((row): Cell[] => [
    row.mark,
    row.from,
    row.to,
    length(row.lengthM),
    row.size,
    row.parallel,
    row.insulationC,
    row.colour,
    row.link ? 'link' : row.fromStud,
    row.link ? 'link' : row.toStud,
    row.designCurrentA === null ? null : round(row.designCurrentA, 2),
    row.dropFraction === null ? null : round(row.dropFraction * 100, 2),
    row.zones.join(', '),
    row.work,
    row.note,
  ]);
  return toCsv([head, ...rows]);
}

function marksOf(marks: readonly string[]): string {
  return [...marks].sort((a, b) => a.localeCompare(b, 'en', { numeric: true })).join(' ');
}

function round(value: number, decimals: number): number {
  return Number(value.toFixed(decimals));
}
