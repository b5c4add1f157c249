import { useStore, type ReactFlowState } from '@xyflow/react';
import { useMemo } from 'react';

import type { Box } from '#shared/kinds/place.ts';
import type { RunLayout } from '#shared/layout/sheet-layout.ts';

/** The part of the sheet in view, widened to whole cells, so that it changes only when a cell's border is crossed. */
export function useSeenCells(): Box {
  const key = useStore(cellsKey);
  return useMemo(() => {
    const [cell, left, top, right, bottom] = key.split(' ').map(Number) as [number, number, number, number, number];
    return { x: left * cell, y: top * cell, width: (right - left) * cell, height: (bottom - top) * cell };
  }, [key]);
}

function cellsKey({ transform, width, height }: ReactFlowState): string {
  const [tx, ty, zoom] = transform;
  const cell = 512 / 2 ** Math.floor(Math.log2(zoom));
  return [
    cell,
    Math.floor(-tx / zoom / cell),
    Math.floor(-ty / zoom / cell),
    Math.ceil((width - tx) / zoom / cell),
    Math.ceil((height - ty) / zoom / cell),
  ].join(' ');
}

const boxes = new WeakMap<RunLayout, Box>();

export function isSeen(run: RunLayout, seen: Box): boolean {
  const box = boxes.get(run) ?? boxOfRun(run);
  return (
    box.x <= seen.x + seen.width &&
    box.x + box.width >= seen.x &&
    box.y <= seen.y + seen.height &&
    box.y + box.height >= seen.y
  );
}

/** With room for flags and labels at its ends. */
function boxOfRun(run: RunLayout): Box {
  const xs = run.points.map((p) => p.x);
  const ys = run.points.map((p) => p.y);
  const [left, top] = [Math.min(...xs) - 48, Math.min(...ys) - 32];
  const box = { x: left, y: top, width: Math.max(...xs) + 48 - left, height: Math.max(...ys) + 32 - top };
  boxes.set(run, box);
  return box;
}
