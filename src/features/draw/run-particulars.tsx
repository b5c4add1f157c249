import { setField as planField } from '#shared/edits/set-field.ts';
import { coreWidth, OUTLINE } from '#shared/layout/core-width.ts';
import type { Analysis } from '#shared/model/analysis.ts';
import { basisOf, conductorOf, workOf } from '#shared/model/defaults.ts';
import { COLOURS, type PlainColour, type Run } from '#shared/model/design.ts';
import { INSULATION_TEMPERATURES, sizeOf } from '#shared/model/size.ts';
import { formatA } from '#shared/units/current.ts';
import { formatPercent, formatPercentBeside } from '#shared/units/fraction.ts';
import { formatLength } from '#shared/units/length.ts';
import { formatC } from '#shared/units/temperature.ts';
import { formatV } from '#shared/units/voltage.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import { Cell, EditCell, PickCell } from '#src/ui/cell.tsx';
import { Check } from '#src/ui/check.tsx';
import { Scale } from '#src/ui/scale.tsx';

import { FindingCard } from './finding-card.tsx';
import { readCount, readLength, SIZE_CHOICES } from './readings.ts';
import { findingsOf, sayColour, sayEnd, sayRun } from './run-words.ts';
import { readChecked, useSetField } from './use-edit.ts';
import { ZonesCell } from './zones-cell.tsx';

const CHOICE = (value: string) => ({ value, title: value });
const WORK_CHOICES = ['new', 'existing', 'remove'].map(CHOICE);
const ENCLOSED_CHOICES = ['none', 'sheath', 'conduit', 'enclosure'].map(CHOICE);
const COLOUR_CHOICES = [...COLOURS, 'green/yellow'].map(CHOICE);
const INSULATION_CHOICES = INSULATION_TEMPERATURES.map((c) => ({ value: String(c), title: formatC(c) }));

/** What is known of one run: its cells, what the engine says of it, what mends it. */
export function RunParticulars({ run }: { readonly run: Run }) {
  const design = useOpenDesign((open) => open.design);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  return (
    <>
      <h2>
        {run.mark ?? 'Run'}
        <Conductor run={run} colour={sayColour(design, run)} />
      </h2>
      <p className="lead quiet">{sayRun(design, run)}</p>
      {mayEdit ? <RunFields run={run} /> : <RunFacts run={run} />}
      <Judgement run={run} />
    </>
  );
}

