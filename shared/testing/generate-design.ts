import type { Design, Device, End, Mode, Run } from '#shared/model/design.ts';

/**
 * Made-up DC systems for trials: batteries through fuses and switches to a tree of busbars, loads of all three
 * models on them, returns to negative busbars. The same seed gives the same design.
 */
export interface Wish {
  readonly seed: number;
  readonly batteries?: number;
  readonly busbars?: number;
  readonly loads?: number;
  /** Further runs between busbars, so that current has several ways. */
  readonly rings?: number;
  /** Links without resistance, none of them beside another. */
  readonly zeroOhm?: boolean;
  /** The loads' ratings, times this. */
  readonly strength?: number;
  readonly alternators?: number;
}

export function generateDesign(wish: Wish): Design {
  const {
    seed,
    batteries = 2,
    busbars = 4,
    loads = 8,
    rings = 2,
    zeroOhm = true,
    strength = 1,
    alternators = 0,
  } = wish;
  const random = randomFrom(seed);
  const devices: Record<string, Device> = {};
  const runs: Record<string, Run> = {};
  const used = new Map<string, number>();

  const place = (id: string, kind: string, ratings: Record<string, unknown>, more: Partial<Device> = {}) => {
    devices[id] = { id, kind, mark: id.toUpperCase(), ratings, sheetId: 's1', x: 0, y: 0, ...more };
  };
  /** The next free stud of a busbar; what finds none free shares the last. */
  const studOf = (busbar: string): End => {
    const stud = (used.get(busbar) ?? 0) + 1;
    used.set(busbar, stud);
    return { device: busbar, terminal: String(Math.min(stud, 60)) };
  };
  const between = (least: number, most: number) => least + (most - least) * random();
  const pick = <T>(from: readonly T[]): T => from[Math.floor(random() * from.length)]!;
  const wire = (from: End, to: End, thick: boolean) => {
    const id = `w${String(Object.keys(runs).length + 1).padStart(5, '0')}`;
    const isNone = zeroOhm && random() < 0.08;
    const size = pick(thick ? THICK : THIN);
    const conductor = random() < 0.1 ? { size, parallel: 2 } : { size };
    const measured = random() < 0.2 ? { milliohm: between(0.2, 8) } : {};
    const length = isNone ? { lengthM: 0, link: true as const } : { lengthM: between(0.2, thick ? 3 : 8), ...measured };
    runs[id] = { id, mark: id.toUpperCase(), from, to, conductor, ...length };
  };

  for (let i = 0; i < busbars; i++) {
    place(`xp${i}`, 'busbar', { ratedA: 600, studs: 60 });
    place(`xn${i}`, 'busbar', { ratedA: 600, studs: 60, role: 'dc-' });
    if (i === 0) continue;
    const above = Math.floor(random() * i);
    place(`f${i}`, random() < 0.5 ? 'fuse' : 'breaker', { ratedA: between(30, 200) });
    wire(studOf(`xp${above}`), { device: `f${i}`, terminal: 'a' }, true);
    wire({ device: `f${i}`, terminal: 'b' }, studOf(`xp${i}`), true);
    wire(studOf(`xn${i}`), studOf(`xn${above}`), true);
  }
  for (let i = 0; i < rings && busbars > 1; i++) {
    const one = Math.floor(random() * busbars);
    const other = (one + 1 + Math.floor(random() * (busbars - 1))) % busbars;
    const side = random() < 0.5 ? 'xp' : 'xn';
    place(`q${i}r`, 'switch', { continuousA: 300 });
    wire(studOf(`${side}${one}`), { device: `q${i}r`, terminal: 'a' }, true);
    wire({ device: `q${i}r`, terminal: 'b' }, studOf(`${side}${other}`), true);
  }
  for (let i = 0; i < batteries; i++) {
    const chemistry = pick(['flooded', 'agm', 'gel', 'lifepo4'] as const);
    const told = random() < 0.5 ? { emfV: between(12.2, 13.2) } : {};
    const inside = random() < 0.6 ? { internalMilliohm: between(1, 12) } : {};
    const nominalV = chemistry === 'lifepo4' ? 12.8 : 12;
    place(`g${i}`, 'battery', { chemistry, nominalV, capacityAh: between(50, 300), ...told, ...inside });
    const onto = Math.floor(random() * Math.min(2, busbars));
    place(`fm${i}`, 'fuse', { ratedA: 300 }, random() < 0.3 ? { mountedOn: { device: `g${i}`, terminal: 'pos' } } : {});
    place(`qm${i}`, random() < 0.7 ? 'switch' : 'selector', { continuousA: 300 });
    const isSwitch = devices[`qm${i}`]!.kind === 'switch';
    if (!devices[`fm${i}`]!.mountedOn)
      wire({ device: `g${i}`, terminal: 'pos' }, { device: `fm${i}`, terminal: 'a' }, true);
    wire({ device: `fm${i}`, terminal: 'b' }, { device: `qm${i}`, terminal: isSwitch ? 'a' : '1' }, true);
    wire({ device: `qm${i}`, terminal: isSwitch ? 'b' : 'common' }, studOf(`xp${onto}`), true);
    wire({ device: `g${i}`, terminal: 'neg' }, studOf(`xn${onto}`), true);
  }
  for (let i = 0; i < loads; i++) {
    const model = pick(['current', 'power', 'resistance'] as const);
    const amps = between(0.3, 6) * strength;
    place(`l${i}`, 'load', { nominalV: 12, model, ...(random() < 0.5 ? { ratedA: amps } : { ratedW: amps * 12 }) });
    const on = Math.floor(random() * busbars);
    place(`fl${i}`, 'fuse', { ratedA: between(5, 30), ...(random() < 0.2 ? { coldMilliohm: between(1, 20) } : {}) });
    wire(studOf(`xp${on}`), { device: `fl${i}`, terminal: 'a' }, false);
    wire({ device: `fl${i}`, terminal: 'b' }, { device: `l${i}`, terminal: 'pos' }, false);
    wire({ device: `l${i}`, terminal: 'neg' }, studOf(`xn${on}`), false);
  }
  const on: Mode['states'] = {};
  for (let i = 0; i < alternators; i++) {
    place(`h${i}`, 'alternator', { maxA: between(10, 90), regulatedV: between(13.6, 14.6) });
    wire({ device: `h${i}`, terminal: 'pos' }, studOf(`xp${Math.floor(random() * busbars)}`), true);
    wire({ device: `h${i}`, terminal: 'neg' }, studOf('xn0'), true);
    on[`h${i}`] = { on: true };
  }
  for (const [busbar, studs] of used) {
    devices[busbar] = { ...devices[busbar]!, ratings: { ...devices[busbar]!.ratings, studs: Math.min(studs, 60) } };
  }
  return {
    format: 'ampwright-design',
    version: 1,
    basis: {},
    sheets: { s1: { id: 's1' } },
    zones: {},
    devices,
    runs,
    modes: { motoring: { id: 'motoring', name: 'Motoring', states: on } },
    notes: {},
  };
}

const THICK = ['2/0 AWG', '1/0 AWG', '2 AWG', '6 AWG'] as const;
const THIN = ['16 AWG', '14 AWG', '12 AWG', '10 AWG'] as const;

/** Numbers from 0 to 1 that look random and repeat with the seed (a 32-bit mixing generator). */
export function randomFrom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), 1 | state);
    mixed = (mixed + Math.imul(mixed ^ (mixed >>> 7), 61 | mixed)) ^ mixed;
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296;
  };
}
