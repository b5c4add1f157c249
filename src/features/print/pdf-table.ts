import type { jsPDF } from 'jspdf';
import { autoTable } from 'jspdf-autotable';

import { CAUTION, NOT_FOR_BUILDING } from '#symbols/sheet/caution.tsx';

import { MONO_FONT, TEXT_FONT } from './pdf-fonts.ts';

/** A list of the set: one table, over as many pages as it needs. */
export interface PrintedTable {
  readonly title: string;
  /** One line under the title: what is in it, by which order. */
  readonly lead: string;
  readonly columns: readonly PrintedColumn[];
  readonly rows: readonly (readonly string[])[];
  /** In bold under the last row. */
  readonly total?: readonly string[];
}

export interface PrintedColumn {
  readonly heading: string;
  /** Marks, terminals and sizes are set in the mono face; figures too, ranged right, so that digits stand in line. */
  readonly set?: 'text' | 'code' | 'figure';
  readonly widthMm?: number;
}

/** jsPDF's names for a weight of an upright cut; the table's own types know the common ones only. */
const STYLE = { 400: 'normal', 500: '500normal' as 'normal', 600: '600normal' as 'normal', 700: 'bold' } as const;

export interface ListPaper {
  readonly format: 'letter' | 'a4';
}

/** Adds the pages of a table and answers how many they are. Headings and feet come last, when all pages are known. */
export function addTable(doc: jsPDF, table: PrintedTable, { format }: ListPaper): number {
  doc.addPage(format, 'portrait');
  const first = doc.getNumberOfPages();
  const columnStyles = Object.fromEntries(
    table.columns.map(({ set = 'text', widthMm }, i) => [
      i,
      {
        font: set === 'text' ? TEXT_FONT : MONO_FONT,
        fontStyle: set === 'text' ? STYLE[400] : STYLE[500],
        halign: set === 'figure' ? ('right' as const) : ('left' as const),
        ...(widthMm !== undefined && { cellWidth: widthMm }),
      },
    ]),
  );
  autoTable(doc, {
    head: [
      table.columns.map(({ heading, set }) => ({
        content: heading,
        styles: { halign: set === 'figure' ? 'right' : 'left' },
      })),
    ],
    body: table.rows.map((row) => [...row]),
    ...(table.total && { foot: [[...table.total]], showFoot: 'lastPage' as const }),
    startY: 32,
    margin: { top: 32, right: 12, bottom: 20, left: 20 },
    theme: 'plain',
    rowPageBreak: 'avoid',
    styles: {
      fontSize: 8,
      cellPadding: { top: 1, bottom: 1, left: 1, right: 1.5 },
      textColor: 0,
      lineColor: 150,
      overflow: 'linebreak',
    },
    bodyStyles: { lineWidth: { bottom: 0.1 } },
    headStyles: {
      font: TEXT_FONT,
      fontStyle: STYLE[600],
      lineWidth: { bottom: 0.35, top: 0.35 },
      lineColor: 0,
      valign: 'bottom',
    },
    footStyles: { font: MONO_FONT, fontStyle: STYLE[700], lineWidth: { top: 0.35 }, lineColor: 0 },
    columnStyles,
  });
  return doc.getNumberOfPages() - first + 1;
}

export interface ListHead {
  readonly vessel: string;
  readonly drawingNumber: string;
  readonly revision: string;
  readonly inReview: boolean;
}

/** Title at the left, whose it is at the right; the caution and the page of all pages at the foot. */
export function finishTable(
  doc: jsPDF,
  table: PrintedTable,
  pages: { first: number; count: number; all: number },
  head: ListHead,
): void {
  for (let i = 0; i < pages.count; i++) {
    const number = pages.first + i;
    doc.setPage(number);
    const width = doc.internal.pageSize.getWidth();
    const height = doc.internal.pageSize.getHeight();
    const right = width - 12;
    doc.setTextColor(0).setDrawColor(0).setLineWidth(0.35);
    set(doc, TEXT_FONT, 600, 14).text(table.title, 20, 19);
    set(doc, TEXT_FONT, 400, 8).text(`${table.lead} Page ${i + 1} of ${pages.count}.`, 20, 25);
    set(doc, TEXT_FONT, 600, 9).text(head.vessel, right, 16, { align: 'right' });
    set(doc, MONO_FONT, 500, 8).text(
      [head.drawingNumber, head.revision].filter((part) => part !== '').join(', '),
      right,
      20.5,
      { align: 'right' },
    );
    if (head.inReview) set(doc, TEXT_FONT, 600, 9).text(NOT_FOR_BUILDING, right, 25, { align: 'right' });
    doc.line(20, height - 15, right, height - 15);
    set(doc, TEXT_FONT, 400, 6.5).text(doc.splitTextToSize(CAUTION, right - 48) as string[], 20, height - 11.5);
    set(doc, TEXT_FONT, 400, 8).text(`${number} of ${pages.all}`, right, height - 11, { align: 'right' });
  }
}

function set(doc: jsPDF, font: string, weight: number, size: number): jsPDF {
  return doc.setFont(font, 'normal', weight).setFontSize(size);
}
