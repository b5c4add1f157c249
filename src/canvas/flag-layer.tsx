import { memo } from 'react';

import type { FindingFlag } from './finding-flags.ts';

/** The severity's shape with its number in the list, on a leader to what it speaks of. */
export const FlagLayer = memo(function FlagLayer({ flags }: { readonly flags: readonly FindingFlag[] }) {
  return flags.map(({ findingId, at, dot, severity, number, says }) => {
    const far = Math.hypot(dot.x - at.x, dot.y - at.y) || 1;
    const edge = { x: at.x + ((dot.x - at.x) / far) * 9, y: at.y + ((dot.y - at.y) / far) * 9 };
    return (
      <g key={findingId}>
        <title>{says}</title>
        <path className="leader" d={`M${edge.x} ${edge.y}L${dot.x} ${dot.y}`} />
        <circle className="leader-end" cx={dot.x} cy={dot.y} r={1.75} />
        <g className={`flag ${severity}`} transform={`translate(${at.x} ${at.y})`}>
          <path d={SHAPES[severity]} />
          <text y={severity === 'should' ? 5.5 : 3.7} fontSize={number > 99 ? 7.5 : 10.5}>
            {number}
          </text>
        </g>
      </g>
    );
  });
});

const SHAPES = {
  must: 'M-3.7 -9h7.4L9 -3.7v7.4L3.7 9h-7.4L-9 3.7v-7.4Z',
  should: 'M0 -10.5L11 9H-11Z',
  note: 'M-9 0a9 9 0 1 0 18 0a9 9 0 1 0 -18 0Z',
} as const;
