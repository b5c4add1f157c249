import type { Box, Point } from '#shared/kinds/place.ts';
import type { Design, EntityId } from '#shared/model/design.ts';

import { placeOf } from './device-place.ts';
import { frameBox, titleBlockBox } from './paper.ts';
import { sheetDevicesOf, sheetRunsOf } from './run-ends.ts';
import type { SheetLayout } from './sheet-layout.ts';
import { overlaps, segmentBox } from './space.ts';
import { tagLines } from './tag-text.ts';

/** What is wrong with the picture of a sheet, in words: what stands on what, what leaves the frame, what has no name. */
export function faultsOf(design: Design, sheetId: EntityId, layout: SheetLayout): string[] {
  const sheet = design.sheets[sheetId];
  if (sheet === undefined) return [];
  const devices = sheetDevicesOf(design, sheetId);
  const runs = sheetRunsOf(design, sheetId);
  const texts = textsOf(layout);
  const title = titleBlockBox(sheet);
  const frame = frameBox(sheet);
  const faults: string[] = [];
  const say = (fault: string) => faults.push(fault);

  for (const device of devices) {
    if (tagLines(device).some((line) => line !== '') && !layout.tags[device.id]) say(`${device.mark} has no tag`);
  }
  for (const { run } of runs) if (!layout.runs[run.id]?.label) say(`${run.mark} has no label`);
  texts.forEach((text, i) => {
    for (const other of texts.slice(i + 1)) if (overlaps(text.box, other.box)) say(`${text.name} on ${other.name}`);
    for (const device of devices) {
      if (overlaps(text.box, placeOf(device).box)) say(`${text.name} on device ${device.mark}`);
    }
    for (const { run } of runs) {
      if (segmentsOf(layout.runs[run.id]?.points ?? []).some((line) => overlaps(text.box, line))) {
        say(`${text.name} on run ${run.mark}`);
      }
    }
    if (overlaps(text.box, title)) say(`${text.name} on the title block`);
    if (!isWithin(text.box, frame)) say(`${text.name} over the frame`);
  });
  for (const { run, from, to } of runs) {
    const lines = segmentsOf(layout.runs[run.id]?.points ?? []);
    if (lines.some((line) => overlaps(line, title))) say(`${run.mark} on the title block`);
    for (const device of devices) {
      if (device.kind === 'busbar' && (device === from?.device || device === to?.device)) continue;
      const { x, y, width, height } = placeOf(device).box;
      const inner = { x: x + 1, y: y + 1, width: width - 2, height: height - 2 };
      if (lines.some((line) => overlaps(line, inner))) say(`${run.mark} through ${device.mark}`);
    }
  }
  return faults;
}

function textsOf({ runs, tags }: SheetLayout): { readonly name: string; readonly box: Box }[] {
  return [
    ...Object.values(runs).flatMap(({ label, codes }) => [
      ...(label === null ? [] : [{ name: `label ${label.text}`, box: label.box }]),
      ...codes.map(({ text, box }) => ({ name: `code ${text}`, box })),
    ]),
    ...Object.values(tags).map(({ lines, box }) => ({ name: `tag ${lines[0]}`, box })),
  ];
}

function segmentsOf(points: readonly Point[]): Box[] {
  return points.slice(1).map((point, i) => segmentBox(points[i]!, point, 0));
}

function isWithin(box: Box, frame: Box): boolean {
  return (
    box.x >= frame.x &&
    box.y >= frame.y &&
    box.x + box.width <= frame.x + frame.width &&
    box.y + box.height <= frame.y + frame.height
  );
}
