import type { Box, Point } from '#shared/kinds/place.ts';
import { conductorOf } from '#shared/model/defaults.ts';
import type { Run } from '#shared/model/design.ts';

import { coreWidth, OUTLINE } from './core-width.ts';
import { HOP_RADIUS } from './run-path.ts';
import type { CodeLayout, LabelLayout } from './sheet-layout.ts';
import { conflict, type Space } from './space.ts';
import { monoWidth } from './text-width.ts';

export const LABEL = { size: 10, clear: 5, ascent: 7.5, descent: 2.5, codeGap: 6 };

/** `W12 · 2/0`; of a signal its mark only. */
export function labelText(run: Run): string {
  const { size, parallel } = conductorOf(run);
  const mark = run.mark?.trim() || '?';
  if (run.link === true) return mark;
  return `${mark} · ${size.replace(/ (AWG|mm²)$/, '')}${parallel > 1 ? ` × ${parallel}` : ''}`;
}

/**
 * Beside the run on the first place that is free: of an upright run right, else left; of a level run above, else
 * below, near its source. Where a run is too short for it the label stands off, on a leader.
 */
export function placeLabel(
  space: Space,
  run: Run,
  code: string,
  points: readonly Point[],
  nearEnd: boolean,
): LabelLayout | null {
  if (points.length < 2) return null;
  const text = labelText(run);
  const off = coreWidth(run) / 2 + OUTLINE + LABEL.clear;
  const segments = segmentsOf(nearEnd ? [...points].reverse() : points);
  const measures = { text, code, width: labelWidth(text, code), off };
  // without its code letters it may still find room beside the run
  const bare = { text, code: '', width: labelWidth(text, ''), off };
  const beside =
    bestLabel(space, run, besideRun(segments, measures)) ??
    (code === '' ? null : bestLabel(space, run, besideRun(segments, bare)));
  if (beside !== null && beside.cost < 1) return beside.label;
  const aside = bestLabel(space, run, onLeader(segments, bare), beside?.cost);
  return (aside ?? beside)?.label ?? null;
}

/** All places beside a run, with its code letters and without, the best first. */
export function* placesBeside(run: Run, code: string, points: readonly Point[]): Generator<LabelLayout> {
  const text = labelText(run);
  const off = coreWidth(run) / 2 + OUTLINE + LABEL.clear;
  const segments = segmentsOf(points);
  for (const letters of code === '' ? [''] : [code, '']) {
    const places = besideRun(segments, { text, code: letters, width: labelWidth(text, letters), off });
    for (const { label } of places) yield label;
  }
}

/** The first candidate that is free, else the one that hides least; null when none hides less than `below`. */
function bestLabel(space: Space, run: Run, candidates: Iterable<Candidate>, below = Infinity): Candidate | null {
  let best: Candidate | null = null;
  let least = below;
  for (const { label, cost: dislike } of candidates) {
    if (dislike >= least) continue;
    let cost = dislike + conflict(space, label.box, undefined, least - dislike);
    if (cost < least && label.leader) cost += leaderConflict(space, label.leader, run.id);
    if (cost >= least) continue;
    best = { label, cost };
    least = cost;
    if (cost === dislike) break;
  }
  return best;
}

/**
 * The code letters at both ends of a run, but for one its label (with the letters behind it) is near. Each is handed
 * on as it is found, so that the room is taken before the next is looked for.
 */
export function* placeCodes(
  space: Space,
  run: Run,
  code: string,
  points: readonly Point[],
  label: LabelLayout | null,
): Generator<CodeLayout> {
  if (code === '' || label === null || points.length < 2) return;
  const middle = { x: label.box.x + label.box.width / 2, y: label.box.y + label.box.height / 2 };
  const first = points[0]!;
  const last = points.at(-1)!;
  for (const [end, next] of [
    [first, points[1]!],
    [last, points.at(-2)!],
  ] as const) {
    if (label.code !== '' && distance(middle, end) < NEAR_END) continue;
    const found = placeCode(space, run, code, end, next);
    if (found !== null) yield found;
  }
}

