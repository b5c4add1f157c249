import type { Basis, Design, Device, End, Mode, Run, Zone } from '#shared/model/design.ts';

/** Puts a design together a line at a time; names only what matters, all else is what a sound drawing would have. */
export class DesignBuilder {
  private readonly devices: Record<string, Device> = {};
  private readonly runs: Record<string, Run> = {};
  private readonly zones: Record<string, Zone> = {};
  private readonly modes: Record<string, Mode> = {};
  private basis: Basis = { profile: 'abyc-e11' };

  basedOn(basis: Basis): this {
    this.basis = { ...this.basis, ...basis };
    return this;
  }

  zone(id: string, zone: Partial<Zone> = {}): this {
    this.zones[id] = { id, name: id, ...zone };
    return this;
  }

  mode(id: string, states: Mode['states'], hoursPerDay = 1): this {
    this.modes[id] = { id, name: id, states, hoursPerDay };
    return this;
  }

  device(mark: string, kind: string, ratings: Record<string, unknown>, more: Partial<Device> = {}): this {
    const n = Object.keys(this.devices).length;
    const id = mark.toLowerCase();
    this.devices[id] = { id, kind, mark, ratings, sheetId: 's1', x: 80 * (n % 8), y: 80 * Math.floor(n / 8), ...more };
    return this;
  }

  battery(mark = 'G1', ratings: Record<string, unknown> = {}, more: Partial<Device> = {}): this {
    const usual = { chemistry: 'flooded', nominalV: 12, capacityAh: 100, ccaA: 600, emfV: 12.8 };
    return this.device(mark, 'battery', { ...usual, ...ratings }, more);
  }

  /** Breaks 20 kA, so that only its rating is in question. */
  fuse(mark: string, ratedA: number, ratings: Record<string, unknown> = {}, more: Partial<Device> = {}): this {
    return this.device(mark, 'fuse', { ratedA, interruptA: 20_000, maxV: 125, ...ratings }, more);
  }

  load(mark: string, ratedA: number, ratings: Record<string, unknown> = {}, more: Partial<Device> = {}): this {
    return this.device(mark, 'load', { nominalV: 12, ratedA, ...ratings }, more);
  }

  busbar(mark: string, role: 'dc+' | 'dc-', more: Partial<Device> = {}): this {
    return this.device(mark, 'busbar', { ratedA: 600, maxV: 48, role }, more);
  }

  /** `run('W1', 'F1.b', 'E1.pos', 2, '10 AWG')`. */
  run(
    mark: string,
    from: string,
    to: string,
    lengthM: number | undefined,
    size: string,
    more: Omit<Partial<Run>, 'conductor'> & { conductor?: Partial<Run['conductor']> } = {},
  ): this {
    const id = mark.toLowerCase();
    const { conductor, ...rest } = more;
    const length = lengthM === undefined ? {} : { lengthM };
    this.runs[id] = {
      id,
      mark,
      from: endOf(from),
      to: endOf(to),
      ...length,
      conductor: { size, ...conductor },
      ...rest,
    };
    return this;
  }

  build(): Design {
    return {
      format: 'ampwright-design',
      version: 1,
      basis: this.basis,
      sheets: { s1: { id: 's1' } },
      zones: this.zones,
      devices: this.devices,
      runs: this.runs,
      modes: this.modes,
      notes: {},
    };
  }
}

export function aDesign(basis: Basis = {}): DesignBuilder {
  return new DesignBuilder().basedOn(basis);
}

function endOf(text: string): End {
  const [device = '', terminal = ''] = text.split('.');
  return { device: device.toLowerCase(), terminal };
}

export interface FusedRun {
  size?: string;
  insulationC?: Run['conductor']['insulationC'];
  parallel?: number;
  bundled?: number;
  lengthM?: number;
  loadA?: number;
  load?: Record<string, unknown>;
  engineSpace?: boolean;
  /** null: the run starts on the battery with no fuse. */
  protectedBy?: null;
  fuse?: Record<string, unknown>;
  fuseIs?: Partial<Device>;
  runIs?: Partial<Run>;
  basis?: Basis;
  battery?: Record<string, unknown>;
}

/** G1 with F1 on its stud, W1 from F1 to the load E1, and W2 back: W1 and W2 are of the same conductor. */
export function fusedRun(ratedA: number, given: FusedRun = {}): Design {
  const { size = '10 AWG', lengthM = 1, loadA = 5, runIs = {} } = given;
  const conductor = { insulationC: given.insulationC, parallel: given.parallel, bundled: given.bundled };
  const told = Object.fromEntries(Object.entries(conductor).filter(([, value]) => value !== undefined));
  const zoneIds = given.engineSpace ? ['engine'] : [];
  const run = { conductor: told, zoneIds, ...runIs };
  const design = aDesign(given.basis)
    .zone('engine', { engineSpace: true })
    .battery('G1', given.battery)
    .load('E1', loadA, given.load)
    .run('W2', 'E1.neg', 'G1.neg', lengthM, size, run);
  if (given.protectedBy === null) return design.run('W1', 'G1.pos', 'E1.pos', lengthM, size, run).build();
  return design
    .fuse('F1', ratedA, given.fuse, { mountedOn: { device: 'g1', terminal: 'pos' }, ...given.fuseIs })
    .run('W1', 'F1.b', 'E1.pos', lengthM, size, run)
    .build();
}
