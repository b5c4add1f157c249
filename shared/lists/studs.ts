import { basisOf } from '#shared/model/defaults.ts';
import type { Design, Device, Stud } from '#shared/model/design.ts';

/**
 * The stud or screw a lug goes on: the device's own word, else what such devices commonly have. Common practice,
 * from memory [M]: the part in hand has the last word. Null where no ring goes: wires are crimped straight in.
 */
export function studOf(design: Design, device: Device, terminal: string): Stud | null {
  const told = device.studs?.[terminal];
  if (told !== undefined) return told;
  const usual = usualStud(device, terminal);
  return usual !== null && basisOf(design).profile === 'iso-13297' ? (METRIC[usual] ?? usual) : usual;
}

function usualStud({ kind, ratings, symbol }: Device, terminal: string): Stud | null {
  const ratedA = typeof ratings.ratedA === 'number' ? ratings.ratedA : 0;
  switch (kind) {
    case 'battery':
      return terminal === 'sense' ? '#10' : '5/16 in';
    case 'selector':
      return terminal.startsWith('field') ? '#8' : '3/8 in';
    case 'switch':
      return ratings.role === 'battery' || ratings.role === 'emergencyParallel' ? '3/8 in' : '#8';
    case 'fuse':
      return fuseStud(ratings.family, ratedA);
    case 'breaker':
      return ratedA > 50 ? '1/4 in' : '#10';
    case 'busbar':
      return ratedA > 250 ? '3/8 in' : ratedA > 150 ? '5/16 in' : ratedA > 100 ? '1/4 in' : '#10';
    case 'terminal':
      return symbol === 'splice' ? null : '#8';
    case 'bond':
      return '1/4 in';
    case 'alternator':
      return terminal === 'pos' || terminal === 'neg' ? '1/4 in' : '#8';
    case 'starter':
      return terminal === 'solenoid' ? '#10' : '5/16 in';
    case 'load':
      return ratedA > 40 || Number(ratings.ratedW ?? 0) > 500 ? '5/16 in' : '#8';
    default:
      return '#10';
  }
}

function fuseStud(family: unknown, ratedA: number): Stud {
  if (family === 'blade' || family === 'glass') return '#8';
  if (family === 'class T' || family === 'class J') return ratedA > 200 ? '3/8 in' : '5/16 in';
  return '5/16 in';
}

/** The stud that the same place has on equipment made in millimetres. */
const METRIC: Readonly<Partial<Record<Stud, Stud>>> = {
  '#6': 'M4',
  '#8': 'M4',
  '#10': 'M5',
  '1/4 in': 'M6',
  '5/16 in': 'M8',
  '3/8 in': 'M10',
  '1/2 in': 'M12',
};
