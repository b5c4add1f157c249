import { memo } from 'react';

import { frameBox, MM_PER_UNIT, paperSize, squareLetter, squareLines } from '#shared/layout/paper.ts';
import type { Sheet } from '#shared/model/design.ts';
import type { Ink } from '#symbols/ink.ts';

/** The frame of the sheet, its reference squares in a 5 mm border, and the centring marks. */
export const Frame = memo(function Frame({ sheet, ink }: { readonly sheet: Sheet; readonly ink: Ink }) {
  const { width, height } = paperSize(sheet);
  const frame = frameBox(sheet);
  const right = frame.x + frame.width;
  const bottom = frame.y + frame.height;
  const border = 5 / MM_PER_UNIT;
  const { x: columns, y: rows } = squareLines(sheet);
  const middleX = round(width / 2);
  const middleY = round(height / 2);
  const ticks = [
    ...columns
      .slice(1, -1)
      .map(
        (x) => `M${round(x)} ${round(frame.y - border)}v${round(border)}M${round(x)} ${round(bottom)}v${round(border)}`,
      ),
    ...rows
      .slice(1, -1)
      .map(
        (y) => `M${round(frame.x - border)} ${round(y)}h${round(border)}M${round(right)} ${round(y)}h${round(border)}`,
      ),
  ].join('');
  const outer = `M${round(frame.x - border)} ${round(frame.y - border)}H${round(right + border)}V${round(bottom + border)}H${round(frame.x - border)}Z`;
  const inner = `M${round(frame.x)} ${round(frame.y)}H${round(right)}V${round(bottom)}H${round(frame.x)}Z`;
  const centring = `M${middleX} 0V${round(frame.y + 5)}M${middleX} ${round(bottom - 5)}V${round(height)}M0 ${middleY}H${round(frame.x + 5)}M${round(right - 5)} ${middleY}H${round(width)}`;
  return (
    <g fill="none" stroke={ink.ink1}>
      <path d={outer + ticks} strokeWidth={0.75} />
      <path d={inner + centring} strokeWidth={1.6} />
      <g stroke="none" fill={ink.ink2} fontFamily={ink.text} fontSize={8} textAnchor="middle">
        {middles(columns).flatMap((x, i) => [
          <Reference key={`t${x}`} x={x} y={frame.y - border / 2} text={String(i + 1)} ink={ink} />,
          <Reference key={`b${x}`} x={x} y={bottom + border / 2} text={String(i + 1)} ink={ink} />,
        ])}
        {middles(rows).flatMap((y, i) => [
          <Reference key={`l${y}`} x={frame.x - border / 2} y={y} text={squareLetter(i)} ink={ink} />,
          <Reference key={`r${y}`} x={right + border / 2} y={y} text={squareLetter(i)} ink={ink} />,
        ])}
      </g>
    </g>
  );
});

function Reference({ x, y, text, ink }: { x: number; y: number; text: string; ink: Ink }) {
  return (
    <text x={round(x)} y={round(y + 2.9)} fontFamily={ink.text} fontSize={8} fontWeight={400} textAnchor="middle">
      {text}
    </text>
  );
}

function middles(lines: readonly number[]): number[] {
  return lines.slice(1).map((line, i) => (line + lines[i]!) / 2);
}

function round(value: number): number {
  return Math.round(value * 100) / 100;
}
