import { kindOf } from '#shared/kinds/index.ts';
import { wireColours } from '#shared/kinds/wire-colour.ts';
import type { PartsLine } from '#shared/model/analysis.ts';
import { basisOf, conductorOf, workOf } from '#shared/model/defaults.ts';
import type { Design, Run } from '#shared/model/design.ts';
import { SIZES } from '#shared/model/size.ts';
import { formatC } from '#shared/units/temperature.ts';

import { partWords } from './part-words.ts';
import { studOf } from './studs.ts';

/**
 * What the job buys, from the drawing alone: new devices, cable with its slack and ends, a lug for every end that
 * takes one. What exists, is removed, or comes with an assembly (a link) is not bought.
 */
export function partsList(design: Design): PartsLine[] {
  const runs = inOrder(design.runs).filter((run) => workOf(run) === 'new' && run.link !== true);
  return [...deviceLines(design), ...cableLines(design, runs), ...jacketLines(design, runs), ...lugLines(design, runs)];
}

interface Draft {
  readonly group: string;
  readonly part: string;
  readonly rating: string;
  readonly unit: PartsLine['unit'];
  /** Lines of a group stand in this order, then by words. */
  readonly rank: number;
  quantity: number;
  readonly devices: string[];
  readonly runs: string[];
}

/** Lines that say the same are one line. */
class Lines {
  private readonly drafts = new Map<string, Draft>();

  add(
    of: Pick<Draft, 'group' | 'part' | 'rating' | 'unit'> & { rank?: number },
    quantity: number,
    from: { device?: string; run?: string },
  ) {
    const id = lineId(of);
    const draft = this.drafts.get(id) ?? { rank: 0, ...of, quantity: 0, devices: [], runs: [] };
    draft.quantity += quantity;
    if (from.device !== undefined) draft.devices.push(from.device);
    if (from.run !== undefined && !draft.runs.includes(from.run)) draft.runs.push(from.run);
    this.drafts.set(id, draft);
  }

  list(): PartsLine[] {
    return [...this.drafts.values()]
      .sort((a, b) => a.rank - b.rank || compare(a.part, b.part) || compareNumeric(a.rating, b.rating))
      .map((draft) => ({
        id: lineId(draft),
        group: draft.group,
        part: draft.part,
        rating: draft.rating,
        unit: draft.unit,
        // Rounded up once a line, to the whole metre that cable is cut from the drum by.
        quantity: draft.unit === 'm' ? Math.ceil(draft.quantity - 1e-9) : draft.quantity,
        devices: draft.devices,
        runs: draft.runs,
      }));
  }
}

function lineId({ group, part, rating }: Pick<Draft, 'group' | 'part' | 'rating'>): string {
  return [group, part, rating].join(':');
}

function deviceLines(design: Design): PartsLine[] {
  const lines = new Map<string, Lines>();
  for (const device of inOrder(design.devices)) {
    if (workOf(device) !== 'new') continue;
    const group = kindOf(device)?.drawer ?? 'Devices';
    const own = lines.get(group) ?? new Lines();
    lines.set(group, own);
    own.add({ group, ...partWords(device), unit: 'each' }, 1, { device: device.id });
  }
  const order = ['Store', 'Charge', 'Protect', 'Switch', 'Join', 'Convert', 'Use', 'Shore', 'Watch', 'Devices'];
  return order.flatMap((group) => lines.get(group)?.list() ?? []);
}

/** Σ (length × (1 + slack) + 2 × end allowance) × parallel, by size, insulation and colour. */
function cableLines(design: Design, runs: readonly Run[]): PartsLine[] {
  const { slackFraction, endAllowanceM } = basisOf(design).cable;
  const colours = wireColours(design);
  const lines = new Lines();
  for (const run of runs) {
    if (run.lengthM === undefined || run.cable !== undefined) continue;
    const { size, insulationC, parallel } = conductorOf(run);
    lines.add(
      {
        group: 'Cable',
        part: `Boat cable, ${colours[run.id] ?? 'red'}`,
        rating: `${size}, ${formatC(insulationC)}`,
        unit: 'm',
        rank: -SIZES.indexOf(size),
      },
      (run.lengthM * (1 + slackFraction) + 2 * endAllowanceM) * parallel,
      { run: run.id },
    );
  }
  return lines.list();
}

/** Cores in one jacket are bought as the cable, as long as its longest core. */
function jacketLines(design: Design, runs: readonly Run[]): PartsLine[] {
  const { slackFraction, endAllowanceM } = basisOf(design).cable;
  const lines = new Lines();
  for (const cable of inOrder(design.cables ?? {})) {
    const cores = runs.filter((run) => run.cable === cable.id && run.lengthM !== undefined);
    if (cores.length === 0) continue;
    const lengthM = Math.max(...cores.map((run) => run.lengthM!));
    const of = {
      group: 'Cable',
      part: 'Cable in a jacket',
      rating: [cable.type, cable.jacket ?? ''].filter(Boolean).join(', '),
    };
    cores.forEach((run, i) =>
      lines.add({ ...of, unit: 'm' }, i === 0 ? lengthM * (1 + slackFraction) + 2 * endAllowanceM : 0, { run: run.id }),
    );
  }
  return lines.list();
}

function lugLines(design: Design, runs: readonly Run[]): PartsLine[] {
  const lines = new Lines();
  for (const run of runs) {
    const { size, parallel } = conductorOf(run);
    for (const end of [run.from, run.to]) {
      const device = design.devices[end.device];
      const stud = device === undefined ? null : studOf(design, device, end.terminal);
      if (stud === null) continue;
      lines.add(
        {
          group: 'Lugs',
          part: 'Ring terminal, tinned',
          rating: `${size}, stud ${stud}`,
          unit: 'each',
          rank: -SIZES.indexOf(size),
        },
        parallel,
        { run: run.id },
      );
    }
  }
  return lines.list();
}

/** By id, so that the order of keys in the document changes nothing. */
function inOrder<Entity extends { readonly id: string }>(record: Readonly<Record<string, Entity>>): Entity[] {
  return Object.values(record).sort((a, b) => compare(a.id, b.id));
}

function compare(a: string, b: string): number {
  return a < b ? -1 : a > b ? 1 : 0;
}

/** `5 A` before `15 A`. */
function compareNumeric(a: string, b: string): number {
  return Number.parseFloat(a) - Number.parseFloat(b) || compare(a, b);
}
