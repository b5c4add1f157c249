import { memo } from 'react';

import { cautionBox } from '#shared/layout/paper.ts';
import { wrapText } from '#shared/layout/text-width.ts';
import type { Sheet } from '#shared/model/design.ts';
import type { Ink } from '#symbols/ink.ts';

export const CAUTION =
  'A design aid, not a certificate. AC power and battery banks can kill and start fires. Local codes and a qualified person have the last word.';
export const NOT_FOR_BUILDING = 'In review, not for building';

interface Props {
  readonly sheet: Sheet;
  readonly ink: Ink;
  /** Must-fix findings are left: the sheet says that nobody may build from it. */
  readonly inReview: boolean;
}

/** On every sheet, beside the title block or above it. */
export const Caution = memo(function Caution({ sheet, ink, inReview }: Props) {
  const box = cautionBox(sheet);
  const lines = wrapText(CAUTION, 7.4, box.width - 16);
  const first = box.y + box.height - 5 - (lines.length - 1) * 8;
  return (
    <g>
      {inReview && (
        <text x={box.x + 8} y={first - 12} fontFamily={ink.text} fontSize={11} fontWeight={600} fill={ink.ink1}>
          {NOT_FOR_BUILDING}
        </text>
      )}
      {lines.map((line, i) => (
        <text
          key={line}
          x={box.x + 8}
          y={first + i * 8}
          fontFamily={ink.text}
          fontSize={7.4}
          fontWeight={400}
          fill={ink.ink2}
        >
          {line}
        </text>
      ))}
    </g>
  );
});
