import type { Box } from '#shared/kinds/place.ts';
import type { Device, EntityId, Run } from '#shared/model/design.ts';

import { labelText, labelWidth, placeCodes, placeLabel, placesBeside } from './labels.ts';
import type { CodeLayout, LabelLayout, RunLayout, SheetLayout, TagLayout } from './sheet-layout.ts';
import { conflict, grow, release, standing, take, WEIGHT, type Space } from './space.ts';
import { placesOf, placeTag, placeTags, releaseTag, takeTag } from './tags.ts';

interface DrawnRun {
  readonly run: Run;
  readonly drawn: RunLayout;
  /** The letters of its colour. */
  readonly code: string;
  /** Only its far end is on this sheet. */
  readonly fromFarEnd: boolean;
}

interface Writing {
  readonly devices: readonly Device[];
  readonly runs: readonly DrawnRun[];
  readonly previous: SheetLayout | undefined;
  readonly isClose: (box: Box) => boolean;
  /** The devices whose tags, and the runs whose labels, are written anew; null for all that need it. */
  readonly touched: ReadonlySet<EntityId | undefined> | null;
  readonly wanted: ReadonlySet<EntityId> | null;
}

/**
 * Tags, labels and code letters among runs that lie. What stood well stays; the rest is placed, who has the least
 * choice first; and a tag that has another place makes way for a label that has none.
 */
export function writeLabels(space: Space, writing: Writing): SheetLayout {
  const { runs, previous, isClose, wanted } = writing;
  const tags = writeTags(space, writing);
  const labels = new Map<EntityId, LabelLayout>();
  const waiting: DrawnRun[] = [];
  for (const drawnRun of runs) {
    const { run, drawn } = drawnRun;
    const isKept = wanted !== null && !wanted.has(run.id) && drawn.label !== null;
    if (drawn.label !== null && (isKept || standsWell(space, drawnRun, drawn.label))) {
      labels.set(run.id, drawn.label);
      if (isClose(drawn.label.box)) takeLabel(space, run.id, drawn.label);
    } else if (drawn.points.length > 1) waiting.push(drawnRun);
  }
  const deviceOf = new Map(writing.devices.map((device) => [device.id, device]));
  for (const drawnRun of waiting.sort((a, b) => spareOf(a) - spareOf(b))) {
    const label = writeLabel(space, drawnRun, tags, wanted === null ? deviceOf : new Map());
    if (label !== null) labels.set(drawnRun.run.id, label);
  }
  const laid: Record<EntityId, RunLayout> = {};
  for (const { run, drawn } of runs) {
    const label = labels.get(run.id) ?? null;
    const isKept = drawn.label !== null && label === drawn.label;
    const codes = isKept ? drawn.codes.filter((code) => !isClose(code.box) || conflict(space, code.box) < 0.5) : [];
    if (isKept) for (const code of codes) takeCode(space, code);
    laid[run.id] = isKept && codes.length === drawn.codes.length ? drawn : { ...drawn, label, codes };
  }
  for (const { run, code } of runs) {
    const layout = laid[run.id]!;
    const isNew = layout.label !== previous?.runs[run.id]?.label;
    if (!isNew || layout.stubs.length > 0) continue;
    const codes: CodeLayout[] = [];
    for (const place of placeCodes(space, run, code, layout.points, layout.label)) {
      takeCode(space, place);
      codes.push(place);
    }
    laid[run.id] = { ...layout, codes };
  }
  return { runs: laid, tags: Object.fromEntries(tags) };
}

/** How much each hid when it was placed: it may stay as long as it hides no more. */
const hidden = new WeakMap<TagLayout | LabelLayout, number>();

