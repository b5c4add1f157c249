import { basisOf } from '#shared/model/defaults.ts';
import type { Design, Device, End, Run } from '#shared/model/design.ts';

import { kindOf } from './index.ts';
import type { TerminalRole } from './kind.ts';

/**
 * The colour of every run: its own, or else the profile's for its duty (ABYC E-11 colour tables; ISO 13297, where
 * a feed is red by custom). The duty is found by following copper, closed or not, from the devices that tell it.
 */
export function wireColours(design: Design): Readonly<Record<string, string>> {
  const isIso = basisOf(design).profile === 'iso-13297';
  const roles = terminalRoles(design);
  const sides = sidesOf(design, roles);
  const branches = isIso ? new Map<string, string>() : branchColours(design);
  const colours: Record<string, string> = {};
  for (const run of Object.values(design.runs)) {
    colours[run.id] = run.colour ?? dutyColour(run);
  }
  return colours;

  function dutyColour(run: Run): string {
    const ends = [run.from, run.to].map((end) => roles(end));
    if (ends.includes('bond') || ends.includes('pe')) return isIso ? 'green/yellow' : 'green';
    if (ends.includes('signal') || ends.includes('data')) {
      const isStarting = [run.from, run.to].some((end) => end.terminal === 'solenoid');
      return isIso ? 'white' : isStarting ? 'yellow/red' : 'violet';
    }
    const side = sides(run.from) ?? sides(run.to);
    if (side === 'minus') return isIso ? 'black' : 'yellow';
    return branches.get(run.id) ?? 'red';
  }
}

/** Of one run; for many, ask wireColours once. */
export function colourOf(design: Design, run: Run): string {
  return run.colour ?? wireColours(design)[run.id] ?? 'red';
}

type RoleOf = (end: End) => TerminalRole | undefined;

function terminalRoles(design: Design): RoleOf {
  const known = new Map<string, ReadonlyMap<string, TerminalRole>>();
  return ({ device: id, terminal }) => {
    let roles = known.get(id);
    if (roles === undefined) {
      const device = design.devices[id];
      roles = new Map(
        device &&
          kindOf(device)
            ?.terminals(device)
            .map(({ name, role }) => [name, role]),
      );
      known.set(id, roles);
    }
    return roles.get(terminal);
  };
}

/** Kinds whose terminals are, or can be, one conductor: current goes on through them on the same side of the circuit. */
const THROUGH = new Set(['fuse', 'breaker', 'switch', 'selector', 'busbar', 'terminal']);

/** Whether an end stands on the feed or on the return: what every device on the same copper says it is. */
function sidesOf(design: Design, roleOf: RoleOf): (end: End) => 'plus' | 'minus' | undefined {
  const above = new Map<string, string>();
  const top = (key: string): string => {
    let at = key;
    for (let next = above.get(at); next !== undefined; next = above.get(at)) {
      const over = above.get(next);
      if (over !== undefined) above.set(at, over);
      at = next;
    }
    return at;
  };
  const join = (a: string, b: string) => {
    const [one, other] = [top(a), top(b)];
    if (one !== other) above.set(one, other);
  };
  const keyOf = ({ device: id, terminal }: End) => {
    const device = design.devices[id];
    if (device === undefined || !THROUGH.has(device.kind)) return `${id}.${terminal}`;
    return `${id}.${poleOf(device, terminal)}`;
  };

  for (const run of Object.values(design.runs)) join(keyOf(run.from), keyOf(run.to));
  for (const device of Object.values(design.devices)) {
    if (device.mountedOn) join(keyOf({ device: device.id, terminal: 'a' }), keyOf(device.mountedOn));
  }

  const says = new Map<string, Set<'plus' | 'minus'>>();
  const note = (end: End) => {
    const role = roleOf(end);
    if (role !== 'dc+' && role !== 'dc-') return;
    const at = top(keyOf(end));
    says.set(at, (says.get(at) ?? new Set()).add(role === 'dc+' ? 'plus' : 'minus'));
  };
  for (const run of Object.values(design.runs)) {
    note(run.from);
    note(run.to);
  }
  return (end) => {
    const role = roleOf(end);
    if (role === 'dc+') return 'plus';
    if (role === 'dc-') return 'minus';
    const said = says.get(top(keyOf(end)));
    return said?.size === 1 ? [...said][0] : undefined;
  };
}

/** Poles of one device are apart: a, b are one; a2, b2 another. Field contacts of a selector are none of its poles. */
function poleOf(device: Device, terminal: string): string {
  if (device.kind === 'selector' && terminal.startsWith('field')) return terminal;
  if (device.kind === 'breaker' || device.kind === 'switch') return `pole${terminal.slice(1)}`;
  return 'pole';
}

/** From the last protection to the load the feed has the load's own colour. */
function branchColours(design: Design): ReadonlyMap<string, string> {
  const byDevice = new Map<string, Run[]>();
  const byTerminal = new Map<string, Run[]>();
  for (const run of Object.values(design.runs)) {
    for (const { device, terminal } of [run.from, run.to]) {
      add(byDevice, device, run);
      add(byTerminal, `${device}.${terminal}`, run);
    }
  }
  const colours = new Map<string, Set<string>>();
  for (const load of Object.values(design.devices)) {
    if (load.kind === 'load') walk(load);
  }
  return new Map([...colours].filter(([, some]) => some.size === 1).map(([id, some]) => [id, [...some][0]!]));

  function walk(load: Device): void {
    const colour = loadColour(load);
    const seen = new Set<string>();
    const waiting = [...(byTerminal.get(`${load.id}.pos`) ?? [])];
    let at = 0;
    while (at < waiting.length) {
      const run = waiting[at++]!;
      if (seen.has(run.id)) continue;
      seen.add(run.id);
      colours.set(run.id, (colours.get(run.id) ?? new Set()).add(colour));
      for (const { device: id } of [run.from, run.to]) {
        const device = design.devices[id];
        if (device !== undefined && isPassed(device)) waiting.push(...(byDevice.get(id) ?? []));
      }
    }
  }
}

function add(map: Map<string, Run[]>, key: string, run: Run): void {
  const there = map.get(key);
  if (there === undefined) map.set(key, [run]);
  else there.push(run);
}

/** A switch of the branch, or a splice, does not end it; a fuse, a breaker, a bar or a battery switch does. */
function isPassed({ kind, ratings, symbol }: Device): boolean {
  if (kind === 'terminal') return symbol === 'splice';
  return kind === 'switch' && ratings.role !== 'battery' && ratings.role !== 'emergencyParallel';
}

function loadColour({ ratings, symbol }: Device): string {
  if (ratings.duty === 'navLight') return 'grey';
  if (ratings.duty === 'blower') return 'brown/yellow';
  if (ratings.duty === 'bilge' || symbol === 'pump') return 'brown';
  if (symbol === 'lamp') return 'blue';
  return 'red';
}
