import { memo } from 'react';

import { coreWidth, OUTLINE } from '#shared/layout/core-width.ts';
import { hopPath, runPath } from '#shared/layout/run-path.ts';
import type { RunLayout } from '#shared/layout/sheet-layout.ts';
import { workOf } from '#shared/model/defaults.ts';
import type { PlainColour, Run } from '#shared/model/design.ts';
import type { Ink } from '#symbols/ink.ts';

import { monoPattern } from './mono-pattern.ts';

interface OutlineProps {
  readonly run: Run;
  readonly layout: RunLayout;
  readonly ink: Ink;
}

interface CoreProps extends OutlineProps {
  /** As in the document: one colour, or two joined by `/`. */
  readonly colour: string;
}

/** Drawn for all runs of a sheet before any core, so that copper that meets looks joined. */
export const RunOutline = memo(function RunOutline({ run, layout, ink }: OutlineProps) {
  return <Outline run={run} d={runPath(layout)} ink={ink} />;
});

export const RunCore = memo(function RunCore({ run, layout, colour, ink }: CoreProps) {
  return (
    <>
      <Core run={run} d={runPath(layout)} colour={colour} ink={ink} />
      {workOf(run) === 'remove' && <Struck layout={layout} ink={ink} />}
    </>
  );
});

/** Drawn after all cores: the arc stands over the run it crosses. */
export const RunHops = memo(function RunHops({ run, layout, colour, ink }: CoreProps) {
  if (layout.hops.length === 0) return null;
  const d = hopPath(layout);
  return (
    <>
      <path d={d} fill="none" stroke={ink.sheet} strokeWidth={coreWidth(run) + 2 * OUTLINE + 2} strokeLinecap="butt" />
      <Outline run={run} d={d} ink={ink} />
      <Core run={run} d={d} colour={colour} ink={ink} />
    </>
  );
});

function Outline({ run, d, ink }: { readonly run: Run; readonly d: string; readonly ink: Ink }) {
  const work = workOf(run);
  return (
    <path
      className="out"
      d={d}
      fill="none"
      stroke={ink.wireOutline}
      strokeWidth={coreWidth(run) + 2 * OUTLINE}
      strokeLinejoin="round"
      strokeDasharray={work === 'remove' ? '6 4' : undefined}
      opacity={work === 'existing' ? ink.existing : undefined}
    />
  );
}

function Core({ run, d, colour, ink }: { run: Run; d: string; colour: string; ink: Ink }) {
  const work = workOf(run);
  const width = coreWidth(run);
  const [first, second] = colour.split('/') as [PlainColour, PlainColour | undefined];
  const pattern = ink.mono && run.link !== true ? monoPattern(first) : undefined;
  const base = pattern === undefined ? inkOf(run, first, ink) : ink.sheet;
  const dash = work === 'remove' ? '6 4' : undefined;
  const line = { d, fill: 'none', strokeWidth: width, strokeLinejoin: 'round' as const };
  return (
    <g opacity={work === 'existing' && !ink.mono ? ink.existing : undefined}>
      {work === 'existing' && <path {...line} stroke={ink.sheet} />}
      <path {...line} className={`core ${run.link === true ? 'link' : first}`} stroke={base} strokeDasharray={dash} />
      {pattern !== undefined && pattern !== 'hollow' && <path {...line} stroke={ink.ink1} strokeDasharray={pattern} />}
      {second !== undefined && !ink.mono && (
        <path
          {...line}
          className={`stripe ${second}`}
          stroke={inkOf(run, second, ink)}
          strokeWidth={1}
          strokeDasharray="6 4"
        />
      )}
    </g>
  );
}

/** A link is bare copper of the assembly: ink, whatever its duty. */
function inkOf(run: Run, colour: PlainColour, ink: Ink): string {
  return run.link === true ? ink.ink1 : (ink.wire[colour] ?? ink.ink1);
}

/** The stroke through the middle of a run that this job takes out. */
function Struck({ layout, ink }: { readonly layout: RunLayout; readonly ink: Ink }) {
  const { points } = layout;
  const i = Math.max(1, Math.floor(points.length / 2));
  const [a, b] = [points[i - 1], points[i]];
  if (a === undefined || b === undefined) return null;
  const x = (a.x + b.x) / 2;
  const y = (a.y + b.y) / 2;
  return <path d={`M${x - 7} ${y + 7}L${x + 7} ${y - 7}`} fill="none" stroke={ink.ink1} strokeWidth={1.5} />;
}
