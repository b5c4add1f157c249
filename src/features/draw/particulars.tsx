import { useCanvas } from '#src/canvas/canvas-store.ts';
import { sizeOfSelection } from '#src/canvas/selection.ts';
import { useOpenDesign } from '#src/design/open-design.ts';

import { DeviceParticulars } from './device-particulars.tsx';
import { RunParticulars } from './run-particulars.tsx';
import { SeveralParticulars } from './several-particulars.tsx';
import { SheetParticulars } from './sheet-particulars.tsx';

/** What is selected, as cells. */
export function Particulars() {
  return (
    <aside className="particulars" aria-label="Particulars">
      <OfSelection />
    </aside>
  );
}

function OfSelection() {
  const selection = useCanvas((canvas) => canvas.selection);
  const devices = useOpenDesign((open) => open.design.devices);
  const runs = useOpenDesign((open) => open.design.runs);
  if (sizeOfSelection(selection) > 1) return <SeveralParticulars />;
  const [deviceId] = selection.devices;
  const [runId] = selection.runs;
  const device = deviceId === undefined ? undefined : devices[deviceId];
  const run = runId === undefined ? undefined : runs[runId];
  // Fields belong to what they are of: another selection begins with fresh ones.
  if (device !== undefined) return <DeviceParticulars key={device.id} device={device} />;
  if (run !== undefined) return <RunParticulars key={run.id} run={run} />;
  return <SheetParticulars />;
}
