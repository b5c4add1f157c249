import type { ReactNode } from 'react';
import { Link } from 'react-router';

import type { Finding } from '#shared/model/analysis.ts';
import type { Accepted, Design } from '#shared/model/design.ts';
import { Button } from '#src/ui/button.tsx';
import { Severity } from '#src/ui/severity.tsx';
import { When } from '#src/ui/when.tsx';

import { Figures } from './figures.tsx';
import { addressOnSheet, placeOfFinding } from './finding-places.ts';

/** One finding of the list: what, by how much, by which rule, and what mends it. */
export function FindingLine({
  vesselId,
  design,
  finding,
  accepted,
  isChosen,
  mayEdit,
  onChoose,
  onMend,
  onOpenAgain,
  children,
}: {
  readonly vesselId: string;
  readonly design: Design;
  readonly finding: Finding;
  readonly accepted: Accepted | undefined;
  readonly isChosen: boolean;
  readonly mayEdit: boolean;
  readonly onChoose: () => void;
  readonly onMend: (remedy: number) => void;
  readonly onOpenAgain: () => void;
  /** Its particulars, where they stand in the list itself: on a phone. */
  readonly children?: ReactNode;
}) {
  const place = placeOfFinding(design, finding);
  const shown = addressOnSheet(vesselId, finding, place);
  return (
    <li className={isChosen ? 'finding on' : 'finding'} id={`finding-${finding.id}`} onClick={onChoose}>
      <Severity of={finding.severity} />
      <button
        type="button"
        className="mono finding-mark"
        aria-pressed={isChosen}
        aria-label={`${place.mark}: particulars`}
        onClick={onChoose}
      >
        {place.mark}
      </button>
      <div className="finding-text">
        <p>
          <Figures message={finding.message} />
        </p>
        <p className="finding-source">
          <span className="mono">{finding.rule}</span>
          <span>
            {finding.source.clause === '' ? finding.source.title : `${finding.source.title}, ${finding.source.clause}`}
          </span>
          {shown === null ? (
            <span>{place.sheet}</span>
          ) : (
            <Link to={shown} onClick={(event) => event.stopPropagation()}>
              Show it<span className="visually-hidden">: {place.mark}</span> on {place.sheet}
            </Link>
          )}
        </p>
        {accepted !== undefined && (
          <p className="finding-why">
            <b>{accepted.by}</b>, <When at={accepted.at} />: {accepted.reason}{' '}
            {mayEdit && (
              <Button look="plain" onClick={onOpenAgain}>
                Open again
              </Button>
            )}
          </p>
        )}
        {accepted === undefined && finding.remedies.length > 0 && mayEdit && (
          <div className="finding-remedies">
            {finding.remedies.map((remedy, i) => (
              <Button
                key={remedy.title}
                look={isChosen && i === 0 ? 'go' : 'normal'}
                onClick={(event) => {
                  event.stopPropagation();
                  onMend(i);
                }}
              >
                {remedy.title}
              </Button>
            ))}
          </div>
        )}
        {accepted === undefined && finding.remedies.length === 0 && (
          <p className="quiet">No remedy by machine. Change the drawing, or accept it with a reason.</p>
        )}
        {children}
      </div>
    </li>
  );
}
