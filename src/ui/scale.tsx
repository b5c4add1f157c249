/**
 * A value against its limit, read off a graduated bar: what is over the limit is hatched, the limit a stroke with its
 * figure. It ends at a round figure past the larger of the two. With `of`, the value is a share inside an outlined bar.
 */
export function Scale({
  value,
  limit,
  of,
  print,
  label,
  width = 272,
}: {
  readonly value: number;
  readonly limit: number;
  /** The whole of which `value` is the part of this thing. */
  readonly of?: number;
  readonly print: (value: number) => string;
  readonly label: string;
  /** Inner width of the drawing; it stretches to its place. */
  readonly width?: number;
}) {
  const whole = of ?? value;
  const step = roundStep(Math.max(whole, limit, 1e-9));
  const end = Math.max(step, Math.ceil((Math.max(whole, limit) * 1.02) / step) * step);
  const at = (x: number) => (Math.max(0, x) / end) * width;
  const ticks = Array.from({ length: Math.round(end / step) + 1 }, (_, i) => i * step);
  const farFromLimit = (tick: number) => Math.abs(at(tick) - at(limit)) > width * 0.13;
  const overFrom = Math.min(whole, limit);

  return (
    <svg
      className="scale"
      viewBox={`0 0 ${width} 30`}
      role="img"
      aria-label={label}
      preserveAspectRatio="xMinYMid meet"
    >
      {of !== undefined && <rect className="share" x={0} y={2} width={at(Math.min(whole, limit))} height={8} />}
      <rect className="bar" x={0} y={2} width={at(Math.min(value, limit))} height={8} />
      {whole > limit && <rect className="over" x={at(overFrom)} y={2} width={at(whole) - at(overFrom)} height={8} />}
      <path className="base" d={`M0 12.5H${width}`} />
      {ticks.map((tick) => (
        <g key={tick}>
          <path className="tick" d={`M${at(tick)} 12.5v4`} />
          {farFromLimit(tick) && (
            <text x={at(tick)} y={27} textAnchor={tick === 0 ? 'start' : at(tick) > width - 12 ? 'end' : 'middle'}>
              {print(tick).replace(/\s.*$/, tick === 0 ? '' : '$&')}
            </text>
          )}
        </g>
      ))}
      <path className="lim" d={`M${at(limit)} 0V15`} />
      <text className="limit" x={at(limit)} y={27} textAnchor={at(limit) > width - 24 ? 'end' : 'middle'}>
        {print(limit)}
      </text>
    </svg>
  );
}

/** 1, 2 or 5 times a power of ten, so that two to five steps fill the scale. */
export function roundStep(most: number): number {
  const power = 10 ** Math.floor(Math.log10(most));
  const lead = most / power;
  return power * (lead < 1.5 ? 0.5 : lead < 3.5 ? 1 : lead < 7 ? 2 : 5);
}

/** The pattern of what is over a limit; once on a page. */
export function Hatch() {
  return (
    <svg width="0" height="0" className="absolute" aria-hidden="true">
      <defs>
        <pattern id="hatch" width="4" height="4" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path className="hatchline" d="M0 0V4" />
        </pattern>
        <pattern id="hatch-ink" width="5" height="5" patternUnits="userSpaceOnUse" patternTransform="rotate(45)">
          <path d="M0 0V5" stroke="var(--ink-1)" strokeWidth="1" />
        </pattern>
      </defs>
    </svg>
  );
}