function writeTags(space: Space, { devices, previous, isClose, touched }: Writing): Map<EntityId, TagLayout> {
  const tags = new Map<EntityId, TagLayout>();
  const waiting: Device[] = [];
  for (const device of devices) {
    const before = previous?.tags[device.id];
    if (before !== undefined && touched !== null && !touched.has(device.id)) {
      tags.set(device.id, before);
      if (isClose(before.box)) takeTag(space, before);
      continue;
    }
    const place = before && placesOf(device).find((tag) => isSameTag(tag, before));
    const stays =
      touched === null && place !== undefined && conflict(space, place.box, device.id) <= (hidden.get(before!) ?? 0);
    if (stays) {
      tags.set(device.id, before!);
      takeTag(space, before!);
    } else waiting.push(device);
  }
  for (const [id, tag] of placeTags(space, waiting)) {
    hidden.set(tag, conflict(space, tag.box, id));
    tags.set(id, tag);
  }
  return tags;
}

function isSameTag(a: TagLayout, b: TagLayout): boolean {
  return (
    a.x === b.x &&
    a.y === b.y &&
    a.anchor === b.anchor &&
    a.inline === b.inline &&
    a.lines.length === b.lines.length &&
    a.lines.every((line, i) => line === b.lines[i])
  );
}

function standsWell(space: Space, { run, code }: DrawnRun, label: LabelLayout): boolean {
  if (label.text !== labelText(run) || (label.code !== '' && label.code !== code)) return false;
  return conflict(space, label.box) <= (hidden.get(label) ?? 0);
}

function writeLabel(
  space: Space,
  { run, drawn, code, fromFarEnd }: DrawnRun,
  tags: Map<EntityId, TagLayout>,
  deviceOf: ReadonlyMap<EntityId, Device>,
): LabelLayout | null {
  const placed = placeLabel(space, run, code, drawn.points, fromFarEnd);
  if (placed === null) return null;
  const isFree = placed.leader === undefined && conflict(space, placed.box) < 1;
  const label = isFree ? placed : (makeRoom(space, { run, drawn, code, fromFarEnd }, tags, deviceOf) ?? placed);
  hidden.set(label, conflict(space, label.box));
  takeLabel(space, run.id, label);
  return label;
}

/** A place beside the run that only a tag bars, when that tag is as well placed elsewhere. */
function makeRoom(
  space: Space,
  { run, drawn, code }: DrawnRun,
  tags: Map<EntityId, TagLayout>,
  deviceOf: ReadonlyMap<EntityId, Device>,
): LabelLayout | null {
  const tried = new Set<string>();
  for (const label of placesBeside(run, code, drawn.points)) {
    const barring = standing(space, label.box).filter(({ weight }) => weight >= 1);
    const tag = barring.length === 1 ? tags.get(barring[0]!.owner ?? '') : undefined;
    const device = tag && deviceOf.get(tag.deviceId);
    if (tag === undefined || device === undefined || barring[0]!.weight !== WEIGHT.text) continue;
    // a bar's tag is long, and would find the next place on the same bar: each is tried twice at most
    const attempt = `${device.id} ${label.code}`;
    if (tried.has(attempt)) continue;
    tried.add(attempt);
    releaseTag(space, tag);
    takeLabel(space, run.id, label);
    const moved = placeTag(space, device, true);
    release(space, grow(label.box, LABEL_CLEAR), WEIGHT.text, run.id);
    if (moved !== null) {
      tags.set(device.id, moved);
      return label;
    }
    takeTag(space, tag);
  }
  return null;
}

/** How much longer its longest straight is than its label: who has least to spare chooses first. */
function spareOf({ run, drawn, code }: DrawnRun): number {
  let longest = 0;
  for (let i = 1; i < drawn.points.length; i++) {
    const [a, b] = [drawn.points[i - 1]!, drawn.points[i]!];
    const length = Math.abs(a.x - b.x) + Math.abs(a.y - b.y);
    longest = Math.max(longest, a.x === b.x ? length * 2 : length);
  }
  return longest - labelWidth(labelText(run), code);
}

const LABEL_CLEAR = 2;

function takeLabel(space: Space, runId: EntityId, label: LabelLayout): void {
  take(space, grow(label.box, LABEL_CLEAR), WEIGHT.text, runId);
}

function takeCode(space: Space, code: CodeLayout): void {
  take(space, grow(code.box, 1), WEIGHT.text);
}
