import type { Run } from '#shared/model/design.ts';
import { conductorOf } from '#shared/model/defaults.ts';

/** The length that is bought, divided into the runs it is cut for, longest first; what is left over stays open. */
export function CableCut({
  runs,
  boughtM,
  says,
}: {
  readonly runs: readonly Run[];
  readonly boughtM: number;
  readonly says: (lengthM: number) => string;
}) {
  const pieces = runs
    .flatMap((run) =>
      Array.from({ length: conductorOf(run).parallel }, () => ({ mark: run.mark ?? 'run', lengthM: run.lengthM ?? 0 })),
    )
    .filter((piece) => piece.lengthM > 0)
    .sort((a, b) => b.lengthM - a.lengthM);
  if (boughtM <= 0 || pieces.length === 0) return null;
  const froms = startsOf(pieces.map((piece) => piece.lengthM));
  return (
    <svg
      className="cable-cut"
      viewBox="0 0 288 34"
      role="img"
      aria-label={`${says(boughtM)} cut into ${pieces.map(({ mark, lengthM }) => `${mark} ${says(lengthM)}`).join(', ')}`}
    >
      <rect x={0.5} y={2} width={287} height={16} fill="url(#hatch-ink)" stroke="var(--ink-1)" />
      {pieces.map(({ mark, lengthM }, i) => {
        const width = (lengthM / boughtM) * 288;
        const x = ((froms[i] ?? 0) / boughtM) * 288;
        return (
          <g key={`${mark}-${i}`}>
            <rect x={x} y={2} width={width} height={16} fill="var(--sheet)" stroke="var(--ink-1)" />
            {width > mark.length * 8 + 2 && (
              <text x={x + width / 2} y={30} textAnchor="middle">
                {mark}
              </text>
            )}
          </g>
        );
      })}
    </svg>
  );
}

/** Where each of several lengths laid end to end begins. */
function startsOf(lengths: readonly number[]): number[] {
  return lengths.map((_length, i) => lengths.slice(0, i).reduce((sum, length) => sum + length, 0));
}
