import { useEffect, useState } from 'react';
import { Link, useSearchParams } from 'react-router';

import { acceptFinding, withdrawAcceptance } from '#shared/edits/accept-finding.ts';
import type { Finding } from '#shared/model/analysis.ts';
import { formatA } from '#shared/units/current.ts';
import { useOpenDesign, useOpenDesignStore } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { Cell } from '#src/ui/cell.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { Severity, SeverityShape } from '#src/ui/severity.tsx';
import { useIsNarrow } from '#src/ui/use-is-narrow.ts';

import { FindingFilters, isShown, NOTHING_HIDDEN } from './finding-filters.tsx';
import { FindingLine } from './finding-line.tsx';
import { FindingParticulars } from './finding-particulars.tsx';
import { addressOnSheet, bankCurrentA, nameOfMode, placeOfFinding } from './finding-places.ts';

/** All that the check says, worst first, with what mends it. */
export function FindingsPage({ vesselId, myName }: { readonly vesselId: string; readonly myName: string }) {
  const store = useOpenDesignStore();
  const design = useOpenDesign((open) => open.design);
  const analysis = useOpenDesign((open) => open.analysis);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const [search, setSearch] = useSearchParams();
  const [hidden, setHidden] = useState(NOTHING_HIDDEN);
  const isNarrow = useIsNarrow(1179);
  const [areFiltersOpen, setFiltersOpen] = useState(false);

  const findings = analysis?.findings ?? [];
  const shown = findings.filter((finding) => isShown(design, finding, hidden));
  const open = shown.filter((finding) => finding.accepted !== true);
  const accepted = shown.filter((finding) => finding.accepted === true);
  const chosen = shown.find((finding) => finding.id === search.get('finding')) ?? (isNarrow ? undefined : shown[0]);

  const choose = (finding: Finding | undefined) => {
    if (finding !== undefined) setSearch({ finding: finding.id }, { replace: true });
  };
  useEffect(() => {
    function handleKey(event: KeyboardEvent) {
      if (event.key !== 'F8' || shown.length === 0) return;
      event.preventDefault();
      const at = shown.findIndex((finding) => finding.id === chosen?.id);
      const next = shown[(at + (event.shiftKey ? shown.length - 1 : 1)) % shown.length]!;
      setSearch({ finding: next.id }, { replace: true });
      document.getElementById(`finding-${next.id}`)?.scrollIntoView({ block: 'nearest' });
    }
    document.addEventListener('keydown', handleKey);
    return () => document.removeEventListener('keydown', handleKey);
  });

  function mend(finding: Finding, remedy: number) {
    const chosenRemedy = finding.remedies[remedy];
    if (chosenRemedy === undefined) return;
    const { mark } = placeOfFinding(design, finding);
    store.getState().change(`${mark}: ${chosenRemedy.title}`.slice(0, 200), chosenRemedy.patch);
  }
  function accept(finding: Finding, reason: string) {
    const edit = acceptFinding(finding.id, { reason, by: myName, at: new Date().toISOString() });
    store.getState().change(edit.label, edit.patches);
  }
  function openAgain(finding: Finding) {
    const { design: now, change } = store.getState();
    const edit = withdrawAcceptance(now, finding.id);
    change(edit.label, edit.patches);
  }

  const lineOf = (finding: Finding) => (
    <FindingLine
      key={finding.id}
      vesselId={vesselId}
      design={design}
      finding={finding}
      accepted={design.accepted?.[finding.id]}
      isChosen={finding.id === chosen?.id}
      mayEdit={mayEdit}
      onChoose={() => choose(finding)}
      onMend={(remedy) => mend(finding, remedy)}
      onOpenAgain={() => openAgain(finding)}
    >
      {isNarrow && finding.id === chosen?.id && analysis !== null && (
        <div className="finding-inline">
          <FindingParticulars
            withHead={false}
            design={design}
            analysis={analysis}
            finding={finding}
            mayEdit={mayEdit}
            onAccept={(reason) => accept(finding, reason)}
          />
        </div>
      )}
    </FindingLine>
  );

  const filters = <FindingFilters design={design} findings={findings} hidden={hidden} onChange={setHidden} />;
  return (
    <>
      <div className="findings">
        {!isNarrow && (
          <aside className="findings-left" aria-label="Filters">
            {filters}
          </aside>
        )}
        <section className="findings-list" aria-label="Findings">
          <div className="findings-lead">
            <h1>{sayHead(analysis === null ? null : findings)}</h1>
            <span className="quiet">{sayMusts(findings)}</span>
          </div>
          <Modes chosen={chosen} />
          {isNarrow && (
            <details
              className="findings-filters"
              open={areFiltersOpen}
              onToggle={(event) => setFiltersOpen(event.currentTarget.open)}
            >
              <summary>
                Filters{shown.length === findings.length ? '' : `: ${shown.length} of ${findings.length} shown`}
              </summary>
              {filters}
            </details>
          )}
          {analysis !== null && findings.length === 0 && (
            <NoFindings vesselId={vesselId} runs={Object.keys(design.runs).length} />
          )}
          {findings.length > 0 && shown.length === 0 && (
            <EmptyState
              title="The filters hide them all"
              does={<Button onClick={() => setHidden(NOTHING_HIDDEN)}>Show all {findings.length}</Button>}
            />
          )}
          {open.length > 0 && (
            <>
              <h2 className="group-head">
                Open, {open.length}
                <span className="quiet">worst first</span>
                <Button
                  look="plain"
                  className="end-of-row"
                  kbd="F8"
                  onClick={() => choose(shown[(shown.findIndex((f) => f.id === chosen?.id) + 1) % shown.length])}
                >
                  Next
                </Button>
              </h2>
              <ol>{open.map(lineOf)}</ol>
            </>
          )}
          {accepted.length > 0 && (
            <>
              <h2 className="group-head">Accepted with a reason, {accepted.length}</h2>
              <ol>{accepted.map(lineOf)}</ol>
            </>
          )}
        </section>
        {!isNarrow && (
          <aside
            className="findings-particulars"
            aria-label={chosen === undefined ? 'Particulars' : `Particulars of ${placeOfFinding(design, chosen).mark}`}
          >
            {chosen === undefined || analysis === null ? (
              <p className="quiet">The finding that is chosen stands here with the sum behind it.</p>
            ) : (
              <FindingParticulars
                design={design}
                analysis={analysis}
                finding={chosen}
                mayEdit={mayEdit}
                onAccept={(reason) => accept(chosen, reason)}
              />
            )}
          </aside>
        )}
      </div>
      <FindingsStrip vesselId={vesselId} findings={analysis === null ? null : findings} chosen={chosen} />
    </>
  );
}

