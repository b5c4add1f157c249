import type { Box } from '#shared/kinds/place.ts';
import type { Device } from '#shared/model/design.ts';

import { placeOf } from './device-place.ts';
import type { TagLayout } from './sheet-layout.ts';
import { conflict, grow, release, take, WEIGHT, type Space } from './space.ts';
import { tagLines } from './tag-text.ts';
import { monoWidth, textWidth } from './text-width.ts';

export const TAG = { markSize: 11.5, textSize: 9.5, line: 11, gap: 8, ascent: 9, descent: 3, afterMark: 4 };

/**
 * A tag for every device on the first of its places that is free, else where it hides least. Who has the fewest free
 * places chooses first, so that a device with room all round does not take its neighbour's only one.
 */
export function placeTags(space: Space, devices: readonly Device[]): Map<string, TagLayout> {
  const waiting = devices.flatMap((device) => {
    if (tagLines(device).every((line) => line === '')) return [];
    const near = placesOf(device).slice(0, FIRST_CHOICES);
    return [{ device, free: near.filter((tag) => conflict(space, tag.box, device.id, 1) < 1).length }];
  });
  const tags = new Map<string, TagLayout>();
  for (const { device } of waiting.sort((a, b) => a.free - b.free)) {
    const tag = placeTag(space, device);
    if (tag !== null) tags.set(device.id, tag);
  }
  return tags;
}

/** How many of a device's places tell how hard it is to please. */
const FIRST_CHOICES = 8;

/** Places the tag of one device and takes the room; with `onlyFree`, none unless it hides nothing. */
export function placeTag(space: Space, device: Device, onlyFree = false): TagLayout | null {
  let best: { tag: TagLayout; cost: number } | undefined;
  for (const [i, tag] of placesOf(device).entries()) {
    const dislike = i * 0.001;
    const cost = dislike + conflict(space, tag.box, device.id, (best?.cost ?? Infinity) - dislike);
    if (best === undefined || cost < best.cost) best = { tag, cost };
    if (cost < 1) break;
  }
  if (best === undefined || (onlyFree && best.cost >= 1)) return null;
  takeTag(space, best.tag);
  return best.tag;
}

export function takeTag(space: Space, tag: TagLayout): void {
  take(space, grow(tag.box, TAG_CLEAR), WEIGHT.text, tag.deviceId);
}

export function releaseTag(space: Space, tag: TagLayout): void {
  release(space, grow(tag.box, TAG_CLEAR), WEIGHT.text, tag.deviceId);
}

const TAG_CLEAR = 2;

const known = new WeakMap<Device, readonly TagLayout[]>();

/** The places round a device, the best first; they change only with the device. */
export function placesOf(device: Device): readonly TagLayout[] {
  const kept = known.get(device);
  if (kept !== undefined) return kept;
  const places = candidates(device, tagLines(device));
  known.set(device, places);
  return places;
}

function candidates(device: Device, lines: readonly string[]): TagLayout[] {
  const { inked: box, terminals } = placeOf(device);
  if (device.kind === 'busbar' || device.kind === 'terminal') return barCandidates(device, box, lines);
  const isLevel = terminals.every((terminal) => terminal.sides.every((side) => side === 'left' || side === 'right'));
  const narrow = narrower(lines);
  const beside = (texts: readonly string[], steps: readonly number[], gap: number) =>
    steps.flatMap((dy) => [
      besideTag(device, box, texts, 'right', dy, gap),
      besideTag(device, box, texts, 'left', dy, gap),
    ]);
  const over = [0, 8, -8, 16, -16, 24, -24, 40, -40].flatMap((dx) => [
    overTag(device, box, lines, 'below', dx),
    overTag(device, box, lines, 'above', dx),
  ]);
  const near = beside(lines, [0, -11, 11, -22, 22], TAG.gap);
  const far = [16, 24, 40, 56].flatMap((gap) => [
    ...beside(lines, [0, -16, 16, -32, 32], gap),
    ...(narrow ? beside(narrow, [0, -16, 16, -32, 32], gap) : []),
  ]);
  const slim = narrow ? beside(narrow, [0, -11, 11, -22, 22], TAG.gap) : [];
  return isLevel
    ? [...near.slice(0, 2), ...over, ...near.slice(2), ...slim, ...far]
    : [...near, ...slim, ...over, ...far];
}

/** The words under the mark broken anew into two lines as short as they can be; null where that gains nothing. */
function narrower(lines: readonly string[]): string[] | null {
  const [mark = '', ...rest] = lines;
  const words = rest.join(', ').split(' ');
  let best: { pair: string[]; width: number } | undefined;
  for (let i = 1; i < words.length; i++) {
    const pair = [words.slice(0, i).join(' '), words.slice(i).join(' ')];
    const width = Math.max(...pair.map((line) => textWidth(line, TAG.textSize)));
    if (best === undefined || width < best.width) best = { pair, width };
  }
  const now = Math.max(0, ...rest.map((line) => textWidth(line, TAG.textSize)));
  return best !== undefined && best.width < now - 4 ? [mark, ...best.pair] : null;
}

/** Right of the symbol, or left of it and ranged right; its middle on the symbol's. */
function besideTag(
  device: Device,
  box: Box,
  lines: readonly string[],
  side: 'left' | 'right',
  dy: number,
  gap: number = TAG.gap,
): TagLayout {
  const height = lines.length * TAG.line;
  const y = box.y + box.height / 2 - height / 2 + TAG.ascent + dy;
  const x = side === 'right' ? box.x + box.width + gap : box.x - gap;
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
  for (const y of [box.y - 3 - (rows - 1) * TAG.line, box.y + box.height + TAG.ascent]) {
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

const measured = new WeakMap<readonly string[], { readonly inline?: Measure; readonly stacked?: Measure }>();

function measure(lines: readonly string[], inline: boolean): Measure {
  const kept = measured.get(lines);
  const found = inline ? kept?.inline : kept?.stacked;
  if (found !== undefined) return found;
  const fresh = measureAnew(lines, inline);
  measured.set(lines, { ...kept, [inline ? 'inline' : 'stacked']: fresh });
  return fresh;
}

interface Measure {
  readonly width: number;
  readonly rows: number;
}

function measureAnew(lines: readonly string[], inline: boolean): Measure {
  const mark = monoWidth(lines[0] ?? '', TAG.markSize);
  const widths = lines.slice(1).map((line) => textWidth(line, TAG.textSize));
  if (!inline) return { width: Math.max(mark, ...widths), rows: lines.length };
  const [first = 0, ...rest] = widths;
  return { width: Math.max(mark + TAG.afterMark + first, ...rest), rows: Math.max(1, lines.length - 1) };
}
