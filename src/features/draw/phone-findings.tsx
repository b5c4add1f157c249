import { useState } from 'react';

import type { Finding } from '#shared/model/analysis.ts';
import { useCanvas, useCanvasStore } from '#src/canvas/canvas-store.ts';
import { selectDevice, selectRun } from '#src/canvas/selection.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { Severity } from '#src/ui/severity.tsx';

const FIRST = 8;

/** On a phone the drawing is there to look at: what the check says of the selection, else of all of it. */
export function PhoneFindings() {
  const findings = useOpenDesign((open) => open.analysis?.findings);
  const selection = useCanvas((canvas) => canvas.selection);
  const [isAll, setIsAll] = useState(false);
  const left = (findings ?? []).filter(({ accepted }) => accepted !== true);
  const isAnything = selection.devices.size + selection.runs.size > 0;
  const own = left.filter(
    ({ subject }) => selection.devices.has(subject.device ?? '') || selection.runs.has(subject.run ?? ''),
  );
  const shown = isAnything ? own : left;
  return (
    <section className="phone-findings" aria-label="What the check says">
      {findings === undefined && <p className="quiet">Checking</p>}
      {findings !== undefined && shown.length === 0 && <p className="quiet">The check has nothing to say of it.</p>}
      {shown.slice(0, isAll ? undefined : FIRST).map((finding) => (
        <PhoneFinding key={finding.id} finding={finding} />
      ))}
      {shown.length > FIRST && !isAll && <Button onClick={() => setIsAll(true)}>Show all {shown.length}</Button>}
    </section>
  );
}

function PhoneFinding({ finding }: { readonly finding: Finding }) {
  const canvas = useCanvasStore();
  const { device, run } = finding.subject;
  const show = () => canvas.getState().show(device === undefined ? selectRun(run ?? '') : selectDevice(device));
  return (
    <article>
      <Severity of={finding.severity} />
      <p>{finding.message}</p>
      {(device !== undefined || run !== undefined) && (
        <Button look="plain" onClick={show}>
          Show it
        </Button>
      )}
    </article>
  );
}
