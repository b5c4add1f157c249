import { Link } from 'react-router';

import type { PartsLine } from '#shared/model/analysis.ts';
import { basisOf, conductorOf } from '#shared/model/defaults.ts';
import type { Design, Device, Run } from '#shared/model/design.ts';
import { formatLength } from '#shared/units/length.ts';
import { formatPercent } from '#shared/units/fraction.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import { Cell } from '#src/ui/cell.tsx';
import { Severity } from '#src/ui/severity.tsx';

import { CableCut } from './cable-cut.tsx';
import { isCable, sayQuantity } from './parts-groups.ts';

/** One line: what it is, where each piece goes on board, and for cable how its length comes about. */
export function PartParticulars({ vesselId, line }: { readonly vesselId: string; readonly line: PartsLine }) {
  const design = useOpenDesign((open) => open.design);
  const units = useUnits(basisOf(design).units);
  const { quantity, unit } = sayQuantity(line, units);
  const devices = line.devices.flatMap((id) => design.devices[id] ?? []);
  const runs = line.runs.flatMap((id) => design.runs[id] ?? []);
  return (
    <>
      <h2 className="part-name">{line.part}</h2>
      <p className="quiet">{line.group}</p>
      <div className="cells three part-facts">
        <Cell caption="Rating">{line.rating || 'none'}</Cell>
        <Cell caption="To buy">
          {quantity} {unit}
        </Cell>
        {isCable(line) && runs[0] !== undefined && (
          <Cell caption="Insulation">{conductorOf(runs[0]).insulationC} °C</Cell>
        )}
      </div>
      {isCable(line) && <CableCut runs={runs} boughtM={line.quantity} says={(m) => formatLength(m, units)} />}
      <h3>
        Where it goes<span>{sayPlaces(devices.length, runs.length)}</span>
      </h3>
      <table className="chain places">
        <tbody>
          {devices.map((device) => (
            <DeviceLine key={device.id} vesselId={vesselId} device={device} />
          ))}
          {runs.map((run) => (
            <RunLine
              key={run.id}
              vesselId={vesselId}
              design={design}
              run={run}
              says={run.lengthM === undefined ? 'no length' : formatLength(run.lengthM, units)}
            />
          ))}
        </tbody>
      </table>
      {isCable(line) && (
        <CableSum design={design} runs={runs} boughtM={line.quantity} says={(m) => formatLength(m, units)} />
      )}
    </>
  );
}

function DeviceLine({ vesselId, device }: { readonly vesselId: string; readonly device: Device }) {
  return (
    <tr>
      <td className="mono">
        <Link to={`/vessels/${vesselId}/draw?sheet=${device.sheetId}&select=${encodeURIComponent(device.id)}`}>
          {device.mark ?? 'device'}
        </Link>
      </td>
      <td>{device.name ?? ''}</td>
      <td />
    </tr>
  );
}

function RunLine({
  vesselId,
  design,
  run,
  says,
}: {
  readonly vesselId: string;
  readonly design: Design;
  readonly run: Run;
  readonly says: string;
}) {
  const mustFix = useOpenDesign((open) =>
    open.analysis?.findings.some((f) => f.subject.run === run.id && f.severity === 'must' && f.accepted !== true),
  );
  const markOf = (id: string) => design.devices[id]?.mark ?? 'device';
  const sheetId = design.devices[run.from.device]?.sheetId ?? '';
  const parallel = conductorOf(run).parallel;
  return (
    <tr>
      <td className="mono">
        <Link to={`/vessels/${vesselId}/draw?sheet=${sheetId}&select=${encodeURIComponent(run.id)}`}>
          {run.mark ?? 'run'}
        </Link>
      </td>
      <td>
        {markOf(run.from.device)} to {markOf(run.to.device)}
        {parallel > 1 && `, ${parallel} in parallel`} {mustFix === true && <Severity of="must" />}
      </td>
      <td>{says}</td>
    </tr>
  );
}

function CableSum({
  design,
  runs,
  boughtM,
  says,
}: {
  readonly design: Design;
  readonly runs: readonly Run[];
  readonly boughtM: number;
  readonly says: (lengthM: number) => string;
}) {
  const { slackFraction, endAllowanceM } = basisOf(design).cable;
  const measured = runs.filter((run) => run.lengthM !== undefined);
  const drawnM = measured.reduce((sum, run) => sum + (run.lengthM ?? 0) * conductorOf(run).parallel, 0);
  const ends = measured.reduce((sum, run) => sum + 2 * conductorOf(run).parallel, 0);
  return (
    <table className="chain places">
      <tbody>
        <tr className="sum">
          <td colSpan={2}>Lengths as drawn</td>
          <td>{says(drawnM)}</td>
        </tr>
        <tr>
          <td colSpan={2}>Slack, {formatPercent(slackFraction)}</td>
          <td>{says(drawnM * slackFraction)}</td>
        </tr>
        <tr>
          <td colSpan={2}>
            {says(endAllowanceM)} at each of {ends} ends
          </td>
          <td>{says(ends * endAllowanceM)}</td>
        </tr>
        <tr className="sum">
          <td colSpan={2}>To buy, rounded up</td>
          <td>{says(boughtM)}</td>
        </tr>
      </tbody>
    </table>
  );
}

function sayPlaces(devices: number, runs: number): string {
  const words = [
    devices === 0 ? null : `${devices} ${devices === 1 ? 'device' : 'devices'}`,
    runs === 0 ? null : `${runs} ${runs === 1 ? 'run' : 'runs'}`,
  ];
  return words.filter(Boolean).join(', ');
}
