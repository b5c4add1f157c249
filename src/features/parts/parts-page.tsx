import { useState } from 'react';
import { Link, useSearchParams } from 'react-router';

import { exportParts } from '#shared/api/design.ts';
import type { PartsLine } from '#shared/model/analysis.ts';
import { basisOf } from '#shared/model/defaults.ts';
import { formatLength } from '#shared/units/length.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { addressOf } from '#src/lib/call.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import { Cell } from '#src/ui/cell.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { FindField } from '#src/ui/find-field.tsx';
import { Severity } from '#src/ui/severity.tsx';
import { useIsNarrow } from '#src/ui/use-is-narrow.ts';

import { PartParticulars } from './part-particulars.tsx';
import { groupParts, isCable, marksOf } from './parts-groups.ts';
import { PartsTable } from './parts-table.tsx';

/** Everything to buy for what is drawn, each line with what it is for. */
export function PartsPage({ vesselId }: { readonly vesselId: string }) {
  const design = useOpenDesign((open) => open.design);
  const analysis = useOpenDesign((open) => open.analysis);
  const units = useUnits(basisOf(design).units);
  const isNarrow = useIsNarrow(1179);
  const [search, setSearch] = useSearchParams();
  const [find, setFind] = useState('');
  const lines = analysis?.parts ?? [];
  const words = find.toLowerCase().split(/\s+/).filter(Boolean);
  const shown = lines.filter((line) => {
    const text = `${line.part} ${line.rating} ${line.group} ${marksOf(design, line).join(' ')}`.toLowerCase();
    return words.every((word) => text.includes(word));
  });
  const chosen = shown.find((line) => line.id === search.get('part')) ?? (isNarrow ? undefined : shown[0]);
  const choose = (line: PartsLine) =>
    setSearch(line.id === chosen?.id && isNarrow ? {} : { part: line.id }, { replace: true });
  const particulars = chosen !== undefined && <PartParticulars vesselId={vesselId} line={chosen} />;
  const withoutLength = Object.values(design.runs).filter(
    (run) => run.lengthM === undefined && run.link !== true && run.work !== 'existing' && run.work !== 'remove',
  );

  return (
    <>
      <div className="parts-page">
        <section className="parts-list" aria-label="Parts">
          <div className="parts-top">
            <h1 className="visually-hidden">Parts</h1>
            <FindField label="Find a part or a mark" value={find} onChange={setFind} />
            <a className="btn end-of-row" href={addressOf(exportParts, { vesselId })} download>
              CSV
            </a>
          </div>
          <Sums lines={lines} waiting={analysis === null} units={units} />
          {withoutLength.length > 0 && (
            <p className="parts-said">
              <Severity of="should">
                {withoutLength.length === 1
                  ? '1 run without a length'
                  : `${withoutLength.length} runs without a length`}
              </Severity>{' '}
              {withoutLength
                .slice(0, 6)
                .map((run) => run.mark ?? 'run')
                .join(', ')}
              {withoutLength.length > 6 && ' and more'}: no cable is bought for{' '}
              {withoutLength.length === 1 ? 'it' : 'them'} yet.
            </p>
          )}
          {analysis !== null && lines.length === 0 && (
            <EmptyState
              title="Nothing to buy yet"
              does={
                <Link className="btn go" to={`/vessels/${vesselId}/draw`}>
                  To the drawing
                </Link>
              }
            >
              The list is made from the drawing: each new device, the cable of each run that has a length, and its lugs.
            </EmptyState>
          )}
          {lines.length > 0 && shown.length === 0 && <EmptyState title={`No part has "${find}" in it`} />}
          {shown.length > 0 && (
            <PartsTable
              groups={groupParts(shown)}
              design={design}
              units={units}
              chosenId={chosen?.id}
              onChoose={choose}
              particulars={isNarrow ? particulars : null}
            />
          )}
        </section>
        {!isNarrow && (
          <aside
            className="parts-particulars"
            aria-label={chosen === undefined ? 'Particulars' : `Particulars of ${chosen.part}`}
          >
            {particulars || <p className="quiet">The line that is chosen stands here with where it goes.</p>}
          </aside>
        )}
      </div>
      <footer className="strip">
        <span className="quiet">New work only; what stays on board is not bought.</span>
        <span className="quiet caution-end">
          A design aid, not a certificate. AC power and battery banks can kill and start fires. Local codes and a
          qualified person have the last word.
        </span>
      </footer>
    </>
  );
}

function Sums({
  lines,
  waiting,
  units,
}: {
  readonly lines: readonly PartsLine[];
  readonly waiting: boolean;
  readonly units: 'us' | 'metric';
}) {
  const cableM = lines.filter(isCable).reduce((sum, line) => sum + line.quantity, 0);
  const pieces = lines.filter((line) => line.unit === 'each').reduce((sum, line) => sum + line.quantity, 0);
  return (
    <div className="cells parts-sums">
      <Cell caption="Lines" waiting={waiting}>
        {lines.length}
      </Cell>
      <Cell caption="Pieces" waiting={waiting}>
        {pieces}
      </Cell>
      <Cell caption="Cable, all sizes" waiting={waiting}>
        {formatLength(cableM, units)}
      </Cell>
      <Cell caption="Sizes and colours of cable" waiting={waiting}>
        {lines.filter(isCable).length}
      </Cell>
    </div>
  );
}
