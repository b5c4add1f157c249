import { deleteSheet } from '#shared/edits/sheets.ts';
import { setField as planField } from '#shared/edits/set-field.ts';
import { basisOf, sheetOf } from '#shared/model/defaults.ts';
import { ORIENTATIONS, PAPERS } from '#shared/model/design.ts';
import { formatLength } from '#shared/units/length.ts';
import { useCanvas, useCanvasStore } from '#src/canvas/canvas-store.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import { Button } from '#src/ui/button.tsx';
import { Cell, EditCell, PickCell } from '#src/ui/cell.tsx';

import { readCount } from './readings.ts';
import { useEdit, useSetField } from './use-edit.ts';

/** Nothing is selected: the sheet's own particulars, and the way on while it is blank. */
export function SheetParticulars() {
  const design = useOpenDesign((open) => open.design);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const sheetId = useCanvas((canvas) => canvas.sheetId);
  const canvas = useCanvasStore();
  const units = useUnits(basisOf(design).units);
  const setField = useSetField();
  const edit = useEdit();
  const sheet = design.sheets[sheetId];
  if (sheet === undefined) return null;
  const full = sheetOf(sheet);
  const devices = Object.values(design.devices).filter((device) => device.sheetId === sheetId);
  const onSheet = new Set(devices.map(({ id }) => id));
  const runs = Object.values(design.runs).filter((run) => onSheet.has(run.from.device) || onSheet.has(run.to.device));
  const unknown = runs.filter((run) => run.lengthM === undefined && run.link !== true).length;
  const lengthM = runs.reduce((sum, run) => sum + (run.lengthM ?? 0), 0);
  const isOnly = Object.keys(design.sheets).length === 1;
  const path = (key: string) => ['sheets', sheetId, key];

  function takeOut() {
    const left = Object.keys(design.sheets).find((id) => id !== sheetId);
    if (left === undefined) return;
    canvas.getState().openSheet(left);
    edit((now) => deleteSheet(now, sheetId));
  }

  return (
    <>
      <h2 className="words">Sheet {full.number}</h2>
      <p className="lead quiet">{full.title === '' ? 'Untitled' : full.title}</p>
      {mayEdit ? (
        <div className="cells six">
          <EditCell
            className="span-4"
            caption="Title"
            value={full.title}
            read={(text) => ({ ok: true, value: text.trim() })}
            onKeep={(title) => void setField(path('title'), title)}
          />
          <EditCell
            className="span-2"
            caption="Number"
            inputMode="numeric"
            value={String(full.number)}
            read={(text) => {
              const reading = readCount(text);
              if (!reading.ok) return reading;
              const refused = planField(design, path('number'), reading.value).refused;
              return refused === undefined ? reading : { ok: false, says: refused };
            }}
            onKeep={(number) => void setField(path('number'), number)}
          />
          <PickCell
            className="span-3"
            caption="Paper"
            value={full.paper}
            choices={PAPERS.map((paper) => ({ value: paper, title: paper }))}
            onPick={(paper) => void setField(path('paper'), paper)}
          />
          <PickCell
            className="span-3"
            caption="Orientation"
            value={full.orientation}
            choices={ORIENTATIONS.map((way) => ({ value: way, title: way }))}
            onPick={(way) => void setField(path('orientation'), way)}
          />
        </div>
      ) : (
        <div className="cells two">
          <Cell caption="Paper">{full.paper}</Cell>
          <Cell caption="Orientation">{full.orientation}</Cell>
        </div>
      )}
      <h3>On this sheet</h3>
      <div className="cells three">
        <Cell caption="Devices">{devices.length}</Cell>
        <Cell caption="Runs">{runs.length}</Cell>
        <Cell caption="Length">{formatLength(lengthM, units)}</Cell>
      </div>
      {unknown > 0 && (
        <p className="quiet gap">
          {unknown === 1 ? 'One run has' : `${unknown} runs have`} no length yet. Type them in the ledger below.
        </p>
      )}
      {devices.length === 0 && (
        <p className="gap">
          {mayEdit
            ? 'This sheet is blank. Take a battery out of the locker, then the fuse that stands next to it.'
            : 'Nothing is drawn on this sheet yet.'}
        </p>
      )}
      {mayEdit && !isOnly && (
        <p className="gap">
          <Button onClick={takeOut}>Delete this sheet</Button>
        </p>
      )}
    </>
  );
}
