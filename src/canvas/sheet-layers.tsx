import { memo, useMemo, useState, type ComponentType, type ReactNode } from 'react';

import { paperSize } from '#shared/layout/paper.ts';
import type { RunLayout, SheetLayout } from '#shared/layout/sheet-layout.ts';
import type { Finding } from '#shared/model/analysis.ts';
import type { Basis, Design, EntityId, Note, Run, Sheet, Zone } from '#shared/model/design.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { screenInk } from '#symbols/ink.ts';
import { Caution } from '#symbols/sheet/caution.tsx';
import { DeviceTag } from '#symbols/sheet/device-tag.tsx';
import { Frame } from '#symbols/sheet/frame.tsx';
import { NoteText } from '#symbols/sheet/note-text.tsx';
import { RunLabel } from '#symbols/sheet/run-label.tsx';
import { RunCore, RunHops, RunOutline } from '#symbols/sheet/run.tsx';
import { Stub } from '#symbols/sheet/stub.tsx';
import { TitleBlock } from '#symbols/sheet/title-block.tsx';
import { titleFieldsOf } from '#symbols/sheet/title-fields.ts';
import { ZoneOutline } from '#symbols/sheet/zone-outline.tsx';

import { useCanvas } from './canvas-store.ts';
import { isSeen, useSeenCells } from './culling.ts';
import { DraftLayer } from './draft-layer.tsx';
import { placeFlags, type FindingFlag } from './finding-flags.ts';
import { FlagLayer } from './flag-layer.tsx';
import type { Selection } from './selection.ts';
import { HoverMarks, SelectionMarks, Sleeves } from './selection-layer.tsx';

interface LayerProps {
  readonly design: Design;
  readonly sheetId: EntityId;
  readonly layout: SheetLayout;
}

/** Under the devices: paper, zones, runs and all letters, in the order of inking. */
export function LowerLayers({ design, sheetId, layout }: LayerProps) {
  const selection = useCanvas((canvas) => canvas.selection);
  const sheet = design.sheets[sheetId];
  if (sheet === undefined) return null;
  return (
    <svg className="sheet-layer lower" width={1} height={1}>
      <Paper sheet={sheet} />
      <Ground design={design} sheet={sheet} />
      <Runs
        design={design}
        layout={layout}
        sleeves={<Sleeves design={design} layout={layout} selection={selection} />}
      />
      <Tags design={design} sheetId={sheetId} layout={layout} />
    </svg>
  );
}

/** Over the devices: what is selected, hovered, spoken of, in hand. */
export function UpperLayers({ design, sheetId, layout }: LayerProps) {
  const selection = useCanvas((canvas) => canvas.selection);
  const tool = useCanvas((canvas) => canvas.tool);
  const hover = useCanvas((canvas) => canvas.hover);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const findings = useOpenDesign((open) => open.analysis?.findings);
  const isDragging = tool.is === 'dragging-devices' || tool.is === 'dragging-bend';
  const flags = useFlags(isDragging, { design, sheetId, layout, findings, selection });
  const hovered = tool.is === 'idle' ? hover : null;
  return (
    <svg className="sheet-layer upper" width={1} height={1}>
      <FlagLayer flags={flags} />
      <HoverMarks
        design={design}
        layout={layout}
        device={hovered?.on === 'device' || hovered?.on === 'terminal' ? hovered.device : null}
        run={hovered?.on === 'run' || hovered?.on === 'stub' ? hovered.run : null}
      />
      <SelectionMarks design={design} layout={layout} selection={selection} mayEdit={mayEdit} />
      <DraftLayer tool={tool} design={design} />
    </svg>
  );
}

/** While something is dragged the flags of all else stay; its own come back where it is let go. */
function useFlags(
  isDragging: boolean,
  {
    design,
    sheetId,
    layout,
    findings,
    selection,
  }: LayerProps & { readonly findings: readonly Finding[] | undefined; readonly selection: Selection },
): readonly FindingFlag[] {
  const [held, setHeld] = useState<readonly FindingFlag[]>(NO_FLAGS);
  const flags = useMemo(
    () => (isDragging || findings === undefined ? NO_FLAGS : placeFlags(design, sheetId, layout, findings)),
    [isDragging, findings, design, sheetId, layout],
  );
  if (!isDragging && held !== flags) setHeld(flags);
  return useMemo(
    () =>
      isDragging
        ? held.filter(({ subject }) => !selection.devices.has(subject) && !selection.runs.has(subject))
        : flags,
    [isDragging, held, flags, selection],
  );
}

const NO_FLAGS: readonly FindingFlag[] = [];

const Paper = memo(function Paper({ sheet }: { readonly sheet: Sheet }) {
  const { width, height } = paperSize(sheet);
  return (
    <>
      <defs>
        <pattern id="sheet-grid" width={8} height={8} patternUnits="userSpaceOnUse">
          <path d="M0 0h1v1h-1Z" fill="var(--grid)" />
        </pattern>
      </defs>
      <rect width={width} height={height} fill="var(--sheet)" stroke="var(--rule)" strokeWidth={1} />
      <rect className="grid-dots" width={width} height={height} fill="url(#sheet-grid)" />
      <Frame sheet={sheet} ink={screenInk} />
    </>
  );
});

