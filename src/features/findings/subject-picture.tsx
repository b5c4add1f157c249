import { useMemo } from 'react';

import { boxOf } from '#shared/kinds/place.ts';
import { layoutSheet } from '#shared/layout/layout-sheet.ts';
import type { Design, EntityId } from '#shared/model/design.ts';
import { screenInk } from '#symbols/ink.ts';
import { SheetDrawing } from '#symbols/sheet/sheet-drawing.tsx';
import { titleFieldsOf } from '#symbols/sheet/title-fields.ts';

const LEAST = { width: 300, height: 108 };

/** The piece of the sheet that a finding speaks of, with the run or device marked. */
export function SubjectPicture({
  design,
  sheetId,
  runId,
  deviceId,
  says,
}: {
  readonly design: Design;
  readonly sheetId: EntityId;
  readonly runId?: EntityId;
  readonly deviceId?: EntityId;
  readonly says: string;
}) {
  const layout = useMemo(() => layoutSheet(design, sheetId), [design, sheetId]);
  const points = runId === undefined ? [] : (layout.runs[runId]?.points ?? []);
  const device = deviceId === undefined ? undefined : design.devices[deviceId];
  const box = device === undefined ? boundsOf(points) : boxOf(device);
  if (box === null) return null;

  const width = Math.max(LEAST.width, box.width + 96, ((box.height + 72) * LEAST.width) / LEAST.height);
  const height = (width * LEAST.height) / LEAST.width;
  const x = box.x + box.width / 2 - width / 2;
  const y = box.y + box.height / 2 - height / 2;
  return (
    <svg className="finding-picture" viewBox={`${x} ${y} ${width} ${height}`} role="img" aria-label={says}>
      <SheetDrawing
        design={design}
        sheetId={sheetId}
        layout={layout}
        ink={screenInk}
        titleBlock={titleFieldsOf(design, sheetId)}
        inReview={false}
      />
      {points.length > 1 && (
        <polyline className="finding-sleeve" points={points.map((point) => `${point.x},${point.y}`).join(' ')} />
      )}
      {device !== undefined && (
        <rect className="finding-frame" x={box.x - 6} y={box.y - 6} width={box.width + 12} height={box.height + 12} />
      )}
    </svg>
  );
}

function boundsOf(points: readonly { readonly x: number; readonly y: number }[]) {
  if (points.length === 0) return null;
  const xs = points.map((point) => point.x);
  const ys = points.map((point) => point.y);
  const x = Math.min(...xs);
  const y = Math.min(...ys);
  return { x, y, width: Math.max(...xs) - x, height: Math.max(...ys) - y };
}
