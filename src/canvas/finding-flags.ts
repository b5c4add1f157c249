import { boxOf, type Box, type Point } from '#shared/kinds/place.ts';
import type { SheetLayout } from '#shared/layout/sheet-layout.ts';
import type { Finding, Severity } from '#shared/model/analysis.ts';
import type { Design, EntityId } from '#shared/model/design.ts';

import { isWithin } from './hit.ts';

/** The number in the list, in the severity's shape, with a leader to a dot on what it speaks of. */
export interface FindingFlag {
  readonly number: number;
  readonly findingId: string;
  /** The device or run it speaks of. */
  readonly subject: EntityId;
  readonly severity: Severity;
  readonly at: Point;
  readonly dot: Point;
  readonly says: string;
}

const RADIUS = 9;
/** Tried in this order: beside first, then over and under, then farther out. */
const PLACES: readonly Point[] = [
  { x: -26, y: 0 },
  { x: 26, y: 0 },
  { x: 0, y: -24 },
  { x: 0, y: 24 },
  { x: -24, y: -22 },
  { x: 24, y: -22 },
  { x: -24, y: 22 },
  { x: 24, y: 22 },
  { x: -46, y: 0 },
  { x: 46, y: 0 },
  { x: 0, y: -44 },
  { x: 0, y: 44 },
];

/**
 * One flag a subject on this sheet, for its gravest finding, and one a rule on an assembly, however many of its parts it
 * speaks of; each stands free of everything else, where there is room.
 */
export function placeFlags(
  design: Design,
  sheetId: EntityId,
  layout: SheetLayout,
  findings: readonly Finding[],
): FindingFlag[] {
  if (findings.length === 0) return [];
  const taken = createRoom(obstaclesOf(design, sheetId, layout));
  const flags: FindingFlag[] = [];
  const spoken = new Set<string>();
  findings.forEach((finding, index) => {
    if (finding.accepted === true) return;
    const { device: deviceId, run: runId } = finding.subject;
    const subject = deviceId ?? runId;
    if (subject === undefined || spoken.has(subject)) return;
    const parent = deviceId === undefined ? undefined : design.devices[deviceId]?.parent;
    const ofAssembly = `${finding.rule} ${parent}`;
    if (parent !== undefined && spoken.has(ofAssembly)) return;
    const dots = deviceId === undefined ? dotsOnRun(layout, runId!) : dotsOnDevice(design, sheetId, deviceId);
    if (dots.length === 0) return;
    spoken.add(subject).add(ofAssembly);
    const { at, dot } = findRoom(dots, taken);
    taken.add({ x: at.x - RADIUS, y: at.y - RADIUS, width: 2 * RADIUS, height: 2 * RADIUS });
    flags.push({
      number: index + 1,
      findingId: finding.id,
      subject,
      severity: finding.severity,
      at,
      dot,
      says: finding.message,
    });
  });
  return flags;
}

function findRoom(dots: readonly Point[], taken: Room): { at: Point; dot: Point } {
  for (const place of PLACES) {
    for (const dot of dots) {
      const at = { x: dot.x + place.x, y: dot.y + place.y };
      if (taken.isFree(at)) return { at, dot };
    }
  }
  const dot = dots[0]!;
  return { at: { x: dot.x + PLACES[0]!.x, y: dot.y + PLACES[0]!.y }, dot };
}

/** What is taken, by squares of the sheet, so that asking for a place does not walk the whole of it. */
interface Room {
  add(box: Box): void;
  isFree(at: Point): boolean;
}

const SQUARE = 64;

function createRoom(boxes: readonly Box[]): Room {
  const squares = new Map<string, Box[]>();
  const reach = RADIUS + 3;
  const room: Room = {
    add(box) {
      const [right, bottom] = [box.x + box.width + reach, box.y + box.height + reach];
      for (let i = Math.floor((box.x - reach) / SQUARE); i <= Math.floor(right / SQUARE); i++) {
        for (let j = Math.floor((box.y - reach) / SQUARE); j <= Math.floor(bottom / SQUARE); j++) {
          const here = squares.get(`${i} ${j}`);
          if (here === undefined) squares.set(`${i} ${j}`, [box]);
          else here.push(box);
        }
      }
    },
    isFree(at) {
      const here = squares.get(`${Math.floor(at.x / SQUARE)} ${Math.floor(at.y / SQUARE)}`) ?? [];
      return !here.some((box) => isWithin(box, at, reach));
    },
  };
  for (const box of boxes) room.add(box);
  return room;
}

function dotsOnRun(layout: SheetLayout, runId: EntityId): Point[] {
  const points = layout.runs[runId]?.points ?? [];
  const legs = points.slice(1).map((to, i) => ({ from: points[i]!, to }));
  const long = (leg: { from: Point; to: Point }) => Math.abs(leg.to.x - leg.from.x) + Math.abs(leg.to.y - leg.from.y);
  const longest = legs.toSorted((a, b) => long(b) - long(a)).slice(0, 2);
  return longest.flatMap(({ from, to }) =>
    [0.5, 0.3, 0.7].map((share) => ({
      x: Math.round(from.x + (to.x - from.x) * share),
      y: Math.round(from.y + (to.y - from.y) * share),
    })),
  );
}

function dotsOnDevice(design: Design, sheetId: EntityId, deviceId: EntityId): Point[] {
  const device = design.devices[deviceId];
  if (device === undefined || device.sheetId !== sheetId) return [];
  const { x, y, width, height } = boxOf(device);
  return [
    { x, y: y + height / 2 },
    { x: x + width, y: y + height / 2 },
    { x: x + width / 2, y },
    { x: x + width / 2, y: y + height },
  ];
}

function obstaclesOf(design: Design, sheetId: EntityId, layout: SheetLayout): Box[] {
  const devices = Object.values(design.devices).filter((device) => device.sheetId === sheetId);
  const runs = Object.values(layout.runs);
  return [
    ...devices.map(boxOf),
    ...Object.values(layout.tags).map((tag) => tag.box),
    ...runs.flatMap((run) => (run.label === null ? [] : [run.label.box])),
    ...runs.flatMap((run) =>
      run.points.slice(1).map((to, i) => {
        const from = run.points[i]!;
        return {
          x: Math.min(from.x, to.x),
          y: Math.min(from.y, to.y),
          width: Math.abs(to.x - from.x),
          height: Math.abs(to.y - from.y),
        };
      }),
    ),
    ...runs.flatMap((run) => run.stubs.map((stub) => ({ x: stub.x - 20, y: stub.y - 12, width: 40, height: 24 }))),
  ];
}