const NEAR_END = 88;

function placeCode(space: Space, run: Run, code: string, end: Point, next: Point): CodeLayout | null {
  const off = coreWidth(run) / 2 + OUTLINE + LABEL.clear;
  const width = monoWidth(code, CODE_SIZE);
  for (const inset of [8, 16, 24, 32]) {
    const at = towards(end, next, inset);
    if (at === null) break;
    for (const place of codePlaces(at, end, next, off)) {
      const box = {
        x: place.anchor === 'start' ? place.x : place.x - width,
        y: place.y - LABEL.ascent,
        width,
        height: LABEL.ascent + LABEL.descent,
      };
      if (conflict(space, box) < 0.5) return { ...place, text: code, box };
    }
  }
  return null;
}

export const CODE_SIZE = 9;

function codePlaces(at: Point, end: Point, next: Point, off: number): Omit<CodeLayout, 'text' | 'box'>[] {
  if (end.x === next.x) {
    return [
      { x: at.x + off - 1, y: at.y + 3, anchor: 'start' },
      { x: at.x - off + 1, y: at.y + 3, anchor: 'end' },
    ];
  }
  const anchor = next.x > end.x ? 'start' : 'end';
  return [
    { x: at.x, y: at.y - off + 1, anchor },
    { x: at.x, y: at.y + off + LABEL.ascent - 2, anchor },
  ];
}

function towards(from: Point, to: Point, by: number): Point | null {
  const length = distance(from, to);
  if (length < by + 8) return null;
  return { x: from.x + Math.sign(to.x - from.x) * by, y: from.y + Math.sign(to.y - from.y) * by };
}

interface Measures {
  readonly text: string;
  readonly code: string;
  readonly width: number;
  /** From the middle of the run to the label. */
  readonly off: number;
}

interface Segment {
  readonly from: Point;
  readonly to: Point;
  readonly length: number;
}

interface Candidate {
  readonly label: LabelLayout;
  readonly cost: number;
}

export function labelWidth(text: string, code: string): number {
  return monoWidth(text, LABEL.size) + (code === '' ? 0 : LABEL.codeGap + monoWidth(code, CODE_SIZE));
}

function segmentsOf(points: readonly Point[]): Segment[] {
  return points.slice(1).map((to, i) => ({ from: points[i]!, to, length: distance(points[i]!, to) }));
}

/** The longest straight first, on its better side, then the others; and then on their other sides. */
function* besideRun(segments: readonly Segment[], measures: Measures): Generator<Candidate> {
  const longest = [...segments].sort((a, b) => b.length - a.length);
  for (const [i, segment] of longest.entries()) {
    if (segment.from.x === segment.to.x) yield* besideUpright(segment, measures, i * 0.05, 'start');
    else yield* overLevel(segment, measures, i * 0.05, 'above');
  }
  for (const [i, segment] of longest.entries()) {
    if (segment.from.x === segment.to.x) yield* besideUpright(segment, measures, 0.3 + i * 0.05, 'end');
    else yield* overLevel(segment, measures, 0.4 + i * 0.05, 'below');
  }
}

/** The label's middle on multiples of 8 along the run, so that neighbours share a baseline. */
function* besideUpright(
  segment: Segment,
  measures: Measures,
  cost: number,
  anchor: 'start' | 'end',
): Generator<Candidate> {
  const height = LABEL.ascent + LABEL.descent;
  if (segment.length < height + 2) return;
  const x = segment.from.x + (anchor === 'start' ? measures.off : -measures.off);
  const top = Math.min(segment.from.y, segment.to.y);
  const middle = Math.round((segment.from.y + segment.to.y) / 2 / 8) * 8;
  const reach = segment.length / 2 - height / 2;
  for (let slide = 0; slide <= reach; slide += 8) {
    for (const y of slide === 0 ? [middle] : [middle - slide, middle + slide]) {
      if (y - height / 2 < top - 0.01 || y + height / 2 > top + segment.length + 0.01) continue;
      yield { label: labelAt(x, y + 3.5, anchor, measures), cost: cost + slide / 2000 };
    }
  }
}

