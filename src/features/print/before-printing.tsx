import { Link } from 'react-router';

import { useOpenDesign } from '#src/design/open-design.ts';
import { Severity } from '#src/ui/severity.tsx';

/** What stands in the way of a drawing that someone may build from. */
export function BeforePrinting({ vesselId }: { readonly vesselId: string }) {
  const design = useOpenDesign((open) => open.design);
  const analysis = useOpenDesign((open) => open.analysis);
  const musts = analysis?.findings.filter((f) => f.severity === 'must' && f.accepted !== true) ?? [];
  const mustMarks = [
    ...new Set(
      musts.map((f) => design.runs[f.subject.run ?? '']?.mark ?? design.devices[f.subject.device ?? '']?.mark ?? ''),
    ),
  ].filter(Boolean);
  const withoutLength = Object.values(design.runs).filter((run) => run.lengthM === undefined && run.link !== true);

  return (
    <>
      <h2>Before you print</h2>
      <ul className="print-says">
        {analysis === null && <li className="quiet">The check has not answered yet.</li>}
        {musts.length > 0 && (
          <li>
            <Severity of="must">{musts.length} must fix</Severity>
            <p>
              {listOf(mustMarks)}. Each page will say &quot;In review, not for building&quot; until{' '}
              {musts.length === 1 ? 'it is' : 'they are'} mended.{' '}
              <Link to={`/vessels/${vesselId}/findings`}>Findings</Link>
            </p>
          </li>
        )}
        {withoutLength.length > 0 && (
          <li>
            <Severity of="should">
              {withoutLength.length} {withoutLength.length === 1 ? 'run' : 'runs'} without a length
            </Severity>
            <p>
              {listOf(withoutLength.map((run) => run.mark ?? 'a run'))}: printed with an empty length, and no cable is
              bought for {withoutLength.length === 1 ? 'it' : 'them'}.{' '}
              <Link to={`/vessels/${vesselId}/findings`}>Show them</Link>
            </p>
          </li>
        )}
        {analysis !== null && musts.length === 0 && withoutLength.length === 0 && (
          <li>
            <Severity of="good">nothing stands in the way</Severity>
          </li>
        )}
        <li>
          <Severity of="note">Paper</Severity>
          <p>
            Lists and drawings may differ in paper: choose &quot;paper by page size&quot; at the printer, and 100 %.
          </p>
        </li>
      </ul>
    </>
  );
}

function listOf(names: readonly string[]): string {
  if (names.length > 6) return `${names.slice(0, 5).join(', ')} and ${names.length - 5} more`;
  if (names.length < 2) return names[0] ?? '';
  return `${names.slice(0, -1).join(', ')} and ${names.at(-1)!}`;
}
