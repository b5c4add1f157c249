import { useState, type FormEvent } from 'react';

import type { Analysis, Finding } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';
import { formatA } from '#shared/units/current.ts';
import { Button } from '#src/ui/button.tsx';
import { Cell } from '#src/ui/cell.tsx';
import { Severity } from '#src/ui/severity.tsx';

import { AmpacityChain } from './ampacity-chain.tsx';
import { DropSteps } from './drop-steps.tsx';
import { Figures } from './figures.tsx';
import { nameOfMode, placeOfFinding } from './finding-places.ts';
import { SubjectPicture } from './subject-picture.tsx';

const LEAST_REASON = 10;

/** The chosen finding at length: its piece of the sheet, the sum behind it, and accepting it with a reason. */
export function FindingParticulars({
  design,
  analysis,
  finding,
  mayEdit,
  onAccept,
  withHead = true,
}: {
  readonly design: Design;
  readonly analysis: Analysis;
  readonly finding: Finding;
  readonly mayEdit: boolean;
  readonly onAccept: (reason: string) => void;
  readonly withHead?: boolean;
}) {
  const place = placeOfFinding(design, finding);
  const { run: runId, device: deviceId } = finding.subject;
  const run = runId === undefined ? undefined : design.runs[runId];
  const analysed = runId === undefined ? undefined : analysis.runs[runId];
  const drop = analysed?.drop ?? dropOfLoad(analysis, deviceId);
  const fault = deviceId === undefined ? undefined : analysis.faults[deviceId];
  const mode = analysed?.governingMode ?? null;

  return (
    <>
      {withHead && (
        <>
          <h2>
            {place.mark}
            <Severity of={finding.severity} />
          </h2>
          <p className="finding-message">
            <Figures message={finding.message} />
          </p>
        </>
      )}
      {place.sheetId !== null && (runId !== undefined || deviceId !== undefined) && (
        <SubjectPicture
          design={design}
          sheetId={place.sheetId}
          runId={runId}
          deviceId={deviceId}
          says={`${place.mark} on ${place.sheet}`}
        />
      )}
      {run !== undefined && analysed !== undefined && (
        <AmpacityChain run={run} analysed={analysed} mode={mode === null ? null : nameOfMode(design, mode)} />
      )}
      {drop !== null && drop !== undefined && (
        <DropSteps design={design} analysis={analysis} drop={drop} runId={runId} />
      )}
      {fault !== undefined && (
        <>
          <h3>Fault level</h3>
          <p className="fault-basis quiet">{fault.basis}</p>
          <div className="cells three">
            <Cell caption="Greatest through it">{formatA(fault.greatestA)}</Cell>
            <Cell caption="Least it must clear">{formatA(fault.leastA)}</Cell>
            <Cell caption="Where it stands">{formatA(fault.nodeA)}</Cell>
          </div>
        </>
      )}
      {mayEdit && finding.accepted !== true && (
        <AcceptForm key={finding.id} isMust={finding.severity === 'must'} onAccept={onAccept} />
      )}
    </>
  );
}

function AcceptForm({ isMust, onAccept }: { readonly isMust: boolean; readonly onAccept: (reason: string) => void }) {
  const [reason, setReason] = useState('');
  const [wrong, setWrong] = useState(false);
  const least = isMust ? LEAST_REASON : 1;

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    const isWrong = reason.trim().length < least;
    setWrong(isWrong);
    if (!isWrong) onAccept(reason.trim());
  }

  return (
    <form className="accept" onSubmit={handleSubmit}>
      <label className={wrong ? 'cell edit alone wrong' : 'cell edit alone'}>
        <small>Accept as it is, because</small>
        <input
          className="in"
          value={reason}
          maxLength={500}
          aria-invalid={wrong || undefined}
          placeholder={
            isMust ? 'a must-fix needs a reason a surveyor can follow' : 'the reason, for whoever reads it next'
          }
          onChange={(event) => {
            setReason(event.currentTarget.value);
            setWrong(false);
          }}
        />
        {wrong && (
          <span className="said" role="alert">
            {isMust ? 'Write a reason that a surveyor can follow.' : 'Write a reason.'}
          </span>
        )}
      </label>
      <Button type="submit">Accept</Button>
    </form>
  );
}

/** The drop of a load stands with the runs of its path: that of the path's first run will do, they are one. */
function dropOfLoad(analysis: Analysis, loadId: string | undefined) {
  if (loadId === undefined) return null;
  return Object.values(analysis.runs).find((run) => run.drop?.worstLoad === loadId)?.drop ?? null;
}