function* overLevel(segment: Segment, measures: Measures, cost: number, side: 'above' | 'below'): Generator<Candidate> {
  const spare = segment.length - measures.width;
  if (spare < 0) return;
  const left = Math.min(segment.from.x, segment.to.x);
  const y = side === 'above' ? segment.from.y - measures.off : segment.from.y + measures.off + LABEL.ascent - 1;
  const inset = Math.min(8, spare / 2);
  const fromLeft = segment.to.x > segment.from.x;
  for (let slide = inset; slide <= Math.max(inset, spare - inset); slide += 8) {
    const x = fromLeft ? left + slide : left + segment.length - measures.width - slide;
    yield { label: labelAt(x, y, 'start', measures), cost: cost + slide / 4000 };
  }
}

/** Off the run, up and to the right first, then all round; as near as there is room, never along the run itself. */
function* onLeader(segments: readonly Segment[], measures: Measures): Generator<Candidate> {
  const longest = [...segments].sort((a, b) => b.length - a.length).slice(0, 2);
  const feet = longest.flatMap(({ from, to, length }) =>
    (length < 32 ? [0.5] : [0.5, 0.25, 0.75]).map((part) => ({
      x: from.x + (to.x - from.x) * part,
      y: from.y + (to.y - from.y) * part,
      isUpright: from.x === to.x,
    })),
  );
  for (const [ring, out] of [16, 24, 32, 44, 60].entries()) {
    for (const at of feet) {
      for (const [i, [dx, dy]] of AROUND.entries()) {
        if ((at.isUpright ? dx : dy) === 0) continue;
        const x = at.x + dx * out;
        const y = at.y + dy * out;
        const left = dx === 0 ? x - measures.width / 2 : x;
        const label = labelAt(left, y + 3.5, dx < 0 ? 'end' : 'start', measures);
        const foot = { x: dx > 0 ? x - 2 : dx < 0 ? x + 2 : x, y: dy === 0 ? y : dy < 0 ? y + 5 : y - 5 };
        yield { label: { ...label, leader: [foot, { x: at.x, y: at.y }] as const }, cost: 1 + ring * 0.2 + i * 0.02 };
      }
    }
  }
}

const AROUND = [
  [0.6, -1],
  [-0.6, -1],
  [0.6, 1],
  [-0.6, 1],
  [1, 0],
  [-1, 0],
  [0, -1],
  [0, 1],
] as const;

function labelAt(x: number, y: number, anchor: 'start' | 'end', { text, code, width }: Measures): LabelLayout {
  const box: Box = {
    x: (anchor === 'start' ? x : x - width) - 1,
    y: y - LABEL.ascent,
    width: width + 2,
    height: LABEL.ascent + LABEL.descent,
  };
  return { x, y, anchor, text, code, box };
}

/** A leader may cross a run if it must, but no text: sampled along its way, clear of the run it points at. */
function leaderConflict(space: Space, [foot, at]: readonly [Point, Point], runId: string): number {
  const length = Math.hypot(at.x - foot.x, at.y - foot.y);
  let sum = 0;
  for (let along = 2; along < length - HOP_RADIUS; along += 8) {
    const x = foot.x + ((at.x - foot.x) * along) / length;
    const y = foot.y + ((at.y - foot.y) * along) / length;
    sum += conflict(space, { x: x - 0.5, y: y - 0.5, width: 1, height: 1 }, runId);
  }
  return sum / 4;
}

function distance(a: Point, b: Point): number {
  return Math.abs(a.x - b.x) + Math.abs(a.y - b.y);
}
