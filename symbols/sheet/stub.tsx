import { memo } from 'react';

import type { StubLayout } from '#shared/layout/sheet-layout.ts';
import { FLAG } from '#shared/layout/stubs.ts';
import type { Ink } from '#symbols/ink.ts';

/** The flag at the end of a run that goes on on another sheet: sheet and square, pointing the way it goes. */
export const Stub = memo(function Stub({ stub, ink }: { readonly stub: StubLayout; readonly ink: Ink }) {
  const { x, y, points, text } = stub;
  // the point takes a share of an upright flag, so its letters stand off the middle
  const shift = points === 'up' ? FLAG.point / 2 : points === 'down' ? -FLAG.point / 2 : 0;
  const aside = points === 'right' ? -1.5 : points === 'left' ? 1.5 : 0;
  return (
    <g>
      <path d={flagPath(stub)} fill={ink.sheet} stroke={ink.ink1} strokeWidth={1} strokeLinejoin="round" />
      <text
        x={x + aside}
        y={y + 3.4 + shift}
        textAnchor="middle"
        fontFamily={ink.monospace}
        fontSize={9.5}
        fontWeight={500}
        fill={ink.ink1}
      >
        {text}
      </text>
    </g>
  );
});

function flagPath({ x, y, points }: StubLayout): string {
  const w = FLAG.width / 2;
  const p = FLAG.point;
  if (points === 'right' || points === 'left') {
    const h = FLAG.height / 2;
    return points === 'right'
      ? `M${x - w} ${y - h}H${x + w - p}L${x + w} ${y}L${x + w - p} ${y + h}H${x - w}Z`
      : `M${x + w} ${y - h}H${x - w + p}L${x - w} ${y}L${x - w + p} ${y + h}H${x + w}Z`;
  }
  const h = FLAG.uprightHeight / 2;
  return points === 'down'
    ? `M${x - w} ${y - h}H${x + w}V${y + h - p}L${x} ${y + h}L${x - w} ${y + h - p}Z`
    : `M${x - w} ${y + h}H${x + w}V${y - h + p}L${x} ${y - h}L${x - w} ${y - h + p}Z`;
}