function Ground({ design, sheet }: { readonly design: Design; readonly sheet: Sheet }) {
  const analysis = useOpenDesign((open) => open.analysis);
  const inReview =
    analysis?.findings.some((finding) => finding.severity === 'must' && finding.accepted !== true) ?? false;
  const facts = useCanvas((canvas) => canvas.facts);
  const fields = useMemo(() => titleFieldsOf(design, sheet.id, facts), [design, sheet.id, facts]);
  return (
    <>
      <Zones zones={design.zones} sheetId={sheet.id} basis={design.basis} />
      <Notes notes={design.notes} sheetId={sheet.id} />
      <Caution sheet={sheet} ink={screenInk} inReview={inReview} />
      <TitleBlock fields={fields} sheet={sheet} ink={screenInk} />
    </>
  );
}

const Zones = memo(function Zones({
  zones,
  sheetId,
  basis,
}: {
  readonly zones: Readonly<Record<EntityId, Zone>>;
  readonly sheetId: EntityId;
  readonly basis: Basis;
}) {
  return Object.values(zones)
    .filter((zone) => zone.sheetId === sheetId)
    .map((zone) => <ZoneOutline key={zone.id} zone={zone} basis={basis} ink={screenInk} />);
});

const Notes = memo(function Notes({
  notes,
  sheetId,
}: {
  readonly notes: Readonly<Record<EntityId, Note>>;
  readonly sheetId: EntityId;
}) {
  return Object.values(notes)
    .filter((note) => note.sheetId === sheetId)
    .map((note) => <NoteText key={note.id} note={note} ink={screenInk} />);
});

/** Outlines of all first, then all cores, hops and labels; what is out of view is left out. */
function Runs({
  design,
  layout,
  sleeves,
}: {
  readonly design: Design;
  readonly layout: SheetLayout;
  readonly sleeves: ReactNode;
}) {
  const seen = useSeenCells();
  const selected = useCanvas((canvas) => canvas.selection.runs);
  const inView = useMemo(() => {
    const drawn: DrawnRun[] = [];
    for (const run of Object.values(design.runs)) {
      const place = layout.runs[run.id];
      if (place === undefined || place.points.length === 0 || !isSeen(place, seen)) continue;
      drawn.push({ run, drawn: place });
    }
    return drawn;
  }, [design.runs, layout, seen]);
  const bundles = bundle(inView);
  return (
    <>
      <Bundles of={Outlines} bundles={bundles} />
      {sleeves}
      {selected.size > 0 && <Outlines runs={inView.filter(({ run }) => selected.has(run.id))} />}
      <Bundles of={Cores} bundles={bundles} />
      <Bundles of={Hops} bundles={bundles} />
      <Bundles of={Stubs} bundles={bundles} />
      <Bundles of={Labels} bundles={bundles} selected={selected} />
    </>
  );
}

interface DrawnRun {
  readonly run: Run;
  readonly drawn: RunLayout;
}
interface BundleProps {
  readonly runs: readonly DrawnRun[];
  readonly selected?: ReadonlySet<EntityId>;
}

/** Few enough that one moved run has few others looked at, and many enough that the bundles themselves cost nothing. */
const BUNDLE = 24;

function bundle(runs: readonly DrawnRun[]): DrawnRun[][] {
  return Array.from({ length: Math.ceil(runs.length / BUNDLE) }, (_, i) => runs.slice(i * BUNDLE, (i + 1) * BUNDLE));
}

function Bundles({
  of: Bundle,
  bundles,
  selected,
}: {
  readonly of: ComponentType<BundleProps>;
  readonly bundles: readonly (readonly DrawnRun[])[];
  readonly selected?: ReadonlySet<EntityId>;
}) {
  return bundles.map((runs, i) => <Bundle key={i} runs={runs} selected={selected} />);
}

/** Drawn again only when one of its runs moved or changed. */
function memoBundle(Bundle: (props: BundleProps) => ReactNode) {
  return memo(
    Bundle,
    (before, after) =>
      before.selected === after.selected &&
      before.runs.length === after.runs.length &&
      before.runs.every(({ run, drawn }, i) => run === after.runs[i]!.run && drawn === after.runs[i]!.drawn),
  );
}

const Outlines = memoBundle(({ runs }) =>
  runs.map(({ run, drawn }) => <RunOutline key={run.id} run={run} layout={drawn} ink={screenInk} />),
);

const Cores = memoBundle(({ runs }) =>
  runs.map(({ run, drawn }) => <RunCore key={run.id} run={run} layout={drawn} colour={drawn.colour} ink={screenInk} />),
);

const Hops = memoBundle(({ runs }) =>
  runs.map(({ run, drawn }) => <RunHops key={run.id} run={run} layout={drawn} colour={drawn.colour} ink={screenInk} />),
);

const Stubs = memoBundle(({ runs }) =>
  runs.flatMap(({ drawn }) =>
    drawn.stubs.map((stub) => <Stub key={`${drawn.runId} ${stub.text}`} stub={stub} ink={screenInk} />),
  ),
);

const Labels = memoBundle(({ runs, selected }) =>
  runs.map(({ run, drawn }) =>
    drawn.label === null || selected?.has(run.id) ? null : (
      <RunLabel key={run.id} label={drawn.label} ink={screenInk} />
    ),
  ),
);

const Tags = memo(function Tags({ design, sheetId, layout }: LayerProps) {
  const selected = useCanvas((canvas) => canvas.selection.devices);
  return Object.values(layout.tags)
    .filter((tag) => design.devices[tag.deviceId]?.sheetId === sheetId && !selected.has(tag.deviceId))
    .map((tag) => <DeviceTag key={tag.deviceId} tag={tag} ink={screenInk} />);
});
