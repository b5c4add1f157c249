/** The rule over the profiles, from 0 to the end of the strip. */
export function LengthRuler({ pxPerM, units }: { readonly pxPerM: number; readonly units: 'us' | 'metric' }) {
  const unit = units === 'us' ? pxPerM * 0.3048 : pxPerM;
  const labelStep = [1, 2, 4, 5, 10, 20, 40, 50, 100].find((step) => step * unit >= 76) ?? 100;
  const tickStep = labelStep / (labelStep % 4 === 0 ? 4 : labelStep % 5 === 0 ? 5 : 2);
  const last = Math.floor(418 / unit / labelStep) * labelStep;
  const ticks = Array.from({ length: Math.round(last / tickStep) + 1 }, (_, i) => i * tickStep);
  return (
    <svg className="ruler" viewBox="-12 0 440 22" aria-hidden="true" preserveAspectRatio="xMinYMax meet">
      {ticks.map((tick) => {
        const isLabelled = Math.abs(tick / labelStep - Math.round(tick / labelStep)) < 1e-9;
        return (
          <g key={tick}>
            <path d={`M${tick * unit} ${isLabelled ? 13 : 17}V22`} />
            {isLabelled && (
              <text x={tick * unit} y={10} textAnchor={tick === 0 ? 'start' : tick === last ? 'end' : 'middle'}>
                {tick}
                {tick === last ? (units === 'us' ? ' ft' : ' m') : ''}
              </text>
            )}
          </g>
        );
      })}
      <path d={`M0 21.5H${last * unit}`} />
    </svg>
  );
}