function RunFields({ run }: { readonly run: Run }) {
  const design = useOpenDesign((open) => open.design);
  const units = useUnits(basisOf(design).units);
  const setField = useSetField();
  const path = (...rest: string[]) => ['runs', run.id, ...rest];
  const conductor = conductorOf(run);
  const set =
    (...rest: string[]) =>
    (value: unknown) =>
      void setField(path(...rest), value === '' ? undefined : value);
  const mayBe =
    (...rest: string[]) =>
    (value: unknown) =>
      planField(design, path(...rest), value).refused;

  return (
    <div className="cells six">
      <Cell className="span-3" caption="From">
        <span className="mono">{sayEnd(design, run.from)}</span> {design.devices[run.from.device]?.name}
      </Cell>
      <Cell className="span-3" caption="To">
        <span className="mono">{sayEnd(design, run.to)}</span> {design.devices[run.to.device]?.name}
      </Cell>
      <EditCell
        className="span-2"
        caption="Length"
        value={run.lengthM === undefined ? '' : formatLength(run.lengthM, units)}
        placeholder="not known"
        read={(text) => readChecked(readLength(text, units), mayBe('lengthM'))}
        onKeep={set('lengthM')}
      />
      <PickCell
        className="span-2"
        caption="Size"
        mono
        value={sizeOf(conductor.size) ?? conductor.size}
        choices={SIZE_CHOICES}
        onPick={set('conductor', 'size')}
      />
      <EditCell
        className="span-2"
        caption="In parallel"
        inputMode="numeric"
        value={String(conductor.parallel)}
        read={readCount}
        onKeep={set('conductor', 'parallel')}
      />
      <PickCell
        className="span-2"
        caption="Colour"
        value={run.colour ?? ''}
        isDefault={run.colour === undefined}
        choices={[{ value: '', title: `${sayColour(design, { ...run, colour: undefined })}` }, ...COLOUR_CHOICES]}
        onPick={set('colour')}
      />
      <PickCell
        className="span-2"
        caption="Insulation"
        value={String(conductor.insulationC)}
        isDefault={run.conductor.insulationC === undefined}
        choices={INSULATION_CHOICES}
        onPick={(value) => void setField(path('conductor', 'insulationC'), Number(value))}
      />
      <PickCell className="span-2" caption="Work" value={workOf(run)} choices={WORK_CHOICES} onPick={set('work')} />
      <ZonesCell className="span-6" run={run} />
      <EditCell
        className="span-2"
        caption="In a bundle"
        inputMode="numeric"
        value={String(conductor.bundled)}
        read={readCount}
        onKeep={set('conductor', 'bundled')}
      />
      <PickCell
        className="span-2"
        caption="Enclosed"
        value={run.enclosed ?? ''}
        isDefault={run.enclosed === undefined}
        choices={[{ value: '', title: 'not said' }, ...ENCLOSED_CHOICES]}
        onPick={set('enclosed')}
      />
      <PickCell
        className="span-2"
        caption="Drop class"
        value={run.dropClass ?? ''}
        isDefault={run.dropClass === undefined}
        choices={[{ value: '', title: 'of its loads' }, CHOICE('critical'), CHOICE('general')]}
        onPick={set('dropClass')}
      />
      <EditCell
        className="span-2"
        caption="Mark"
        mono
        value={run.mark ?? ''}
        read={(text) => ({ ok: true, value: text.trim() })}
        onKeep={set('mark')}
      />
      <EditCell
        className="span-4"
        caption="Note"
        value={run.note ?? ''}
        read={(text) => ({ ok: true, value: text.trim() })}
        onKeep={set('note')}
      />
      <Check
        className="cell tick span-6"
        checked={run.locked === true}
        onChange={(isLocked) => void setField(path('locked'), isLocked || undefined)}
      >
        Locked: sizing leaves it as it is
      </Check>
    </div>
  );
}

function RunFacts({ run }: { readonly run: Run }) {
  const design = useOpenDesign((open) => open.design);
  const units = useUnits(basisOf(design).units);
  const conductor = conductorOf(run);
  const facts: readonly [string, string][] = [
    ['From', sayEnd(design, run.from)],
    ['To', sayEnd(design, run.to)],
    ['Length', run.lengthM === undefined ? 'not known' : formatLength(run.lengthM, units)],
    ['Size', conductor.size],
    ['In parallel', String(conductor.parallel)],
    ['Colour', sayColour(design, run)],
    ['Insulation', formatC(conductor.insulationC)],
    ['Work', workOf(run)],
  ];
  return (
    <div className="cells six">
      {facts.map(([caption, value]) => (
        <Cell key={caption} className="span-3" caption={caption}>
          {value}
        </Cell>
      ))}
    </div>
  );
}

