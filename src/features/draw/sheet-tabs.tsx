import { useState } from 'react';
import { v7 as uuidv7 } from 'uuid';

import { addSheet } from '#shared/edits/sheets.ts';
import { sheetOf } from '#shared/model/defaults.ts';
import type { Sheet } from '#shared/model/design.ts';
import { useCanvas, useCanvasStore } from '#src/canvas/canvas-store.ts';
import { useOpenDesign } from '#src/design/open-design.ts';

import { useEdit, useSetField } from './use-edit.ts';

/** The sheets along the lower edge of the paper; a double click renames one. */
export function SheetTabs() {
  const sheets = useOpenDesign((open) => open.design.sheets);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const current = useCanvas((canvas) => canvas.sheetId);
  const unitsPerPixel = useCanvas((canvas) => canvas.unitsPerPixel);
  const canvas = useCanvasStore();
  const edit = useEdit();
  const [renaming, setRenaming] = useState<string | null>(null);
  const inOrder = Object.values(sheets).toSorted((a, b) => sheetOf(a).number - sheetOf(b).number);

  function add() {
    const like = sheets[current];
    const sheetId = uuidv7();
    edit((design) =>
      addSheet(design, { title: '', paper: like?.paper, orientation: like?.orientation }, () => sheetId),
    );
    canvas.getState().openSheet(sheetId);
    setRenaming(sheetId);
  }

  return (
    <div className="sheet-tabs">
      <nav className="tabs" aria-label="Sheets">
        {inOrder.map((sheet) =>
          renaming === sheet.id ? (
            <RenameSheet key={sheet.id} sheet={sheet} onDone={() => setRenaming(null)} />
          ) : (
            <button
              key={sheet.id}
              type="button"
              aria-current={sheet.id === current ? 'page' : undefined}
              onClick={() => canvas.getState().openSheet(sheet.id)}
              onDoubleClick={() => mayEdit && setRenaming(sheet.id)}
            >
              {nameSheet(sheet)}
            </button>
          ),
        )}
        {mayEdit && (
          <button type="button" className="add-sheet" onClick={add}>
            Add a sheet
          </button>
        )}
      </nav>
      <div className="view">
        <button type="button" onClick={() => canvas.getState().fit()} title="Show the whole sheet, Shift 1">
          Fit
        </button>
        <span className="num">{Math.round(100 / unitsPerPixel)} %</span>
      </div>
    </div>
  );
}

export function nameSheet(sheet: Sheet): string {
  const { number, title } = sheetOf(sheet);
  return title === '' ? `${number} Untitled` : `${number} ${title}`;
}

function RenameSheet({ sheet, onDone }: { readonly sheet: Sheet; readonly onDone: () => void }) {
  const setField = useSetField();
  const [title, setTitle] = useState(sheet.title ?? '');
  function keep() {
    setField(['sheets', sheet.id, 'title'], title.trim());
    onDone();
  }
  return (
    <input
      className="rename-sheet"
      aria-label="Title of the sheet"
      autoFocus
      value={title}
      placeholder="Title"
      onChange={(event) => setTitle(event.currentTarget.value)}
      onBlur={keep}
      onKeyDown={(event) => {
        if (event.key === 'Enter') keep();
        if (event.key === 'Escape') onDone();
      }}
    />
  );
}
