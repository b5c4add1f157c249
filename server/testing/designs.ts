import type { Design, Device, Run } from '#shared/model/design.ts';

/** A battery, a fuse and a lamp on one sheet: the least that has runs, terminals and a zone. */
export function aSmallDesign({ name = 'Sandpiper' } = {}): Design {
  return {
    format: 'ampwright-design',
    version: 1,
    vessel: { name },
    basis: {},
    sheets: { s1: { id: 's1', number: 1, title: 'DC' } },
    zones: { cabin: { id: 'cabin', name: 'Cabin' } },
    devices: {
      g1: aDevice('g1', 'battery', { chemistry: 'agm', nominalV: 12, capacityAh: 100 }, { x: 80, y: 80, mark: 'G1' }),
      f1: aDevice('f1', 'fuse', { ratedA: 10 }, { x: 240, y: 80, mark: 'F1' }),
      e1: aDevice(
        'e1',
        'load',
        { nominalV: 12, ratedA: 1 },
        { x: 400, y: 80, mark: 'E1', symbol: 'lamp', zoneId: 'cabin' },
      ),
    },
    runs: {
      w1: aRun('w1', 'g1.pos', 'f1.a'),
      w2: aRun('w2', 'f1.b', 'e1.pos', { zoneIds: ['cabin'] }),
      w3: aRun('w3', 'e1.neg', 'g1.neg'),
    },
    modes: {},
    notes: {},
  };
}

export function aDevice(
  id: string,
  kind: string,
  ratings: Readonly<Record<string, unknown>>,
  more: Partial<Device> = {},
): Device {
  return { id, kind, ratings, sheetId: 's1', x: 0, y: 0, ...more };
}

export function aRun(id: string, from: string, to: string, more: Partial<Run> = {}): Run {
  const end = (text: string) => {
    const [device, terminal] = text.split('.') as [string, string];
    return { device, terminal };
  };
  return {
    id,
    mark: id.toUpperCase(),
    from: end(from),
    to: end(to),
    lengthM: 2,
    conductor: { size: '10 AWG' },
    ...more,
  };
}