function Modes({ chosen }: { readonly chosen: Finding | undefined }) {
  const design = useOpenDesign((open) => open.design);
  const analysis = useOpenDesign((open) => open.analysis);
  const tookMs = useOpenDesign((open) => open.checkedInMs);
  if (analysis === null) return <p className="findings-said">Checking the drawing.</p>;
  const ids = Object.keys(analysis.modes);
  const ofChosen = chosen?.mode ?? analysis.runs[chosen?.subject.run ?? '']?.governingMode ?? undefined;
  return (
    <>
      <div className="cells findings-modes" role="group" aria-label="Operating modes solved">
        {ids.map((id) => {
          const bankA = bankCurrentA(design, analysis, id);
          return (
            <Cell key={id} caption={nameOfMode(design, id)} on={id === ofChosen}>
              {bankA > 0.005 ? '+' : ''}
              {formatA(Math.abs(bankA))} {analysis.modes[id]?.converged === false && <SeverityShape of="must" />}
            </Cell>
          );
        })}
      </div>
      <p className="findings-said">
        {ids.length} modes solved on {Object.keys(design.devices).length} devices and {Object.keys(design.runs).length}{' '}
        runs
        {tookMs === null ? '' : `, ${Math.max(1, Math.round(tookMs))} ms`}. Current of all batteries in each; + is
        charge. Octagon: the mode cannot be held.
      </p>
    </>
  );
}

function NoFindings({ vesselId, runs }: { readonly vesselId: string; readonly runs: number }) {
  if (runs === 0) {
    return (
      <EmptyState
        title="Nothing is drawn yet"
        does={
          <Link className="btn go" to={`/vessels/${vesselId}/draw`}>
            To the drawing
          </Link>
        }
      >
        Place devices and wire their terminals; the check runs as you draw, and what it says stands here.
      </EmptyState>
    );
  }
  return (
    <EmptyState title="The check found nothing">
      Every rule it knows was held against every device and run. It does not know what is not drawn.
    </EmptyState>
  );
}

function FindingsStrip({
  vesselId,
  findings,
  chosen,
}: {
  readonly vesselId: string;
  /** Null until the check has answered: nothing is said to be free of findings before. */
  readonly findings: readonly Finding[] | null;
  readonly chosen: Finding | undefined;
}) {
  const design = useOpenDesign((open) => open.design);
  const counts = (['must', 'should', 'note'] as const).map((severity) => ({
    severity,
    n: (findings ?? []).filter((finding) => finding.severity === severity && finding.accepted !== true).length,
  }));
  const place = chosen === undefined ? undefined : placeOfFinding(design, chosen);
  const shown = chosen === undefined || place === undefined ? null : addressOnSheet(vesselId, chosen, place);
  return (
    <footer className="strip">
      {findings === null && <span className="quiet">Checking</span>}
      {(findings === null ? [] : counts).map(({ severity, n }) => (
        <Severity key={severity} of={severity}>
          {n} {{ must: 'must fix', should: 'should fix', note: n === 1 ? 'note' : 'notes' }[severity]}
        </Severity>
      ))}
      {place !== undefined && (
        <span className="say">
          <b className="mono">{place.mark}</b> chosen{shown !== null && ', '}
          {shown !== null && <Link to={shown}>show it on {place.sheet}</Link>}
        </span>
      )}
      <span className="quiet caution-end">
        A design aid, not a certificate. AC power and battery banks can kill and start fires. Local codes and a
        qualified person have the last word.
      </span>
    </footer>
  );
}

const NUMBERS = [
  'No',
  'One',
  'Two',
  'Three',
  'Four',
  'Five',
  'Six',
  'Seven',
  'Eight',
  'Nine',
  'Ten',
  'Eleven',
  'Twelve',
];

function sayHead(findings: readonly Finding[] | null): string {
  if (findings === null) return 'Findings';
  const n = findings.filter((finding) => finding.accepted !== true).length;
  if (n === 0) return 'No finding is left';
  return n === 1 ? 'One finding is left' : `${NUMBERS[n] ?? n} findings are left`;
}

function sayMusts(findings: readonly Finding[]): string {
  const n = findings.filter((finding) => finding.severity === 'must' && finding.accepted !== true).length;
  if (n === 0) return '';
  return n === 1
    ? 'one must be mended before anyone builds from it'
    : `${(NUMBERS[n] ?? String(n)).toLowerCase()} must be mended before anyone builds from it`;
}
