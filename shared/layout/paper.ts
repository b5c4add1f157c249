import type { Box, Point } from '#shared/kinds/place.ts';
import { sheetOf } from '#shared/model/defaults.ts';
import type { Sheet } from '#shared/model/design.ts';

/** Paper in sheet units, its frame and its reference squares (in the manner of ISO 5457 and ISO 7200). */
export const MM_PER_UNIT = 0.4375;

/** Landscape, in millimetres. */
const PAPER_MM = {
  A4: [297, 210],
  A3: [420, 297],
  A2: [594, 420],
  letter: [279.4, 215.9],
  tabloid: [431.8, 279.4],
} as const;

export const TITLE_BLOCK = { width: 180 / MM_PER_UNIT, height: 36.75 / MM_PER_UNIT };
/** The strip of the caution and of what is said of the issue; beside the title block, or above it on narrow paper. */
const CAUTION_HEIGHT = 40;

export function paperSizeMm(sheet: Pick<Sheet, 'paper' | 'orientation'>): { width: number; height: number } {
  const { paper, orientation } = sheetOf(sheet as Sheet);
  const [long, short] = PAPER_MM[paper];
  return orientation === 'portrait' ? { width: short, height: long } : { width: long, height: short };
}

export function paperSize(sheet: Pick<Sheet, 'paper' | 'orientation'>): { width: number; height: number } {
  const { width, height } = paperSizeMm(sheet);
  return { width: width / MM_PER_UNIT, height: height / MM_PER_UNIT };
}

/** 20 mm from the left edge, for filing, and 10 mm from the others. */
export function frameBox(sheet: Sheet): Box {
  const { width, height } = paperSize(sheet);
  const left = 20 / MM_PER_UNIT;
  const margin = 10 / MM_PER_UNIT;
  return { x: left, y: margin, width: width - left - margin, height: height - 2 * margin };
}

export function titleBlockBox(sheet: Sheet): Box {
  const frame = frameBox(sheet);
  return {
    x: frame.x + frame.width - TITLE_BLOCK.width,
    y: frame.y + frame.height - TITLE_BLOCK.height,
    ...TITLE_BLOCK,
  };
}

export function cautionBox(sheet: Sheet): Box {
  const frame = frameBox(sheet);
  const title = titleBlockBox(sheet);
  const beside = title.x - frame.x;
  if (beside >= 160) {
    return { x: frame.x, y: frame.y + frame.height - CAUTION_HEIGHT, width: beside, height: CAUTION_HEIGHT };
  }
  return { x: title.x, y: title.y - CAUTION_HEIGHT, width: title.width, height: CAUTION_HEIGHT };
}

/** Where the reference squares divide the paper, counted 50 mm by 50 mm from its middle; the frame ends the last. */
export function squareLines(sheet: Sheet): { readonly x: readonly number[]; readonly y: readonly number[] } {
  const { width, height } = paperSize(sheet);
  const frame = frameBox(sheet);
  return {
    x: divide(frame.x, frame.x + frame.width, width / 2),
    y: divide(frame.y, frame.y + frame.height, height / 2),
  };
}

/** `B1`: letters down, numbers across. A point off the frame counts to the nearest square. */
export function squareOf(sheet: Sheet, point: Point): string {
  const { x, y } = squareLines(sheet);
  return `${squareLetter(indexIn(y, point.y))}${indexIn(x, point.x) + 1}`;
}

/** I and O are left out: they read as 1 and 0. */
export function squareLetter(index: number): string {
  return 'ABCDEFGHJKLMNPQRSTUVWXYZ'[index] ?? '';
}

function divide(start: number, end: number, middle: number): number[] {
  const step = 50 / MM_PER_UNIT;
  // a last square under a quarter of its width is joined to its neighbour
  const before = Math.max(1, Math.ceil((middle - start) / step - 0.25));
  const after = Math.max(1, Math.ceil((end - middle) / step - 0.25));
  const inner = Array.from({ length: before + after - 1 }, (_, i) => middle + (i + 1 - before) * step);
  return [start, ...inner, end];
}

function indexIn(lines: readonly number[], value: number): number {
  const found = lines.findIndex((line, i) => i > 0 && value < line);
  return found === -1 ? lines.length - 2 : found - 1;
}
