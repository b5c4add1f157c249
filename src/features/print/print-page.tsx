import { useState } from 'react';
import { Link } from 'react-router';

import type { Revision } from '#shared/api/design.ts';
import type { VesselSummary } from '#shared/api/vessels.ts';
import { basisOf } from '#shared/model/defaults.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { nameOfSheet, sheetsInOrder } from '#src/design/sheet-picture.tsx';
import { Button } from '#src/ui/button.tsx';
import { Cell, PickCell } from '#src/ui/cell.tsx';
import { Check } from '#src/ui/check.tsx';
import { LongWork } from '#src/ui/long-work.tsx';

import { BeforePrinting } from './before-printing.tsx';
import { listsOf } from './printed-lists.ts';
import { SetPreview } from './set-preview.tsx';
import { fileNameOf, usePrinting } from './use-printing.ts';

/** The drawing set put together: which sheets and lists, on what paper, in what ink, and made into one PDF. */
export function PrintPage({
  vessel,
  myName,
  latest,
}: {
  readonly vessel: VesselSummary;
  readonly myName: string;
  /** The latest issued revision. */
  readonly latest: Revision | undefined;
}) {
  const design = useOpenDesign((open) => open.design);
  const analysis = useOpenDesign((open) => open.analysis);
  const seq = useOpenDesign((open) => open.seq);
  const basis = basisOf(design);
  // As long as nothing was changed since, what is printed is that revision.
  const issued = latest?.seq === seq ? latest : undefined;
  const [off, setOff] = useState<ReadonlySet<string>>(new Set());
  const [ink, setInk] = useState<'colour' | 'black'>('colour');
  const [listPaper, setListPaper] = useState<'letter' | 'a4'>(basis.units === 'us' ? 'letter' : 'a4');
  const printing = usePrinting();

  const sheets = sheetsInOrder(design);
  const lists = listsOf(design, analysis);
  const chosenSheets = sheets.filter((sheet) => !off.has(sheet.id));
  const chosenLists = lists.filter((list) => !off.has(list.id));
  const count = chosenSheets.length + chosenLists.length;
  const file = fileNameOf(design, issued?.letter ?? (latest === undefined ? null : `after-${latest.letter}`));
  const papers = [...new Set(chosenSheets.map((sheet) => sheet.paper ?? 'A4'))].join(', ');
  const facts = {
    legalOwner: vessel.shopName,
    created: myName,
    revision: issued?.letter ?? (latest === undefined ? undefined : `${latest.letter} +`),
    issued: issued?.issuedAt.slice(0, 10),
  };

  function tick(id: string, isOn: boolean) {
    const next = new Set(off);
    if (isOn) next.delete(id);
    else next.add(id);
    setOff(next);
  }

  return (
    <div className="print-page">
      <section className="print-side left" aria-labelledby="print-set">
        <h1 id="print-set">
          Drawing set<span>{`${count} of ${sheets.length + lists.length} parts`}</span>
        </h1>
        <ul className="print-set">
          {sheets.map((sheet) => (
            <li key={sheet.id} className={off.has(sheet.id) ? 'off' : undefined}>
              <Check checked={!off.has(sheet.id)} onChange={(isOn) => tick(sheet.id, isOn)}>
                {nameOfSheet(sheet)}
              </Check>
              <em>{sheet.paper ?? 'A4'}</em>
            </li>
          ))}
          {lists.map((list) => (
            <li key={list.id} className={off.has(list.id) ? 'off' : undefined}>
              <Check checked={!off.has(list.id)} onChange={(isOn) => tick(list.id, isOn)}>
                {list.table.title}
              </Check>
              <em>{listPaper === 'a4' ? 'A4' : 'letter'}</em>
            </li>
          ))}
        </ul>
        <h2>Paper</h2>
        <div className="cells two">
          <Cell caption="Drawings, as drawn">{papers || 'none'}</Cell>
          <PickCell
            caption="Lists"
            value={listPaper}
            choices={[
              { value: 'letter', title: 'Letter upright' },
              { value: 'a4', title: 'A4 upright' },
            ]}
            onPick={(value) => setListPaper(value === 'a4' ? 'a4' : 'letter')}
          />
        </div>
        <h2>Ink</h2>
        <div className="seg two" role="group" aria-label="Ink">
          <button type="button" aria-pressed={ink === 'colour'} onClick={() => setInk('colour')}>
            Colour
          </button>
          <button type="button" aria-pressed={ink === 'black'} onClick={() => setInk('black')}>
            Black only
          </button>
        </div>
        <p className="quiet print-note">Code letters of the colour stand at both ends of each run either way.</p>
      </section>

      <section className="print-table" aria-label="Preview" tabIndex={0}>
        <SetPreview
          design={design}
          sheets={chosenSheets}
          lists={chosenLists}
          analysis={analysis}
          facts={facts}
          ink={ink}
        />
      </section>

      <aside className="print-side right" aria-label="What will be made">
        <h2 className="first">What will be made</h2>
        <p className="print-big">
          {count} {count === 1 ? 'part' : 'parts'}
        </p>
        <p className="quiet print-note">
          {chosenSheets.length} {chosenSheets.length === 1 ? 'sheet' : 'sheets'}, {chosenLists.length}{' '}
          {chosenLists.length === 1 ? 'list' : 'lists'} behind them, in one file.
        </p>
        <div className="cells two">
          <Cell caption="Drawing number" mono>
            {design.vessel?.drawingNumber ?? 'none'}
          </Cell>
          <Cell caption="Revision">
            {latest === undefined ? 'none issued' : issued === undefined ? `after ${latest.letter}` : latest.letter}
          </Cell>
          <Cell caption="Lines and words">vector</Cell>
          <Cell caption="Ink">{ink === 'colour' ? 'colour' : 'black only'}</Cell>
          <Cell caption="File" mono className="wide">
            {file}
          </Cell>
        </div>
        <BeforePrinting vesselId={vessel.vesselId} />
        <div className="print-foot">
          {printing.state.is === 'making' ? (
            <LongWork at={printing.state.at} fraction={printing.state.fraction} onCancel={printing.cancel} />
          ) : (
            <Button
              look="go"
              wide
              off={count === 0}
              onClick={() =>
                void printing.make({
                  design,
                  analysis,
                  file,
                  options: {
                    sheetIds: chosenSheets.map((sheet) => sheet.id),
                    tables: chosenLists.map((list) => list.table),
                    listPaper,
                    ink,
                    facts,
                  },
                })
              }
            >
              Make the PDF
            </Button>
          )}
          <p className="quiet print-note" role="status">
            {printing.state.is === 'made' &&
              `${printing.state.file} is made, ${printing.state.size}. It lies where your downloads go.`}
            {printing.state.is === 'failed' && `The PDF could not be made. ${printing.state.says}`}
            {printing.state.is === 'idle' && count === 0 && 'Tick at least one part.'}
            {printing.state.is === 'idle' && count > 0 && 'It is made on this device, from the drawing as it stands.'}
          </p>
        </div>
      </aside>
      <footer className="strip">
        <span className="quiet">
          <Link to={`/vessels/${vessel.vesselId}/revisions`}>Issued revisions</Link>
        </span>
        <span className="quiet caution-end">
          A design aid, not a certificate. AC power and battery banks can kill and start fires. Local codes and a
          qualified person have the last word.
        </span>
      </footer>
    </div>
  );
}
