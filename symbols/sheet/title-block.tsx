import { memo, type ReactNode } from 'react';

import { titleBlockBox } from '#shared/layout/paper.ts';
import { textWidth } from '#shared/layout/text-width.ts';
import type { Sheet } from '#shared/model/design.ts';
import type { Ink } from '#symbols/ink.ts';

/** The fields of ISO 7200 that a drawing office fills. */
export interface TitleBlockFields {
  readonly legalOwner: string;
  readonly title: string;
  readonly drawingNumber: string;
  readonly vessel: string;
  readonly documentType: string;
  readonly revision: string;
  readonly sheet: string;
  readonly created: string;
  readonly approved: string;
  readonly issued: string;
  readonly paper: string;
  readonly checked: string;
}

interface Props {
  readonly fields: TitleBlockFields;
  readonly sheet: Sheet;
  readonly ink: Ink;
}

const ROW = 28;
/** The upright rules, measured from the left of the block. */
const RULES = { approved: 66, middle: 132, paper: 217, right: 302, last: 359 };

/** Three rows low right in the frame, 180 x 36.75 mm. */
export const TitleBlock = memo(function TitleBlock({ fields, sheet, ink }: Props) {
  const { x, y, width, height } = titleBlockBox(sheet);
  const { approved, middle, paper, right, last } = RULES;
  const rules = `M0 ${ROW}H${width}M0 ${2 * ROW}H${width}M${middle} 0V${height}M${right} 0V${height}M${approved} ${2 * ROW}V${height}M${paper} ${2 * ROW}V${height}M${last} ${ROW}V${height}`;
  const cell = (column: number, row: number, end: number, caption: string, value: ReactNode, size: Size = 'plain') => (
    <Field
      x={column}
      y={row * ROW}
      width={end - column}
      caption={caption}
      value={String(value)}
      size={size}
      ink={ink}
    />
  );
  return (
    <g transform={`translate(${x} ${y})`}>
      <rect width={width} height={height} fill={ink.sheet} stroke={ink.ink1} strokeWidth={1.6} />
      <path d={rules} fill="none" stroke={ink.ink1} strokeWidth={0.75} />
      {cell(0, 0, middle, 'Legal owner', fields.legalOwner)}
      {cell(middle, 0, right, 'Title', fields.title, 'title')}
      {cell(right, 0, width, 'Drawing number', fields.drawingNumber, 'mono')}
      {cell(0, 1, middle, 'Vessel', fields.vessel)}
      {cell(middle, 1, right, 'Document type', fields.documentType)}
      {cell(right, 1, last, 'Revision', fields.revision, 'mono')}
      {cell(last, 1, width, 'Sheet', fields.sheet, 'mono')}
      {cell(0, 2, approved, 'Created', fields.created)}
      {cell(approved, 2, middle, 'Approved', fields.approved)}
      {cell(middle, 2, paper, 'Date of issue', fields.issued, 'mono')}
      {cell(paper, 2, right, 'Paper', fields.paper)}
      {cell(right, 2, last, 'Drawn with', 'Ampwright')}
      {cell(last, 2, width, 'Checked', fields.checked)}
    </g>
  );
});

type Size = 'plain' | 'mono' | 'title';

interface FieldProps {
  readonly x: number;
  readonly y: number;
  readonly width: number;
  readonly caption: string;
  readonly value: string;
  readonly size: Size;
  readonly ink: Ink;
}

function Field({ x, y, width, caption, value, size, ink }: FieldProps) {
  const height = size === 'title' ? 15 : 9;
  const fitted = fitSize(value, height, width - 9, size === 'mono');
  return (
    <>
      <text x={x + 5} y={y + 8.5} fontFamily={ink.text} fontSize={7} fontWeight={400} fill={ink.ink2}>
        {caption}
      </text>
      <text
        x={x + 5}
        y={y + (size === 'title' ? 23 : 21.5)}
        fontFamily={size === 'mono' ? ink.monospace : ink.text}
        fontSize={fitted}
        fontWeight={size === 'title' ? 600 : size === 'mono' ? 500 : 400}
        fill={ink.ink1}
      >
        {value}
      </text>
    </>
  );
}

/** A long title is set smaller rather than over the rule beside it. */
function fitSize(text: string, size: number, width: number, mono: boolean): number {
  const wide = mono ? text.length * 0.632 * size : textWidth(text, size);
  return wide <= width ? size : Math.max(5, Math.floor((size * width * 10) / wide) / 10);
}
