import type { VesselSummary } from '#shared/api/vessels.ts';
import type { Analysis } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';
import { useOpenDesign } from '#src/design/open-design.ts';

export interface JobStep {
  readonly title: string;
  readonly to: string;
  /** Its state in a few words. */
  readonly says: string;
  /** The part that is done, inked along the rule: 0 to 1. */
  readonly done: number;
}

/** The divisions of the path rule that there are, with how far each has come. */
export function useJobPath(vessel: VesselSummary): readonly JobStep[] {
  const design = useOpenDesign((open) => open.design);
  const analysis = useOpenDesign((open) => open.analysis);
  const seq = useOpenDesign((open) => open.seq);
  return pathOf(vessel, design, analysis, seq);
}

function pathOf(vessel: VesselSummary, design: Design, analysis: Analysis | null, seq: number): readonly JobStep[] {
  const at = (step: string) => `/vessels/${vessel.vesselId}/${step}`;
  const sheets = Object.keys(design.sheets).length;
  const runs = Object.values(design.runs);
  const measured = runs.filter((run) => run.lengthM !== undefined).length;
  const open = (analysis?.findings ?? []).filter((finding) => finding.accepted !== true);
  const musts = open.filter((finding) => finding.severity === 'must').length;
  const things = runs.length + Object.keys(design.devices).length;
  const spokenOf = new Set(
    open.filter((f) => f.severity !== 'note').map((f) => f.subject.run ?? f.subject.device ?? f.subject.zone ?? ''),
  );
  const lines = analysis?.parts.length ?? 0;

  return [
    { title: 'Draw', to: at('draw'), says: count(sheets, 'sheet'), done: share(measured, runs.length) },
    {
      title: 'Findings',
      to: at('findings'),
      says: analysis === null ? 'checking' : sayFindings(open.length, musts),
      done: analysis === null || things === 0 ? 0 : share(Math.max(0, things - spokenOf.size), things),
    },
    {
      title: 'Parts',
      to: at('parts'),
      says: analysis === null ? 'checking' : count(lines, 'line'),
      done: lines === 0 ? 0 : share(measured, runs.length),
    },
    {
      title: 'Print',
      to: at('print'),
      says: vessel.revision === null ? 'nothing issued' : `revision ${vessel.revision.letter} issued`,
      done: vessel.revision === null || seq < 0 ? 0 : 1,
    },
  ];
}

function sayFindings(open: number, musts: number): string {
  if (open === 0) return 'none left';
  return musts === 0 ? `${open} left` : `${open} left, ${musts} must fix`;
}

function share(part: number, whole: number): number {
  return whole === 0 ? 0 : part / whole;
}

function count(n: number, word: string): string {
  return `${n} ${word}${n === 1 ? '' : 's'}`;
}
