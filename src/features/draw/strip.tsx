import { Link } from 'react-router';

import type { Finding, Severity as SeverityOf } from '#shared/model/analysis.ts';
import { useCanvasStore } from '#src/canvas/canvas-store.ts';
import { selectDevice, selectRun } from '#src/canvas/selection.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { Severity } from '#src/ui/severity.tsx';

/** The findings in a line: how many of each, the next one, what the check took, the caution. */
export function Strip() {
  const findings = useOpenDesign((open) => open.analysis?.findings);
  const checkedInMs = useOpenDesign((open) => open.checkedInMs);
  const checking = useOpenDesign((open) => open.checking);
  const vesselId = useOpenDesign((open) => open.vesselId);
  const left = findings?.filter((finding) => finding.accepted !== true);
  const next = left?.[0];

  return (
    <footer className="strip">
      <Link className="counts" to={`/vessels/${vesselId}/findings`} title="All findings">
        {left === undefined ? (
          <span className="quiet">Checking</span>
        ) : left.length === 0 ? (
          <Severity of="good">no findings</Severity>
        ) : (
          COUNTED.map((severity) => <Count key={severity} of={severity} findings={left} />)
        )}
      </Link>
      {next !== undefined && (
        <p className="say" title={next.message}>
          {next.message} <ShowIt finding={next} />
        </p>
      )}
      <span className="end quiet">
        <span aria-live="off">{sayCheck(checkedInMs, checking)}</span>
        <span className="caution">A design aid, not a certificate</span>
      </span>
    </footer>
  );
}

const COUNTED = ['must', 'should', 'note'] as const;
const WORDS: Readonly<Record<SeverityOf, readonly [string, string]>> = {
  must: ['must fix', 'must fix'],
  should: ['should fix', 'should fix'],
  note: ['note', 'notes'],
};

function Count({ of, findings }: { readonly of: SeverityOf; readonly findings: readonly Finding[] }) {
  const n = findings.filter((finding) => finding.severity === of).length;
  if (n === 0) return null;
  return (
    <Severity of={of}>
      {n} {WORDS[of][n === 1 ? 0 : 1]}
    </Severity>
  );
}

function ShowIt({ finding }: { readonly finding: Finding }) {
  const canvas = useCanvasStore();
  const { device, run } = finding.subject;
  if (device === undefined && run === undefined) return null;
  return (
    <Button
      look="plain"
      onClick={() => canvas.getState().show(device === undefined ? selectRun(run!) : selectDevice(device))}
    >
      Show it
    </Button>
  );
}

function sayCheck(ms: number | null, checking: boolean): string {
  if (ms === null || checking) return 'Checking';
  return `Checked as you draw, ${Math.max(1, Math.round(ms))} ms`;
}
