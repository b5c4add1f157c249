import type { Box } from '#shared/kinds/place.ts';
import type { Device } from '#shared/model/design.ts';

import { placeOf } from './device-place.ts';
import type { TagLayout } from './sheet-layout.ts';
import { conflict, type Space } from './space.ts';
import { tagLines } from './tag-text.ts';
import { monoWidth, textWidth } from './text-width.ts';

export const TAG = { markSize: 11.5, textSize: 9.5, line: 11, gap: 8, ascent: 9, descent: 3, afterMark: 4 };

/** The tag of a device on the first place that is free, else on the one that hides least. */
export function placeTag(space: Space, device: Device): TagLayout | null {
  const lines = tagLines(device);
  if (lines.every((line) => line === '')) return null;
  let best: { tag: TagLayout; cost: number } | undefined;
  for (const [i, tag] of candidates(device, lines).entries()) {
    const cost = conflict(space, tag.box, device.id) + i * 0.01;
    if (cost < 1) return tag;
    if (best === undefined || cost < best.cost) best = { tag, cost };
  }
  return best?.tag ?? null;
}

function candidates(device: Device, lines: readonly string[]): TagLayout[] {
  const { box, terminals } = placeOf(device);
  const isLevel = terminals.every((terminal) => terminal.sides.every((side) => side === 'left' || side === 'right'));
  if (device.kind === 'busbar' || device.kind === 'terminal') return barCandidates(device, box, lines);
  const beside = [0, -11, 11, -22, 22].flatMap((dy) => [
    besideTag(device, box, lines, 'right', dy),
    besideTag(device, box, lines, 'left', dy),
  ]);
  const over = [0, 8, -8, 16, -16, 24, -24].flatMap((dx) => [
    overTag(device, box, lines, 'below', dx),
    overTag(device, box, lines, 'above', dx),
  ]);
  return isLevel ? [...beside.slice(0, 2), ...over, ...beside.slice(2)] : [...beside, ...over];
}

/** Right of the symbol, or left of it and ranged right; its middle on the symbol's. */
function besideTag(device: Device, box: Box, lines: readonly string[], side: 'left' | 'right', dy: number): TagLayout {
  const height = lines.length * TAG.line;
  const y = box.y + box.height / 2 - height / 2 + TAG.ascent + dy;
  const x = side === 'right' ? box.x + box.width + TAG.gap : box.x - TAG.gap;
  return tagAt(device, lines, x, y, side === 'right' ? 'start' : 'end', false);
}

function overTag(device: Device, box: Box, lines: readonly string[], side: 'above' | 'below', dx: number): TagLayout {
  const { width, rows } = measure(lines, true);
  const x = box.x + box.width / 2 - width / 2 + dx;
  const y = side === 'below' ? box.y + box.height + TAG.ascent + 3 : box.y - 6 - (rows - 1) * TAG.line;
  return tagAt(device, lines, x, y, 'start', true);
}

/** Over its left end; along the bar where a run leaves it there; below it when all above is taken. */
function barCandidates(device: Device, box: Box, lines: readonly string[]): TagLayout[] {
  const { width, rows } = measure(lines, true);
  const isUpright = box.height > box.width;
  if (isUpright) {
    return [
      tagAt(device, lines, box.x, box.y - 6 - (rows - 1) * TAG.line, 'start', true),
      tagAt(device, lines, box.x, box.y + box.height + TAG.ascent + 4, 'start', true),
      ...[0, 24, 48, -24].flatMap((dy) => [
        besideTag(device, box, lines, 'right', dy),
        besideTag(device, box, lines, 'left', dy),
      ]),
    ];
  }
  const places: TagLayout[] = [];
  for (const y of [box.y - 2 - (rows - 1) * TAG.line, box.y + box.height + TAG.ascent + 1]) {
    for (let x = box.x; x <= Math.max(box.x, box.x + box.width - width); x += 8) {
      places.push(tagAt(device, lines, x, y, 'start', true));
    }
  }
  const level = box.y + box.height / 2 + 3.5;
  places.splice(
    1,
    0,
    tagAt(device, lines, box.x + box.width + 6, level, 'start', true),
    tagAt(device, lines, box.x - width - 6, level, 'start', true),
  );
  return places;
}

function tagAt(
  device: Device,
  lines: readonly string[],
  x: number,
  y: number,
  anchor: 'start' | 'end',
  inline: boolean,
): TagLayout {
  const { width, rows } = measure(lines, inline);
  const box = {
    x: anchor === 'start' ? x : x - width,
    y: y - TAG.ascent,
    width,
    height: (rows - 1) * TAG.line + TAG.ascent + TAG.descent,
  };
  return { deviceId: device.id, x, y, anchor, lines, ...(inline && { inline: true as const }), box };
}

function measure(lines: readonly string[], inline: boolean): { width: number; rows: number } {
  const mark = monoWidth(lines[0] ?? '', TAG.markSize);
  const widths = lines.slice(1).map((line) => textWidth(line, TAG.textSize));
  if (!inline) return { width: Math.max(mark, ...widths), rows: lines.length };
  const [first = 0, ...rest] = widths;
  return { width: Math.max(mark + TAG.afterMark + first, ...rest), rows: Math.max(1, lines.length - 1) };
}
