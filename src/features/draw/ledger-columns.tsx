import type { ReactNode } from 'react';

import { setField } from '#shared/edits/set-field.ts';
import type { Analysis, Finding } from '#shared/model/analysis.ts';
import { basisOf } from '#shared/model/defaults.ts';
import type { Design, PlainColour, Run } from '#shared/model/design.ts';
import { formatA } from '#shared/units/current.ts';
import { formatPercent, formatPercentBeside } from '#shared/units/fraction.ts';
import { formatLength, type UnitSystem } from '#shared/units/length.ts';
import { formatV } from '#shared/units/voltage.ts';
import type { Reading } from '#src/ui/cell.tsx';
import { Severity } from '#src/ui/severity.tsx';

import { readColour, readEnd, readLength, readSize, readZones } from './readings.ts';
import { sayColour, sayEnd, sayProtection, sayZones, verdictOf } from './run-words.ts';
import { readChecked } from './use-edit.ts';

export interface LedgerRow {
  readonly run: Run;
  readonly findings: readonly Finding[];
}

export interface LedgerFacts {
  readonly design: Design;
  readonly analysis: Analysis | null;
  readonly units: UnitSystem;
}

export interface Column {
  readonly key: string;
  readonly title: string;
  readonly width: number;
  readonly right?: true;
  readonly mono?: true;
  /** Where the desk is narrow it is left out. */
  readonly wideOnly?: true;
  readonly show: (row: LedgerRow, facts: LedgerFacts) => ReactNode;
  readonly edit?: {
    readonly text: (row: LedgerRow, facts: LedgerFacts) => string;
    readonly path: (run: Run) => readonly string[];
    readonly read: (text: string, run: Run, facts: LedgerFacts) => Reading<unknown>;
  };
}

function field(
  name: string,
  text: (row: LedgerRow, facts: LedgerFacts) => string,
  read: (text: string, facts: LedgerFacts) => Reading<unknown>,
): NonNullable<Column['edit']> {
  const path = (run: Run) => ['runs', run.id, ...name.split('.')];
  return {
    text,
    path,
    read: (typed, run, facts) =>
      readChecked(read(typed, facts), (value) => setField(facts.design, path(run), value).refused),
  };
}

const anyText = (text: string): Reading<string> => ({ ok: true, value: text.trim() });

/** The run ledger's columns; what has `edit` is typed in place. */
export const COLUMNS: readonly Column[] = [
  {
    key: 'mark',
    title: 'Run',
    width: 56,
    mono: true,
    show: ({ run }) => run.mark ?? '',
    edit: field('mark', ({ run }) => run.mark ?? '', anyText),
  },
  {
    key: 'from',
    title: 'From',
    width: 104,
    mono: true,
    show: ({ run }, { design }) => sayEnd(design, run.from),
    edit: field(
      'from',
      ({ run }, { design }) => sayEnd(design, run.from),
      (text, { design }) => readEnd(text, design),
    ),
  },
  {
    key: 'to',
    title: 'To',
    width: 104,
    mono: true,
    show: ({ run }, { design }) => sayEnd(design, run.to),
    edit: field(
      'to',
      ({ run }, { design }) => sayEnd(design, run.to),
      (text, { design }) => readEnd(text, design),
    ),
  },
  {
    key: 'length',
    title: 'Length',
    width: 96,
    right: true,
    show: ({ run }, { units }) =>
      run.lengthM === undefined ? <span className="quiet">not known</span> : formatLength(run.lengthM, units),
    edit: field(
      'lengthM',
      ({ run }, { units }) => (run.lengthM === undefined ? '' : formatLength(run.lengthM, units)),
      (text, { units }) => readLength(text, units),
    ),
  },
  {
    key: 'size',
    title: 'Size',
    width: 52,
    mono: true,
    show: ({ run }) => run.conductor.size.replace(' AWG', ''),
    edit: field(
      'conductor.size',
      ({ run }) => run.conductor.size,
      (text, { design }) => readSize(text, basisOf(design).profile === 'iso-13297'),
    ),
  },
  {
    key: 'colour',
    title: 'Colour',
    width: 88,
    show: ({ run }, { design }) => {
      const colour = sayColour(design, run);
      return (
        <>
          <Swatch colour={colour} /> {colour}
        </>
      );
    },
    edit: field(
      'colour',
      ({ run }) => run.colour ?? '',
      (text) => readColour(text),
    ),
  },
  {
    key: 'zones',
    title: 'Zones',
    width: 96,
    wideOnly: true,
    show: ({ run }, { design }) => sayZones(design, run),
    edit: field(
      'zoneIds',
      ({ run }, { design }) => sayZones(design, run),
      (text, { design }) => readZones(text, design),
    ),
  },
  {
    key: 'carries',
    title: 'Carries',
    width: 64,
    right: true,
    show: ({ run }, { analysis }) => amps(analysis?.runs[run.id]?.designCurrentA),
  },
  {
    key: 'good-for',
    title: 'Good for',
    width: 68,
    right: true,
    show: ({ run }, { analysis }) => amps(analysis?.runs[run.id]?.ampacity.allowedA),
  },
  {
    key: 'limit',
    title: 'Of its limit',
    width: 84,
    wideOnly: true,
    show: ({ run }, { analysis }) => <LimitBar analysis={analysis} run={run} />,
  },
  {
    key: 'drop',
    title: 'Drop',
    width: 64,
    right: true,
    show: ({ run }, { analysis }) => {
      const volts = Math.abs(analysis?.runs[run.id]?.drop?.volts ?? Number.NaN);
      return Number.isFinite(volts) ? formatV(volts) : '';
    },
  },
  {
    key: 'path',
    title: 'Path',
    width: 64,
    right: true,
    wideOnly: true,
    show: ({ run }, { analysis }) => {
      const drop = analysis?.runs[run.id]?.drop;
      return drop === null || drop === undefined ? '' : formatPercentBeside(drop.fraction, drop.limit);
    },
  },
  {
    key: 'protection',
    title: 'Protection',
    width: 96,
    wideOnly: true,
    show: ({ run }, { design, analysis }) => sayProtection(design, analysis, run),
  },
  {
    key: 'check',
    title: 'Check',
    width: 100,
    show: ({ findings }, { analysis }) => (analysis === null ? '' : <Severity of={verdictOf(findings)} />),
  },
];

function amps(value: number | undefined): string {
  return value === undefined ? '' : formatA(value);
}

/** A piece of the conductor, one stripe or two. */
export function Swatch({ colour }: { readonly colour: string }) {
  const [first, second] = colour.split('/') as [PlainColour, PlainColour | undefined];
  return (
    <i className={`swatch ${first}`} style={{ background: `var(--c-${first})` }}>
      {second !== undefined && <i style={{ background: `var(--c-${second})` }} />}
    </i>
  );
}

/** How much of what the run is good for it would carry; the stroke is the limit. */
function LimitBar({ analysis, run }: { readonly analysis: Analysis | null; readonly run: Run }) {
  const found = analysis?.runs[run.id];
  if (found === undefined || found.ampacity.allowedA <= 0) return null;
  const share = found.designCurrentA / found.ampacity.allowedA;
  const width = Math.min(64, 52 * share);
  return (
    <svg className="limit-bar" width={64} height={10} role="img" aria-label={formatPercent(share)}>
      <path d="M0 9.5H64" stroke="var(--ink-1)" />
      <rect x={0} y={2} width={width} height={5} fill={share > 1 ? 'var(--must)' : 'var(--ink-1)'} />
      <path d="M52 0V10" stroke="var(--ink-1)" strokeWidth={2} />
    </svg>
  );
}
