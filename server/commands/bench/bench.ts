import type { BenchPlace } from './place.ts';

/** One thing that is measured. Names are stable: `analyse/minnow`, `open/minnow`, `canvas/drag-300` … */
export interface Bench {
  readonly name: string;
  /** What one sample is, in a few words. */
  readonly what: string;
  measure(place: BenchPlace): Promise<Measured>;
}

export interface Measured {
  readonly samplesMs: readonly number[];
  /** Something else that does the same work, measured beside it in the same run, sample by sample in turn. */
  readonly beside?: { readonly what: string; readonly samplesMs: readonly number[] };
}

export interface BenchLine {
  readonly name: string;
  readonly value: number;
  readonly unit: 'ms';
  /** Median of what was measured beside it; `ratio` is value by reference. */
  readonly reference?: number;
  readonly ratio?: number;
  readonly median: number;
  readonly p95: number;
  readonly samples: number;
}

export function benchLine(name: string, { samplesMs, beside }: Measured): BenchLine {
  const median = quantile(samplesMs, 0.5);
  const reference = beside === undefined ? undefined : quantile(beside.samplesMs, 0.5);
  return {
    name,
    value: median,
    unit: 'ms',
    ...(reference === undefined ? {} : { reference, ratio: median / reference }),
    median,
    p95: quantile(samplesMs, 0.95),
    samples: samplesMs.length,
  };
}

/** Between the two nearest samples in proportion. */
export function quantile(samples: readonly number[], share: number): number {
  if (samples.length === 0) throw new Error('nothing was measured');
  const sorted = samples.toSorted((a, b) => a - b);
  const at = (sorted.length - 1) * share;
  const below = sorted[Math.floor(at)]!;
  const above = sorted[Math.ceil(at)]!;
  return below + (above - below) * (at - Math.floor(at));
}

/** Takes samples of one thing, or of two in turn so that what else the machine does falls on both alike. */
export async function sample(
  count: number,
  subject: () => unknown,
  beside?: { readonly what: string; readonly run: () => unknown },
): Promise<Measured> {
  const samplesMs: number[] = [];
  const besideMs: number[] = [];
  for (let taken = 0; taken < count; taken += 1) {
    samplesMs.push(await timed(subject));
    if (beside !== undefined) besideMs.push(await timed(beside.run));
  }
  return beside === undefined ? { samplesMs } : { samplesMs, beside: { what: beside.what, samplesMs: besideMs } };
}

async function timed(run: () => unknown): Promise<number> {
  const began = performance.now();
  await run();
  return performance.now() - began;
}
