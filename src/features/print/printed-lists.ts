import { partsList } from '#shared/lists/parts-list.ts';
import { wireSchedule } from '#shared/lists/wire-schedule.ts';
import type { Analysis } from '#shared/model/analysis.ts';
import { basisOf } from '#shared/model/defaults.ts';
import type { Design } from '#shared/model/design.ts';
import { formatA } from '#shared/units/current.ts';
import { formatLength, type UnitSystem } from '#shared/units/length.ts';
import { formatNumber } from '#shared/units/number.ts';
import { formatPercent } from '#shared/units/fraction.ts';

import type { PrintedTable } from './pdf-table.ts';

export interface PrintedList {
  readonly id: string;
  readonly table: PrintedTable;
}

/** The lists that can stand behind the sheets. On paper lengths are in the units of the basis. */
export function listsOf(design: Design, analysis: Analysis | null): readonly PrintedList[] {
  const { units } = basisOf(design);
  return [
    { id: 'wire-schedule', table: wireTable(design, analysis, units) },
    { id: 'parts-list', table: partsTable(design, analysis, units) },
  ];
}

function wireTable(design: Design, analysis: Analysis | null, units: UnitSystem): PrintedTable {
  const rows = wireSchedule(design, analysis);
  return {
    title: 'Wire schedule',
    lead: `${rows.length} runs, by mark. Lengths are one way, ${units === 'us' ? 'in feet and inches' : 'in metres'}; an empty one is not known yet.`,
    columns: [
      { heading: 'Run', set: 'code', widthMm: 13 },
      { heading: 'From', set: 'code' },
      { heading: 'To', set: 'code' },
      { heading: 'Size', set: 'code', widthMm: 17 },
      { heading: 'Colour' },
      { heading: 'Insulation', set: 'figure', widthMm: 16 },
      { heading: 'Length', set: 'figure', widthMm: 30 },
      { heading: 'Carries', set: 'figure', widthMm: 16 },
      { heading: 'Drop', set: 'figure', widthMm: 14 },
      { heading: 'Work', widthMm: 14 },
    ],
    rows: rows.map((row) => [
      row.mark,
      row.from,
      row.to,
      row.parallel > 1 ? `${row.parallel} x ${row.size}` : row.size,
      row.link ? 'link' : row.colour,
      row.link ? '' : `${row.insulationC} °C`,
      row.lengthM === null ? '' : formatLength(row.lengthM, units),
      row.designCurrentA === null ? '' : formatA(row.designCurrentA),
      row.dropFraction === null ? '' : formatPercent(row.dropFraction),
      row.work,
    ]),
  };
}

function partsTable(design: Design, analysis: Analysis | null, units: UnitSystem): PrintedTable {
  const lines = analysis?.parts ?? partsList(design);
  return {
    title: 'Parts list',
    lead: `${lines.length} lines, new work only; cable with slack and end allowance, rounded up.`,
    columns: [
      { heading: 'Group', widthMm: 24 },
      { heading: 'Part' },
      { heading: 'Rating' },
      { heading: 'Quantity', set: 'figure', widthMm: 18 },
      { heading: 'Unit', widthMm: 12 },
      { heading: 'For', set: 'code', widthMm: 48 },
    ],
    rows: lines.map((line) => {
      const isFeet = line.unit === 'm' && units === 'us';
      return [
        line.group,
        line.part,
        line.rating,
        formatNumber(isFeet ? Math.ceil(line.quantity / 0.3048 - 1e-9) : line.quantity),
        isFeet ? 'ft' : line.unit,
        [
          ...line.devices.map((id) => design.devices[id]?.mark ?? id),
          ...line.runs.map((id) => design.runs[id]?.mark ?? id),
        ]
          .sort((a, b) => a.localeCompare(b, 'en', { numeric: true }))
          .join(' '),
      ];
    }),
  };
}
