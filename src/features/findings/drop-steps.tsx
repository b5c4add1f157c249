import type { Analysis, RunAnalysis } from '#shared/model/analysis.ts';
import { basisOf, conductorOf } from '#shared/model/defaults.ts';
import type { Design } from '#shared/model/design.ts';
import { formatPercent } from '#shared/units/fraction.ts';
import { formatLength } from '#shared/units/length.ts';
import { formatV } from '#shared/units/voltage.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import { roundStep } from '#src/ui/scale.tsx';

type Drop = NonNullable<RunAnalysis['drop']>;

const ROW = 14;
const LEFT = 166;
const RIGHT = 400;
const WIDTH = 464;

/** The way of the current to a load and back, and what each run of it takes of the voltage, against the limit. */
export function DropSteps({
  design,
  analysis,
  drop,
  runId,
}: {
  readonly design: Design;
  readonly analysis: Analysis;
  readonly drop: Drop;
  /** The run that is looked at: inked. */
  readonly runId?: string;
}) {
  const units = useUnits(basisOf(design).units);
  const load = design.devices[drop.worstLoad];
  const steps = stepsOf(analysis, drop);
  const nominalV = drop.fraction > 0 ? drop.volts / drop.fraction : 1;
  const endShare = Math.max(drop.limit, drop.fraction, 1e-6) * 1.05;
  const at = (volts: number) => LEFT + (volts / nominalV / endShare) * (RIGHT - LEFT);
  const base = steps.length * ROW + 2;
  const step = roundStep(endShare);
  const ticks = Array.from({ length: Math.floor(endShare / step) + 1 }, (_, i) => i * step);
  const limitX = at(drop.limit * nominalV);

  return (
    <>
      <h3>
        Drop to {load?.mark ?? 'the load'} and back: {formatV(drop.volts)}, {formatPercent(drop.fraction)}
        <span>conductors only, {drop.dropClass}</span>
      </h3>
      <svg
        className="scale"
        style={{ height: 'auto' }}
        viewBox={`0 0 ${WIDTH} ${base + 18}`}
        role="img"
        aria-label={`Voltage drop ${formatV(drop.volts)}, ${formatPercent(drop.fraction)} of a limit of ${formatPercent(drop.limit)}; ${steps
          .map(({ id, volts }) => `${design.runs[id]?.mark ?? id} ${formatV(volts)}`)
          .join(', ')}`}
      >
        {steps.map(({ id, volts }, i) => {
          const run = design.runs[id];
          const before = steps.slice(0, i).reduce((sum, step) => sum + step.volts, 0);
          const after = before + volts;
          const x = at(before);
          const y = i * ROW;
          return (
            <g key={`${id}-${i}`}>
              <text className="mark" x={0} y={y + 11} style={{ fontWeight: id === runId ? 700 : 500 }}>
                {run?.mark ?? 'run'}
              </text>
              <text x={36} y={y + 11}>
                {run === undefined ? '' : conductorOf(run).size}
              </text>
              <text x={LEFT - 6} y={y + 11} textAnchor="end">
                {run?.lengthM === undefined ? '' : formatLength(run.lengthM, units)}
              </text>
              <rect
                className={id === runId ? 'bar' : 'share'}
                x={x}
                y={y + 3}
                width={Math.max(0.5, at(after) - x)}
                height={9}
              />
              {i < steps.length - 1 && <path className="tick" d={`M${at(after)} ${y + 12}v5`} />}
              <text className="figure" x={WIDTH} y={y + 11} textAnchor="end">
                {volts.toFixed(3)} V
              </text>
            </g>
          );
        })}
        <path className="base" d={`M${LEFT} ${base}H${RIGHT}`} />
        {ticks.map((tick) => (
          <g key={tick}>
            <path className="tick" d={`M${at(tick * nominalV)} ${base}v5`} />
            {Math.abs(at(tick * nominalV) - limitX) > 26 && (
              <text x={at(tick * nominalV)} y={base + 16} textAnchor="middle">
                {formatPercent(tick)}
              </text>
            )}
          </g>
        ))}
        <path className="lim" d={`M${limitX} 0V${base + 5}`} />
        <text className="limit" x={limitX} y={base + 16} textAnchor="middle">
          {formatPercent(drop.limit)}
        </text>
      </svg>
    </>
  );
}

/** Of the solved modes, the one whose drops along the path add up to the drop that is told. */
function stepsOf(analysis: Analysis, drop: Drop): readonly { readonly id: string; readonly volts: number }[] {
  const ways = Object.values(analysis.modes).map((mode) =>
    drop.path.map((id) => ({ id, volts: Math.abs(mode.runs[id]?.voltageDropV ?? 0) })),
  );
  const missBy = (way: (typeof ways)[number]) => Math.abs(way.reduce((sum, { volts }) => sum + volts, 0) - drop.volts);
  return ways.sort((a, b) => missBy(a) - missBy(b))[0] ?? [];
}
