import type { Design } from '#shared/model/design.ts';

/** A battery, a fuse beside it, and a bilge pump: the least that has a feed and a return. */
export function aSmallDesign(): Design {
  return {
    format: 'ampwright-design',
    version: 1,
    vessel: { name: 'Dabchick' },
    basis: { profile: 'abyc-e11', cable: { insulationC: 105 } },
    sheets: { s1: { id: 's1', number: 1, title: 'DC', paper: 'A4' } },
    zones: { helm: { id: 'helm', name: 'Under the helm' } },
    devices: {
      g1: {
        id: 'g1',
        kind: 'battery',
        mark: 'G1',
        name: 'Start battery',
        ratings: { chemistry: 'flooded', nominalV: 12, capacityAh: 95, ccaA: 800 },
        sheetId: 's1',
        x: 96,
        y: 160,
        rotation: 0,
        zoneId: 'helm',
        studs: { pos: 'M8' },
      },
      f1: {
        id: 'f1',
        kind: 'fuse',
        mark: 'F1',
        name: 'Bilge pump',
        ratings: { ratedA: 10, interruptA: 10000, maxV: 58, family: 'terminal' },
        sheetId: 's1',
        x: 160,
        y: 96,
        symbol: 'stud',
      },
      p1: {
        id: 'p1',
        kind: 'load',
        mark: 'M1',
        name: 'Bilge pump',
        ratings: { nominalV: 12, ratedA: 5, duty: 'bilge' },
        sheetId: 's1',
        x: 320,
        y: 160,
        symbol: 'pump',
      },
    },
    runs: {
      w1: {
        id: 'w1',
        mark: 'W1',
        from: { device: 'g1', terminal: 'pos' },
        to: { device: 'f1', terminal: 'a' },
        lengthM: 0.1,
        conductor: { size: '14 AWG', insulationC: 105 },
        zoneIds: ['helm'],
        bends: [],
      },
      w2: {
        id: 'w2',
        mark: 'W2',
        from: { device: 'f1', terminal: 'b' },
        to: { device: 'p1', terminal: 'pos' },
        lengthM: 3,
        conductor: { size: '14 AWG' },
      },
      w3: {
        id: 'w3',
        mark: 'W3',
        from: { device: 'p1', terminal: 'neg' },
        to: { device: 'g1', terminal: 'neg' },
        lengthM: 3,
        conductor: { size: '14 AWG' },
      },
    },
    modes: {},
    notes: {},
  };
}

/** The design with one value replaced at a dotted path, or taken out where it is undefined, whatever that makes of it. */
export function edited(path: string, value: unknown, design: unknown = aSmallDesign()): unknown {
  const copy = structuredClone(design) as Record<string, unknown>;
  const keys = path.split('.');
  const last = keys.pop()!;
  let at = copy;
  for (const key of keys) {
    at[key] ??= {};
    at = at[key] as Record<string, unknown>;
  }
  if (value === undefined) delete at[last];
  else at[last] = value;
  return copy;
}
