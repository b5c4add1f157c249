import { setField as planField } from '#shared/edits/set-field.ts';
import { kindOf } from '#shared/kinds/index.ts';
import { terminalsOf } from '#shared/kinds/place.ts';
import { workOf } from '#shared/model/defaults.ts';
import type { Design, Device } from '#shared/model/design.ts';
import { formatA } from '#shared/units/current.ts';
import { formatV } from '#shared/units/voltage.ts';
import { useCanvasStore } from '#src/canvas/canvas-store.ts';
import { selectDevice, selectRun } from '#src/canvas/selection.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { Cell, EditCell, PickCell } from '#src/ui/cell.tsx';
import { Check } from '#src/ui/check.tsx';

import { FindingCard } from './finding-card.tsx';
import { RatingsForm } from './ratings-form.tsx';
import { findingsOf } from './run-words.ts';
import { readChecked, useSetField } from './use-edit.ts';

const CHOICE = (value: string) => ({ value, title: value });
const WORK_CHOICES = ['new', 'existing', 'remove'].map(CHOICE);

/** What is known of one device: what it is, its ratings, what ends on it, what the engine says of it. */
export function DeviceParticulars({ device }: { readonly device: Device }) {
  const analysis = useOpenDesign((open) => open.analysis);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const kind = kindOf(device);
  const findings = findingsOf(analysis?.findings, { device: device.id });
  return (
    <>
      <h2>{device.mark ?? kind?.title ?? 'Device'}</h2>
      <p className="lead quiet">
        {kind?.title ?? device.kind}
        {device.symbol === undefined ? '' : `, ${device.symbol}`}
      </p>
      {findings.slice(0, 1).map((finding) => (
        <FindingCard key={finding.id} finding={finding} isFirst />
      ))}
      {mayEdit ? <DeviceFields device={device} /> : <DeviceFacts device={device} />}
      <h3>Ratings</h3>
      <RatingsForm device={device} />
      <Working device={device} />
      <RunsOn device={device} />
      {findings.slice(1).map((finding) => (
        <FindingCard key={finding.id} finding={finding} isFirst={false} />
      ))}
    </>
  );
}

function DeviceFields({ device }: { readonly device: Device }) {
  const design = useOpenDesign((open) => open.design);
  const setField = useSetField();
  const kind = kindOf(device);
  const path = (...rest: string[]) => ['devices', device.id, ...rest];
  const set =
    (...rest: string[]) =>
    (value: unknown) =>
      void setField(path(...rest), value === '' ? undefined : value);
  const zones = Object.values(design.zones).map((zone) => ({ value: zone.id, title: zone.name }));
  return (
    <div className="cells six">
      <EditCell
        className="span-2"
        caption="Mark"
        mono
        value={device.mark ?? ''}
        read={(text) =>
          readChecked({ ok: true, value: text.trim() }, (v) => planField(design, path('mark'), v).refused)
        }
        onKeep={set('mark')}
      />
      <EditCell
        className="span-4"
        caption="Name"
        value={device.name ?? ''}
        read={(text) => ({ ok: true, value: text.trim() })}
        onKeep={set('name')}
      />
      <PickCell
        className="span-3"
        caption="Zone"
        value={device.zoneId ?? ''}
        isDefault={device.zoneId === undefined}
        choices={[{ value: '', title: 'none' }, ...zones]}
        onPick={set('zoneId')}
      />
      <PickCell className="span-3" caption="Work" value={workOf(device)} choices={WORK_CHOICES} onPick={set('work')} />
      {kind !== undefined && kind.symbols.length > 1 && (
        <PickCell
          className="span-3"
          caption="Drawn as"
          value={device.symbol ?? kind.symbols[0]}
          choices={kind.symbols.map(CHOICE)}
          onPick={(symbol) => void setField(path('symbol'), symbol === kind.symbols[0] ? undefined : symbol)}
        />
      )}
      <PickCell
        className="span-3"
        caption="Against ignition"
        value={device.ignitionProtected === undefined ? '' : String(device.ignitionProtected)}
        isDefault={device.ignitionProtected === undefined}
        choices={[
          { value: '', title: 'not known' },
          { value: 'true', title: 'protected' },
          { value: 'false', title: 'not protected' },
        ]}
        onPick={(value) => void setField(path('ignitionProtected'), value === '' ? undefined : value === 'true')}
      />
      <EditCell
        className="span-6"
        caption="Note"
        value={device.note ?? ''}
        read={(text) => ({ ok: true, value: text.trim() })}
        onKeep={set('note')}
      />
      <Check
        className="cell tick span-6"
        checked={device.locked === true}
        onChange={(isLocked) => void setField(path('locked'), isLocked || undefined)}
      >
        Locked: sizing leaves it as it is
      </Check>
    </div>
  );
}

