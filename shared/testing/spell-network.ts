import type { Design, Device, End } from '#shared/model/design.ts';

/**
 * A generated design spelled out branch by branch, for other solvers to answer. It is read from the document here a
 * second time, with its own figures and nothing of the engine, so that the engine's reading is tried too.
 */
export interface Spelled {
  readonly branches: readonly SpelledBranch[];
  readonly loads: readonly SpelledLoad[];
  /** The node that is 0 V. */
  readonly ground: string;
}

export interface SpelledBranch {
  readonly name: string;
  readonly from: string;
  readonly to: string;
  readonly ohm: number;
  readonly emfV: number;
}

export interface SpelledLoad {
  readonly name: string;
  readonly from: string;
  readonly to: string;
  readonly model: 'current' | 'power';
  readonly amount: number;
}

export function spellNetwork(design: Design): Spelled {
  const branches: SpelledBranch[] = [];
  const loads: SpelledLoad[] = [];
  const node = ({ device, terminal }: End) =>
    design.devices[device]!.kind === 'busbar' ? device : `${device}_${terminal}`;
  const add = (name: string, from: string, to: string, ohm: number, emfV = 0) =>
    branches.push({ name, from, to, ohm, emfV });

  for (const run of Object.values(design.runs)) {
    const copper = (10.75 * (run.lengthM ?? 0)) / 0.3048 / CIRCULAR_MILS[run.conductor.size]!;
    const ohm = run.milliohm === undefined ? copper / (run.conductor.parallel ?? 1) : run.milliohm / 1000;
    add(run.id, node(run.from), node(run.to), ohm);
  }
  for (const device of Object.values(design.devices)) {
    const { id, kind, mountedOn } = device;
    const of = (key: string) => device.ratings[key] as number | undefined;
    if (mountedOn) add(`${id}_mount`, `${id}_a`, node(mountedOn), 0);
    if (kind === 'fuse' || kind === 'breaker') {
      const cold = of('coldMilliohm');
      add(id, `${id}_a`, `${id}_b`, cold === undefined ? 0.1 / of('ratedA')! : cold / 1000);
    }
    if (kind === 'switch') add(id, `${id}_a`, `${id}_b`, 0.0002);
    if (kind === 'selector') add(id, `${id}_1`, `${id}_common`, 0.0002);
    if (kind === 'battery') add(id, `${id}_pos`, `${id}_neg`, batteryOhm(device), of('emfV') ?? batteryV(device));
    if (kind === 'load') spellLoad(device, add, loads);
  }
  const ground = Object.values(design.devices)
    .filter(({ kind }) => kind === 'battery' || kind === 'alternator')
    .map(({ id }) => id)
    .toSorted()[0];
  return { branches, loads, ground: `${ground}_neg` };
}

function spellLoad(device: Device, add: (...branch: [string, string, string, number]) => void, loads: SpelledLoad[]) {
  const { nominalV, ratedA, ratedW, model } = device.ratings as Record<string, number> & { model: string };
  const amps = ratedA ?? ratedW! / nominalV!;
  const [from, to] = [`${device.id}_pos`, `${device.id}_neg`];
  if (model === 'resistance') add(device.id, from, to, nominalV! / amps);
  else
    loads.push({
      name: device.id,
      from,
      to,
      model: model as 'current',
      amount: model === 'power' ? amps * nominalV! : amps,
    });
}

/** NEC Chapter 9, Table 8. */
const CIRCULAR_MILS: Readonly<Record<string, number>> = {
  '16 AWG': 2580,
  '14 AWG': 4110,
  '12 AWG': 6530,
  '10 AWG': 10_380,
  '6 AWG': 26_240,
  '2 AWG': 66_360,
  '1/0 AWG': 105_600,
  '2/0 AWG': 133_100,
};

/** Rest voltage at 80 % charge, and the usual milliohms of 12 V and 100 Ah. */
const REST_V: Readonly<Record<string, number>> = { flooded: 12.42, agm: 12.42, gel: 12.42, lifepo4: 13.3 };
const MILLIOHM: Readonly<Record<string, number>> = { flooded: 5, agm: 3, gel: 5, lifepo4: 3 };

function batteryV(device: Device): number {
  return REST_V[device.ratings['chemistry'] as string]!;
}

function batteryOhm({ ratings }: Device): number {
  const told = ratings['internalMilliohm'] as number | undefined;
  const usual = (MILLIOHM[ratings['chemistry'] as string]! * 100) / (ratings['capacityAh'] as number);
  return (told ?? usual) / 1000;
}
