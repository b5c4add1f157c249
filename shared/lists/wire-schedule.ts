import { wireColours } from '#shared/kinds/wire-colour.ts';
import type { Analysis } from '#shared/model/analysis.ts';
import { conductorOf, workOf } from '#shared/model/defaults.ts';
import type { Design, End, Run, Stud } from '#shared/model/design.ts';
import { compareMarks } from '#shared/edits/marks.ts';

import { studOf } from './studs.ts';

/** A line of the wire schedule, in SI; who prints it turns it into words. */
export interface WireScheduleRow {
  readonly runId: string;
  readonly mark: string;
  /** `G1 pos`. */
  readonly from: string;
  readonly to: string;
  /** Null: not yet known. */
  readonly lengthM: number | null;
  readonly size: string;
  readonly parallel: number;
  readonly insulationC: number;
  readonly colour: string;
  readonly fromStud: Stud | null;
  readonly toStud: Stud | null;
  readonly designCurrentA: number | null;
  readonly dropFraction: number | null;
  readonly work: 'new' | 'existing' | 'remove';
  readonly link: boolean;
  readonly zones: readonly string[];
  readonly note: string;
}

/** Every run by mark, W2 before W10. Without an analysis the columns that it fills are null. */
export function wireSchedule(design: Design, analysis: Pick<Analysis, 'runs'> | null): WireScheduleRow[] {
  const colours = wireColours(design);
  return Object.values(design.runs)
    .sort(compareMarks)
    .map((run) => {
      const { size, parallel, insulationC } = conductorOf(run);
      const proved = analysis?.runs[run.id];
      return {
        runId: run.id,
        mark: run.mark ?? '',
        from: callEnd(design, run.from),
        to: callEnd(design, run.to),
        lengthM: run.lengthM ?? null,
        size,
        parallel,
        insulationC,
        colour: colours[run.id] ?? 'red',
        fromStud: studAt(design, run, run.from),
        toStud: studAt(design, run, run.to),
        designCurrentA: proved?.designCurrentA ?? null,
        dropFraction: proved?.drop?.fraction ?? null,
        work: workOf(run),
        link: run.link === true,
        zones: (run.zoneIds ?? []).flatMap((id) => design.zones[id]?.name ?? []),
        note: run.note ?? '',
      };
    });
}

function callEnd(design: Design, { device, terminal }: End): string {
  const { mark, name } = design.devices[device] ?? {};
  return `${mark || name || device} ${terminal}`;
}

/** A link is bolted: it has no lugs. */
function studAt(design: Design, run: Run, { device, terminal }: End): Stud | null {
  const found = design.devices[device];
  return found === undefined || run.link === true ? null : studOf(design, found, terminal);
}
