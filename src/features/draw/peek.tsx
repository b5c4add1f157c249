import { conductorOf } from '#shared/model/defaults.ts';
import { formatA } from '#shared/units/current.ts';
import { kindOf } from '#shared/kinds/index.ts';
import { useCanvas } from '#src/canvas/canvas-store.ts';
import { sizeOfSelection } from '#src/canvas/selection.ts';
import { useOpenDesign, useOpenDesignStore } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { Severity } from '#src/ui/severity.tsx';

import { findingsOf, sayColour, verdictOf } from './run-words.ts';

/** The selection in one line with its first remedy: where there is no room for the particulars. */
export function Peek({ onParticulars }: { readonly onParticulars?: () => void }) {
  const selection = useCanvas((canvas) => canvas.selection);
  const design = useOpenDesign((open) => open.design);
  const analysis = useOpenDesign((open) => open.analysis);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const open = useOpenDesignStore();
  if (sizeOfSelection(selection) !== 1) return null;
  const [deviceId] = selection.devices;
  const [runId] = selection.runs;
  const device = deviceId === undefined ? undefined : design.devices[deviceId];
  const run = runId === undefined ? undefined : design.runs[runId];
  const found = run === undefined ? undefined : analysis?.runs[run.id];
  const findings = findingsOf(analysis?.findings, { device: device?.id, run: run?.id });
  const remedy = findings.find(({ accepted }) => accepted !== true)?.remedies[0];
  return (
    <div className="peek" role="status">
      <b className="mono">{device?.mark ?? run?.mark ?? '?'}</b>
      {device !== undefined && <span className="words">{device.name ?? kindOf(device)?.title}</span>}
      {run !== undefined && (
        <span className="mono">
          {conductorOf(run).size.replace(' AWG', '')} · {sayColour(design, run)}
        </span>
      )}
      {found !== undefined && (
        <span className="num">
          {formatA(found.designCurrentA)} of {formatA(found.ampacity.allowedA)}
        </span>
      )}
      {analysis !== null && <Severity of={verdictOf(findings)} />}
      <span className="end">
        {onParticulars !== undefined && (
          <Button look="plain" onClick={onParticulars}>
            Particulars
          </Button>
        )}
        {mayEdit && remedy !== undefined && (
          <Button look="go" onClick={() => open.getState().change(remedy.title, remedy.patch)}>
            {remedy.title}
          </Button>
        )}
      </span>
    </div>
  );
}
