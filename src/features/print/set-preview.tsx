import type { Analysis } from '#shared/model/analysis.ts';
import { sheetOf } from '#shared/model/defaults.ts';
import type { Design, Sheet } from '#shared/model/design.ts';
import { nameOfSheet, SheetPicture } from '#src/design/sheet-picture.tsx';
import { useShownTheme } from '#src/lib/reader-settings.ts';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { monoInk, paperInk, screenInk, type Ink } from '#symbols/ink.ts';
import type { IssueFacts } from '#symbols/sheet/title-fields.ts';

import type { PrintedList } from './printed-lists.ts';

const SCREEN_FACES = {
  text: "'Inter Variable', system-ui, sans-serif",
  monospace: "'Atkinson Hyperlegible Mono Variable', ui-monospace, monospace",
} as const;

/** The pages as they will lie on paper: white in every theme, but for night, where nothing may be white. */
export function SetPreview({
  design,
  sheets,
  lists,
  analysis,
  facts,
  ink,
}: {
  readonly design: Design;
  readonly sheets: readonly Sheet[];
  readonly lists: readonly PrintedList[];
  readonly analysis: Analysis | null;
  readonly facts: IssueFacts;
  readonly ink: 'colour' | 'black';
}) {
  // Nothing white in the dark: night shows the sheet as the canvas does, in red.
  const isNight = useShownTheme() === 'night';
  const paper: Ink = isNight
    ? { ...screenInk, colourCodes: true }
    : { ...(ink === 'black' ? monoInk : paperInk), ...SCREEN_FACES };
  const inReview = analysis === null || analysis.findings.some((f) => f.severity === 'must' && f.accepted !== true);
  if (sheets.length + lists.length === 0)
    return <EmptyState title="Nothing is ticked">Tick the sheets and lists that belong to the set.</EmptyState>;
  return (
    <div className="print-pages">
      {sheets.map((sheet, i) => (
        <figure key={sheet.id} className="print-page-sheet">
          <figcaption>
            <b>{i + 1}</b>
            <span>{nameOfSheet(sheet)}</span>
            <em>{sheetOf(sheet).paper}</em>
          </figcaption>
          <SheetPicture design={design} sheetId={sheet.id} facts={facts} inReview={inReview} ink={paper} />
        </figure>
      ))}
      {lists.map((list, i) => (
        <figure key={list.id} className="print-page-list">
          <figcaption>
            <b>{sheets.length + i + 1}</b>
            <span>{list.table.title}</span>
          </figcaption>
          <ListPicture list={list} vessel={design.vessel?.name ?? ''} />
        </figure>
      ))}
    </div>
  );
}

/** The first rows of a list, small: enough to see what it is. */
function ListPicture({ list, vessel }: { readonly list: PrintedList; readonly vessel: string }) {
  const { title, lead, columns, rows } = list.table;
  return (
    <div
      className="list-picture"
      role="img"
      aria-label={`${title}, ${rows.length} ${rows.length === 1 ? 'row' : 'rows'}`}
    >
      <div aria-hidden="true">
        <p className="list-title">
          {title}
          <span>{vessel}</span>
        </p>
        <p className="list-lead">{lead}</p>
        <table>
          <thead>
            <tr>
              {columns.map((column) => (
                <th key={column.heading}>{column.heading}</th>
              ))}
            </tr>
          </thead>
          <tbody>
            {rows.slice(0, 34).map((row, i) => (
              <tr key={i}>
                {row.map((cell, column) => (
                  <td key={column} className={columns[column]?.set === 'figure' ? 'r' : undefined}>
                    {cell}
                  </td>
                ))}
              </tr>
            ))}
          </tbody>
        </table>
      </div>
    </div>
  );
}
