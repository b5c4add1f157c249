import type { RunAnalysis } from '#shared/model/analysis.ts';
import { conductorOf } from '#shared/model/defaults.ts';
import type { Run } from '#shared/model/design.ts';
import { formatA } from '#shared/units/current.ts';
import { formatNumber } from '#shared/units/number.ts';
import { formatPercent } from '#shared/units/fraction.ts';
import { Scale } from '#src/ui/scale.tsx';

const FACTOR_WORDS = {
  temperature: 'for the heat where it lies',
  bundling: 'for what lies bundled with it',
  parallel: 'conductors in parallel',
} as const;

/** Why a run may carry what it may: the figure of the table times each factor, held against what it must carry. */
export function AmpacityChain({
  run,
  analysed,
  mode,
}: {
  readonly run: Run;
  readonly analysed: RunAnalysis;
  readonly mode: string | null;
}) {
  const { baseA, factors, allowedA } = analysed.ampacity;
  const { size, insulationC, parallel } = conductorOf(run);
  const overA = analysed.designCurrentA - allowedA;
  return (
    <>
      <h3>
        Why<span>ampacity of {run.mark ?? 'the run'}</span>
      </h3>
      <table className="chain">
        <tbody>
          <tr>
            <td>{formatA(baseA)}</td>
            <td>
              {size}, {insulationC} °C insulation
            </td>
            <td>ampacity table</td>
          </tr>
          {factors.map(({ name, factor }) => (
            <tr key={name}>
              <td>× {formatNumber(factor, 3)}</td>
              <td>{name === 'parallel' ? `${parallel} ${FACTOR_WORDS.parallel}` : FACTOR_WORDS[name]}</td>
              <td>{name}</td>
            </tr>
          ))}
          <tr className="sum">
            <td>= {formatA(allowedA)}</td>
            <td>is what it may carry</td>
            <td />
          </tr>
          <tr>
            <td>{formatA(analysed.designCurrentA)}</td>
            <td>{mode === null ? 'what it must carry' : `what it must carry, ${mode.toLowerCase()}`}</td>
            <td>design current</td>
          </tr>
          {allowedA > 0 && (
            <tr className="sum">
              <td>
                {overA > 0 ? '+' : '−'} {formatA(Math.abs(overA))}
              </td>
              <td>{overA > 0 ? `over, by ${formatPercent(overA / allowedA)}` : 'to spare'}</td>
              <td />
            </tr>
          )}
        </tbody>
      </table>
      {allowedA > 0 && (
        <Scale
          value={analysed.designCurrentA}
          limit={allowedA}
          print={formatA}
          width={464}
          label={`Carries ${formatA(analysed.designCurrentA)} of ${formatA(allowedA)}`}
        />
      )}
    </>
  );
}