function DeviceFacts({ device }: { readonly device: Device }) {
  const design = useOpenDesign((open) => open.design);
  return (
    <div className="cells two">
      <Cell caption="Mark" mono>
        {device.mark}
      </Cell>
      <Cell caption="Name">{device.name}</Cell>
      <Cell caption="Zone">{device.zoneId === undefined ? 'none' : design.zones[device.zoneId]?.name}</Cell>
      <Cell caption="Work">{workOf(device)}</Cell>
    </div>
  );
}

/** What the network says of it with everything on. */
function Working({ device }: { readonly device: Device }) {
  const solved = useOpenDesign((open) => open.analysis?.modes['all-on']?.devices[device.id]);
  const fault = useOpenDesign((open) => open.analysis?.faults[device.id]);
  if (solved === undefined && fault === undefined) return null;
  const terminals = Object.values(solved?.terminals ?? {}).map(({ potentialV }) => potentialV);
  const volts = terminals.length < 2 ? null : Math.max(...terminals) - Math.min(...terminals);
  return (
    <>
      <h3>With all on</h3>
      <div className="cells three">
        <Cell caption="Carries">{solved === undefined ? '' : formatA(Math.abs(solved.currentA))}</Cell>
        <Cell caption="Voltage across">{volts === null ? '' : formatV(volts)}</Cell>
        {fault === undefined ? (
          <Cell caption="State">{solved?.state}</Cell>
        ) : (
          <Cell caption="Fault to break">{formatA(fault.greatestA)}</Cell>
        )}
      </div>
    </>
  );
}

function RunsOn({ device }: { readonly device: Device }) {
  const runs = useOpenDesign((open) => open.design.runs);
  const devices = useOpenDesign((open) => open.design.devices);
  const canvas = useCanvasStore();
  const lines = terminalsOf(device).map((terminal) => ({
    terminal: terminal.name,
    optional: terminal.optional,
    ends: endsOn(runs, device.id, terminal.name),
    bolted: boltedOn(devices, device, terminal.name),
  }));
  const shown = lines.filter(({ optional, ends, bolted }) => !optional || ends.length + bolted.length > 0);
  return (
    <>
      <h3>Terminals</h3>
      <ul className="terminals">
        {shown.map(({ terminal, ends, bolted }) => (
          <li key={terminal}>
            <span className="mono">{terminal}</span>
            <span>
              {ends.length + bolted.length === 0 && <span className="quiet">open</span>}
              {bolted.map((other) => (
                <button key={other.id} type="button" onClick={() => canvas.getState().show(selectDevice(other.id))}>
                  {other.id === device.mountedOn?.device ? 'on ' : ''}
                  <span className="mono">{other.mark ?? '?'}</span>
                  {other.id === device.mountedOn?.device ? '' : ' on it'}
                </button>
              ))}
              {ends.map(({ run, other }) => (
                <button key={run.id} type="button" onClick={() => canvas.getState().show(selectRun(run.id))}>
                  <span className="mono">{run.mark ?? '?'}</span> to {devices[other]?.mark ?? '?'}
                </button>
              ))}
            </span>
          </li>
        ))}
      </ul>
    </>
  );
}

/** What is joined to a terminal by its stud, with no wire between: a fuse on a battery's post stands on it by its `a`. */
function boltedOn(devices: Design['devices'], device: Device, terminal: string): Device[] {
  const holder = terminal === 'a' && device.mountedOn !== undefined ? devices[device.mountedOn.device] : undefined;
  const held = Object.values(devices).filter(
    ({ mountedOn }) => mountedOn?.device === device.id && mountedOn.terminal === terminal,
  );
  return holder === undefined ? held : [holder, ...held];
}

function endsOn(runs: Design['runs'], deviceId: string, terminal: string) {
  return Object.values(runs).flatMap((run) => {
    if (run.from.device === deviceId && run.from.terminal === terminal) return [{ run, other: run.to.device }];
    if (run.to.device === deviceId && run.to.terminal === terminal) return [{ run, other: run.from.device }];
    return [];
  });
}
