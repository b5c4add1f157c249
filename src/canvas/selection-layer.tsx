import { memo } from 'react';

import { boxOf, terminalsOf, type Point } from '#shared/kinds/place.ts';
import { coreWidth } from '#shared/layout/core-width.ts';
import { runColour } from '#shared/layout/run-colour.ts';
import { runPath } from '#shared/layout/run-path.ts';
import type { RunLayout, SheetLayout } from '#shared/layout/sheet-layout.ts';
import type { Design, Run } from '#shared/model/design.ts';

import { screenInk } from '#symbols/ink.ts';
import { DeviceTag } from '#symbols/sheet/device-tag.tsx';
import { RunLabel } from '#symbols/sheet/run-label.tsx';

import type { Selection } from './selection.ts';

/** Under the devices: the sleeve of a selected run, wide enough to be seen beside its core. */
export const Sleeves = memo(function Sleeves({
  design,
  layout,
  selection,
}: {
  readonly design: Design;
  readonly layout: SheetLayout;
  readonly selection: Selection;
}) {
  return [...selection.runs].map((id) => {
    const run = design.runs[id];
    const drawn = layout.runs[id];
    if (run === undefined || drawn === undefined) return null;
    const width = coreWidth(run) + 9;
    const d = runPath(drawn);
    return (
      <g key={id}>
        <path className="sleeve" d={d} strokeWidth={width} />
        <path className="sleeve-in" d={d} strokeWidth={width - 4} />
      </g>
    );
  });
});

/** Over everything: grips and tags of selected runs, frames and tags of selected devices. */
export const SelectionMarks = memo(function SelectionMarks({
  design,
  layout,
  selection,
  mayEdit,
}: {
  readonly design: Design;
  readonly layout: SheetLayout;
  readonly selection: Selection;
  readonly mayEdit: boolean;
}) {
  return (
    <>
      {[...selection.runs].map((id) => {
        const run = design.runs[id];
        const drawn = layout.runs[id];
        if (run === undefined || drawn === undefined) return null;
        return <RunMarks key={id} run={run} drawn={drawn} colour={runColour(design, run)} mayEdit={mayEdit} />;
      })}
      {[...selection.devices].map((id) => {
        const device = design.devices[id];
        if (device === undefined) return null;
        const box = boxOf(device);
        const tag = layout.tags[id];
        return (
          <g key={id}>
            <rect className="chosen" x={box.x - 6} y={box.y - 6} width={box.width + 12} height={box.height + 12} />
            {tag !== undefined && <DeviceTag tag={tag} ink={screenInk} selected />}
          </g>
        );
      })}
    </>
  );
});

function RunMarks({
  run,
  drawn,
  colour,
  mayEdit,
}: {
  readonly run: Run;
  readonly drawn: RunLayout;
  readonly colour: string;
  readonly mayEdit: boolean;
}) {
  const first = drawn.points[0];
  const last = drawn.points.at(-1);
  const label = drawn.label;
  return (
    <>
      {first !== undefined && <EndGrip at={first} />}
      {last !== undefined && drawn.stubs.length === 0 && <EndGrip at={last} />}
      {mayEdit &&
        (run.bends ?? []).map((bend, index) => (
          <path
            key={`${index}:${bend.x}:${bend.y}`}
            className={run.locked === true ? 'grip locked' : 'grip'}
            d={`M${bend.x} ${bend.y - 5}l5 5l-5 5l-5 -5Z`}
          />
        ))}
      {label !== null && <RunLabel label={label} ink={screenInk} selectedColour={colour} />}
    </>
  );
}

function EndGrip({ at }: { readonly at: Point }) {
  return <rect className="grip" x={at.x - 4} y={at.y - 4} width={8} height={8} />;
}

/** What the pointer is over: brackets and terminal names of a device, ringed and named ends of a run. */
export function HoverMarks({
  design,
  layout,
  device: deviceId,
  run: runId,
}: {
  readonly design: Design;
  readonly layout: SheetLayout;
  readonly device: string | null;
  readonly run: string | null;
}) {
  const device = deviceId === null ? undefined : design.devices[deviceId];
  if (device !== undefined) {
    const { x, y, width, height } = boxOf(device);
    const [l, t, r, b] = [x - 8, y - 8, x + width + 8, y + height + 8];
    return (
      <>
        <path
          className="hover"
          d={`M${l} ${t + 8}V${t}H${l + 8}M${r - 8} ${t}H${r}V${t + 8}M${r} ${b - 8}V${b}H${r - 8}M${l + 8} ${b}H${l}V${b - 8}`}
        />
        {terminalsOf(device).map((terminal) => {
          const side = terminal.sides[0] ?? 'right';
          const off = {
            left: [-7, -4, 'end'],
            right: [7, -4, 'start'],
            top: [6, -5, 'start'],
            bottom: [6, 11, 'start'],
          }[side] as [number, number, 'start' | 'end'];
          return (
            <text
              key={terminal.name}
              className="terminal-name"
              x={terminal.x + off[0]}
              y={terminal.y + off[1]}
              textAnchor={off[2]}
            >
              {terminal.name}
            </text>
          );
        })}
      </>
    );
  }
  const run = runId === null ? undefined : design.runs[runId];
  const drawn = runId === null ? undefined : layout.runs[runId];
  if (run === undefined || drawn === undefined) return null;
  const ends = [
    { end: run.from, at: drawn.points[0] },
    { end: run.to, at: drawn.points.at(-1) },
  ];
  if (drawn.stubs.length > 0) {
    // It is drawn from its end on this sheet to the flag, which says for itself where it goes on.
    const [stub] = drawn.stubs;
    const isToAway = stub!.to.deviceId === run.to.device;
    ends.splice(0, 2, { end: isToAway ? run.from : run.to, at: drawn.points[0] });
  }
  return ends.map(({ end, at }, i) =>
    at === undefined ? null : (
      <g key={i}>
        <circle className="hover" cx={at.x} cy={at.y} r={5.5} />
        <text className="terminal-name" x={at.x + 9} y={at.y - 7}>
          {design.devices[end.device]?.mark ?? ''} : {end.terminal}
        </text>
      </g>
    ),
  );
}
