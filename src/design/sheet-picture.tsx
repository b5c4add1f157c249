import { memo, useMemo, type CSSProperties } from 'react';

import { layoutSheet } from '#shared/layout/layout-sheet.ts';
import { paperSize } from '#shared/layout/paper.ts';
import { sheetOf } from '#shared/model/defaults.ts';
import type { Design, EntityId, Sheet } from '#shared/model/design.ts';
import { screenInk, type Ink } from '#symbols/ink.ts';
import { SheetDrawing } from '#symbols/sheet/sheet-drawing.tsx';
import { titleFieldsOf, type IssueFacts } from '#symbols/sheet/title-fields.ts';

/** A whole sheet to look at: the same drawing as on the canvas and on paper, laid out by the same code. */
export const SheetPicture = memo(function SheetPicture({
  design,
  sheetId,
  facts,
  inReview,
  ink = screenInk,
  className,
}: {
  readonly design: Design;
  readonly sheetId: EntityId;
  readonly facts?: IssueFacts;
  readonly inReview: boolean;
  readonly ink?: Ink;
  readonly className?: string;
}) {
  const layout = useMemo(() => layoutSheet(design, sheetId), [design, sheetId]);
  const sheet = sheetOf(design.sheets[sheetId] ?? { id: sheetId });
  const { width, height } = paperSize(sheet);
  return (
    <svg
      className={className}
      style={{ '--ratio': width / height } as CSSProperties}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={nameOfSheet(sheet)}
    >
      <SheetDrawing
        design={design}
        sheetId={sheetId}
        layout={layout}
        ink={ink}
        titleBlock={titleFieldsOf(design, sheetId, facts)}
        inReview={inReview}
      />
    </svg>
  );
});

export function nameOfSheet(sheet: Sheet): string {
  const { number, title } = sheetOf(sheet);
  return title === '' ? `Sheet ${number}` : `Sheet ${number}, ${title}`;
}

/** By number, as they are bound. */
export function sheetsInOrder(design: Design): Sheet[] {
  return Object.values(design.sheets).sort((a, b) => sheetOf(a).number - sheetOf(b).number || a.id.localeCompare(b.id));
}
