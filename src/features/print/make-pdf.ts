import { jsPDF } from 'jspdf';
import { createElement } from 'react';
import { flushSync } from 'react-dom';
import { createRoot } from 'react-dom/client';
import { svg2pdf } from 'svg2pdf.js';

import { layoutSheet } from '#shared/layout/layout-sheet.ts';
import { paperSize, paperSizeMm } from '#shared/layout/paper.ts';
import type { Analysis } from '#shared/model/analysis.ts';
import type { Design, EntityId, Sheet } from '#shared/model/design.ts';
import { monoInk, paperInk, type Ink } from '#symbols/ink.ts';
import { SheetDrawing } from '#symbols/sheet/sheet-drawing.tsx';
import { titleFieldsOf, type IssueFacts } from '#symbols/sheet/title-fields.ts';

import { embedFonts, loadFonts, unloadFonts } from './pdf-fonts.ts';
import { addTable, finishTable, type ListPaper, type PrintedTable } from './pdf-table.ts';

export interface DrawingSetOptions {
  /** In the order of their numbers when left out: all of them. */
  readonly sheetIds?: readonly EntityId[];
  /** Lists behind the sheets, in this order. */
  readonly tables: readonly PrintedTable[];
  readonly listPaper: ListPaper['format'];
  readonly ink: 'colour' | 'black';
  readonly facts: IssueFacts;
  readonly onProgress?: (done: number, all: number, now: string) => void;
  readonly signal?: AbortSignal;
}

/**
 * The drawing set as one PDF, made in the reader's own browser: every sheet on its true paper in lines and words,
 * never pixels, and its lists behind it. Heavy: import it when someone prints.
 */
export async function makeDrawingSet(
  design: Design,
  analysis: Analysis | null,
  options: DrawingSetOptions,
): Promise<Blob> {
  const sheets = (options.sheetIds ?? sheetsInOrder(design).map(({ id }) => id)).flatMap(
    (id) => design.sheets[id] ?? [],
  );
  const steps = sheets.length + options.tables.length;
  const inReview = hasMustFix(analysis);
  const fonts = await loadFonts();
  try {
    const doc = new jsPDF({ unit: 'mm', format: 'a4', compress: true, putOnlyUsedFonts: true });
    embedFonts(doc, fonts);
    doc.setProperties({
      title: `${design.vessel?.name ?? 'Drawing set'} ${options.facts.revision ?? ''}`.trim(),
      creator: 'Ampwright',
    });
    for (const [i, sheet] of sheets.entries()) {
      options.signal?.throwIfAborted();
      options.onProgress?.(i, steps, `Sheet ${sheet.number ?? 1}`);
      await addSheet(doc, design, sheet, options.ink === 'black' ? monoInk : paperInk, options.facts, inReview);
      await breathe();
    }
    const lists: { table: PrintedTable; first: number; count: number }[] = [];
    for (const [i, table] of options.tables.entries()) {
      options.signal?.throwIfAborted();
      options.onProgress?.(sheets.length + i, steps, table.title);
      const count = addTable(doc, table, { format: options.listPaper });
      lists.push({ table, first: doc.getNumberOfPages() - count + 1, count });
      await breathe();
    }
    // the page a document is born with; a set without any page keeps it
    if (steps > 0) doc.deletePage(1);
    const all = doc.getNumberOfPages();
    for (const { table, first, count } of lists) {
      finishTable(
        doc,
        table,
        { first: first - 1, count, all },
        {
          vessel: design.vessel?.name ?? '',
          drawingNumber: design.vessel?.drawingNumber ?? '',
          revision: options.facts.revision === undefined ? '' : `revision ${options.facts.revision}`,
          inReview,
        },
      );
    }
    options.onProgress?.(steps, steps, 'Done');
    return doc.output('blob');
  } finally {
    unloadFonts(fonts);
  }
}

/** Something that must be mended and that nobody has accepted with a reason. Not checked is not proved. */
export function hasMustFix(analysis: Analysis | null): boolean {
  return (
    analysis === null || analysis.findings.some(({ severity, accepted }) => severity === 'must' && accepted !== true)
  );
}

export function sheetsInOrder(design: Design): Sheet[] {
  return Object.values(design.sheets).sort((a, b) => (a.number ?? 1) - (b.number ?? 1) || (a.id < b.id ? -1 : 1));
}

async function addSheet(
  doc: jsPDF,
  design: Design,
  sheet: Sheet,
  ink: Ink,
  facts: IssueFacts,
  inReview: boolean,
): Promise<void> {
  const mm = paperSizeMm(sheet);
  const units = paperSize(sheet);
  doc.addPage([mm.width, mm.height], mm.width > mm.height ? 'landscape' : 'portrait');
  const stage = document.createElement('div');
  stage.setAttribute('aria-hidden', 'true');
  // out of sight, but in the page: text is measured there
  stage.style.cssText = 'position:fixed;left:-20000px;top:0;visibility:hidden';
  document.body.append(stage);
  const root = createRoot(stage);
  try {
    const drawing = createElement(SheetDrawing, {
      design,
      sheetId: sheet.id,
      layout: layoutSheet(design, sheet.id),
      ink,
      titleBlock: titleFieldsOf(design, sheet.id, facts),
      inReview,
    });
    const viewBox = `0 0 ${units.width} ${units.height}`;
    flushSync(() => root.render(createElement('svg', { viewBox, width: units.width, height: units.height }, drawing)));
    const svg = stage.querySelector('svg');
    if (svg === null) throw new Error('The sheet could not be drawn.');
    await svg2pdf(svg, doc, { x: 0, y: 0, width: mm.width, height: mm.height });
  } finally {
    root.unmount();
    stage.remove();
  }
}

/** Lets the page show how far it is. */
function breathe(): Promise<void> {
  return new Promise((resolve) => setTimeout(resolve, 0));
}
