import { memo } from 'react';

import { CODE_SIZE, LABEL } from '#shared/layout/labels.ts';
import type { CodeLayout, LabelLayout } from '#shared/layout/sheet-layout.ts';
import { monoWidth } from '#shared/layout/text-width.ts';
import type { Ink } from '#symbols/ink.ts';

interface Props {
  readonly label: LabelLayout;
  readonly ink: Ink;
  /** The colour word, shown with the label while its run is selected. */
  readonly selectedColour?: string;
}

/** The run's mark and size. A paper-coloured ground under the letters keeps a leader or grid dot from touching them. */
export const RunLabel = memo(function RunLabel({ label, ink, selectedColour }: Props) {
  const { x, y, anchor, box, leader, code } = label;
  const text = { fontFamily: ink.monospace, fontSize: LABEL.size };
  if (selectedColour !== undefined) return <SelectedLabel label={label} ink={ink} colour={selectedColour} />;
  const start = anchor === 'start' ? x : x - (box.width - 2);
  const codeX = start + monoWidth(label.text, LABEL.size) + LABEL.codeGap;
  return (
    <g>
      {leader && (
        <path
          d={`M${leader[0].x} ${leader[0].y}L${leader[1].x} ${leader[1].y}`}
          stroke={ink.ink1}
          strokeWidth={0.75}
          fill="none"
        />
      )}
      {leader && <circle cx={leader[1].x} cy={leader[1].y} r={1.75} fill={ink.ink1} />}
      <text
        {...text}
        x={ink.colourCodes || anchor === 'start' ? start : x}
        y={y}
        textAnchor={ink.colourCodes ? 'start' : anchor}
        fontWeight={500}
        fill={ink.ink1}
      >
        {label.text}
      </text>
      {ink.colourCodes && code !== '' && (
        <text {...text} x={codeX} y={y} fontSize={CODE_SIZE} fontWeight={700} fill={ink.ink1}>
          {code}
        </text>
      )}
    </g>
  );
});

function SelectedLabel({ label, ink, colour }: { label: LabelLayout; ink: Ink; colour: string }) {
  const words = `${label.text} · ${colour}`;
  const width = monoWidth(words, LABEL.size) + 12;
  const left = label.anchor === 'start' ? label.x - 2 : label.x - width + 2;
  return (
    <g>
      <rect x={left} y={label.y - 12} width={width} height={17} fill={ink.signal} />
      <text
        x={left + 6}
        y={label.y}
        fontFamily={ink.monospace}
        fontSize={LABEL.size}
        fontWeight={600}
        fill={ink.signalInk}
      >
        {words}
      </text>
    </g>
  );
}

/** The code letters of a run's colour at the end away from its label. */
export const ColourCode = memo(function ColourCode({ code, ink }: { readonly code: CodeLayout; readonly ink: Ink }) {
  return (
    <text
      x={code.x}
      y={code.y}
      textAnchor={code.anchor}
      fontFamily={ink.monospace}
      fontSize={CODE_SIZE}
      fontWeight={700}
      fill={ink.ink1}
    >
      {code.text}
    </text>
  );
});
