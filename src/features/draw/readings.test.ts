import { describe, expect, it } from 'vitest';

import type { Design } from '#shared/model/design.ts';

import { readColour, readEnd, readLength, readSize, readZones } from './readings.ts';

const design: Design = {
  format: 'ampwright-design',
  version: 1,
  basis: {},
  sheets: { s1: { id: 's1' } },
  zones: { z1: { id: 'z1', name: 'Engine space' }, z2: { id: 'z2', name: 'Cabin' } },
  devices: { d1: { id: 'd1', kind: 'fuse', mark: 'F4', ratings: { ratedA: 10 }, sheetId: 's1', x: 0, y: 0 } },
  runs: {},
  modes: {},
  notes: {},
};

describe('what a fitter types into a field of a run', () => {
  it('reads a size however it is written, a bare number by the profile', () => {
    expect(readSize('2/0', false)).toEqual({ ok: true, value: '2/0 AWG' });
    expect(readSize('6', false)).toEqual({ ok: true, value: '6 AWG' });
    expect(readSize('6', true)).toEqual({ ok: true, value: '6 mm²' });
    expect(readSize('35 mm2', false)).toEqual({ ok: true, value: '35 mm²' });
    expect(readSize('35', false)).toEqual({ ok: true, value: '35 mm²' });
    expect(readSize('7 awg', false).ok).toBe(false);
  });

  it('takes an emptied length for not yet known, and never reads nonsense as a length', () => {
    expect(readLength('', 'us')).toEqual({ ok: true, value: undefined });
    expect(readLength('6 ft 4 in', 'metric')).toEqual({ ok: true, value: 1.9304 });
    expect(readLength('long', 'us').ok).toBe(false);
  });

  it('finds the terminal of a device by its mark', () => {
    expect(readEnd('f4:b', design)).toEqual({ ok: true, value: { device: 'd1', terminal: 'b' } });
    expect(readEnd('F4 : z', design)).toEqual({ ok: false, says: 'F4 has a, b.' });
    expect(readEnd('F9 : a', design).ok).toBe(false);
  });

  it('finds zones by the beginning of their names', () => {
    expect(readZones('eng, Cabin', design)).toEqual({ ok: true, value: ['z1', 'z2'] });
    expect(readZones('', design)).toEqual({ ok: true, value: undefined });
    expect(readZones('galley', design)).toEqual({ ok: false, says: 'Zones are Engine space, Cabin.' });
  });

  it('reads two-colour wires and refuses a colour no table knows', () => {
    expect(readColour('Green / Yellow')).toEqual({ ok: true, value: 'green/yellow' });
    expect(readColour('turquoise').ok).toBe(false);
  });
});
