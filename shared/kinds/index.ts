import type { Device } from '#shared/model/design.ts';

import { alternator } from './alternator.ts';
import { battery } from './battery.ts';
import { bond } from './bond.ts';
import { breaker } from './breaker.ts';
import { busbar } from './busbar.ts';
import { fuse } from './fuse.ts';
import type { Kind } from './kind.ts';
import { load } from './load.ts';
import { selector } from './selector.ts';
import { starter } from './starter.ts';
import { switchKind } from './switch.ts';
import { terminal } from './terminal.ts';

/** Every device kind there is, in the order of the locker. Adding one is its file, its symbol and a line here. */
export const KINDS = [
  battery,
  alternator,
  fuse,
  breaker,
  switchKind,
  selector,
  busbar,
  terminal,
  bond,
  starter,
  load,
] as const;

const byName: ReadonlyMap<string, Kind> = new Map(KINDS.map((kind) => [kind.kind, kind as unknown as Kind]));

/** The kind of a device, or undefined for a kind this version does not know (an imported file can't hold one). */
export function kindOf(device: Pick<Device, 'kind'>): Kind | undefined {
  return byName.get(device.kind);
}