/** What it must carry and drop against their limits, its protection, and the findings. */
function Judgement({ run }: { readonly run: Run }) {
  const design = useOpenDesign((open) => open.design);
  const analysis = useOpenDesign((open) => open.analysis);
  const found = analysis?.runs[run.id];
  const findings = findingsOf(analysis?.findings, { run: run.id });
  if (analysis === null) return <p className="quiet waiting">Checking</p>;
  const mode = found?.governingMode ?? null;
  return (
    <>
      {found !== undefined && (
        <>
          <h3>
            Current it must carry
            <span className="num">
              <b>{formatA(found.designCurrentA)}</b> of {formatA(found.ampacity.allowedA)}
            </span>
          </h3>
          <Scale
            value={found.designCurrentA}
            limit={found.ampacity.allowedA}
            print={formatA}
            label={`${formatA(found.designCurrentA)} of ${formatA(found.ampacity.allowedA)}`}
          />
          <p className="quiet">
            {sayAmpacity(found.ampacity)} {mode === null ? '' : `Worst in ${nameMode(mode, design.modes)}.`}
          </p>
          {found.drop !== null && (
            <>
              <h3>
                Voltage drop to {design.devices[found.drop.worstLoad]?.mark ?? 'its load'}
                <span className="num">
                  <b>{formatV(found.drop.volts)}</b>, {formatPercentBeside(found.drop.fraction, found.drop.limit)}
                </span>
              </h3>
              <Scale
                value={shareOfDrop(run, analysis, found)}
                of={found.drop.fraction}
                limit={found.drop.limit}
                print={formatPercent}
                label={`${formatPercent(found.drop.fraction)} of ${formatPercent(found.drop.limit)}`}
              />
              <p className="quiet">
                This run solid, the whole path outlined. {found.drop.dropClass === 'critical' ? 'Critical' : 'General'}:{' '}
                {formatPercent(found.drop.limit)}.
              </p>
            </>
          )}
          {found.protection.map((protection) => {
            const device = protection.device === undefined ? undefined : design.devices[protection.device];
            const fault = protection.device === undefined ? undefined : analysis.faults[protection.device];
            return (
              <section key={protection.fromEnd}>
                <h3>
                  Protection, {protection.fromEnd === 'from' ? sayEnd(design, run.from) : sayEnd(design, run.to)} end
                </h3>
                <div className="cells three">
                  <Cell caption="At the source">
                    <span className="mono">{device?.mark ?? 'none'}</span>{' '}
                    {protection.ratedA === undefined ? '' : formatA(protection.ratedA)}
                  </Cell>
                  <Cell caption="Allowed">
                    {protection.allowedRatingA === undefined ? 'not told' : formatA(protection.allowedRatingA)}
                  </Cell>
                  <Cell caption="Fault">{fault === undefined ? 'not told' : formatA(fault.greatestA)}</Cell>
                </div>
              </section>
            );
          })}
        </>
      )}
      {findings.map((finding, index) => (
        <FindingCard key={finding.id} finding={finding} isFirst={index === 0} />
      ))}
    </>
  );
}

function sayAmpacity(ampacity: {
  readonly baseA: number;
  readonly factors: readonly { readonly name: string; readonly factor: number }[];
}): string {
  const counted = ampacity.factors.filter(({ factor }) => factor !== 1);
  const factors = counted.map(({ name, factor }) =>
    factor < 1 ? `less ${formatPercent(1 - factor)} for ${name}` : `times ${factor} for ${name}`,
  );
  return `${[formatA(ampacity.baseA), ...factors].join(', ')}.`;
}

const BUILT_IN: Readonly<Record<string, string>> = { 'all-on': 'all on', 'all-charging': 'all charging' };

function nameMode(id: string, modes: Readonly<Record<string, { readonly name: string }>>): string {
  return modes[id]?.name ?? BUILT_IN[id] ?? id;
}

/** The run's own part of the drop along its path, as a fraction of nominal voltage. */
function shareOfDrop(
  run: Run,
  analysis: Analysis,
  found: {
    readonly drop: { readonly volts: number; readonly fraction: number } | null;
    readonly governingMode: string | null;
  },
): number {
  if (found.drop === null || found.drop.volts <= 0) return 0;
  const modes = found.governingMode === null ? Object.keys(analysis.modes) : [found.governingMode];
  const own = Math.max(0, ...modes.map((id) => Math.abs(analysis.modes[id]?.runs[run.id]?.voltageDropV ?? 0)));
  return Math.min(1, own / found.drop.volts) * found.drop.fraction;
}

/** The conductor itself, as wide as it is drawn. */
function Conductor({ run, colour }: { readonly run: Run; readonly colour: string }) {
  const width = coreWidth(run) * 1.4;
  const [first, second] = colour.split('/') as [PlainColour, PlainColour | undefined];
  return (
    <svg
      className="conductor"
      viewBox="0 0 150 16"
      preserveAspectRatio="none"
      aria-label={`Conductor, ${colour}`}
      role="img"
    >
      <path className="out" d="M0 8H150" stroke="var(--wire-outline)" strokeWidth={width + 2 * OUTLINE} />
      <path className={`core ${first}`} d="M0 8H150" stroke={`var(--c-${first})`} strokeWidth={width} />
      {second !== undefined && (
        <path d="M0 8H150" stroke={`var(--c-${second})`} strokeWidth={1.4} strokeDasharray="6 4" />
      )}
    </svg>
  );
}
