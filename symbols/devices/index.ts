import type { Device } from '#shared/model/design.ts';

import { alternator } from './alternator.ts';
import { battery } from './battery.ts';
import { bond } from './bond.ts';
import { breaker } from './breaker.ts';
import { busbar } from './busbar.ts';
import type { Art, Drawing } from './drawing.ts';
import { fuse } from './fuse.ts';
import { load } from './load.ts';
import { selector } from './selector.ts';
import { starter } from './starter.ts';
import { switchDrawing } from './switch.ts';
import { terminal } from './terminal.ts';

/** Every device drawing there is. Adding one is its file and a line here. */
export const DRAWINGS: readonly Drawing[] = [
  battery,
  alternator,
  fuse,
  breaker,
  switchDrawing,
  selector,
  busbar,
  terminal,
  bond,
  starter,
  load,
];

const byKind: ReadonlyMap<string, Drawing> = new Map(DRAWINGS.map((drawing) => [drawing.kind, drawing]));

/** A kind this version can't draw is an empty square, so that its place on the sheet is still seen. */
const UNKNOWN: Art = { strokes: 'M0 0h32v32h-32Z' };

export function artOf(device: Device): Art {
  return byKind.get(device.kind)?.art(device) ?? UNKNOWN;
}
