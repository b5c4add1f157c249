import { kindOf } from '#shared/kinds/index.ts';
import type { Device } from '#shared/model/design.ts';
import { formatAh } from '#shared/units/charge.ts';
import { formatA } from '#shared/units/current.ts';
import { formatW } from '#shared/units/power.ts';
import { formatV } from '#shared/units/voltage.ts';

/** What a device is bought as: the thing, and the figures that a dealer asks for. */
export function partWords(device: Device): { part: string; rating: string } {
  return {
    part: partName(device),
    rating: ratingWords(device)
      .filter((word) => word !== '')
      .join(', '),
  };
}

function partName(device: Device): string {
  const { ratings, symbol } = device;
  switch (device.kind) {
    case 'battery':
      return `Battery, ${CHEMISTRY[String(ratings.chemistry)] ?? String(ratings.chemistry)}`;
    case 'fuse':
      return ratings.family === undefined ? 'Fuse with holder' : `Fuse with holder, ${String(ratings.family)}`;
    case 'breaker':
      return 'Breaker';
    case 'switch':
      return SWITCH[String(ratings.role ?? 'branch')] ?? 'Switch';
    case 'selector':
      return 'Battery selector';
    case 'busbar':
      return BAR[String(ratings.role ?? 'dc+')] ?? 'Busbar';
    case 'terminal':
      return symbol === 'splice' ? 'Splice' : 'Terminal block';
    case 'bond':
      return BOND[String(ratings.role ?? 'common')] ?? 'Bond';
    case 'load':
      return loadName(device);
    default:
      return kindOf(device)?.title ?? 'Device';
  }
}

const CHEMISTRY: Readonly<Record<string, string>> = { flooded: 'flooded', agm: 'AGM', gel: 'gel', lifepo4: 'LiFePO4' };
const SWITCH: Readonly<Record<string, string>> = {
  branch: 'Switch',
  battery: 'Battery switch',
  float: 'Float switch',
  push: 'Push button',
  emergencyParallel: 'Parallel switch',
};
const BAR: Readonly<Record<string, string>> = {
  'dc+': 'Busbar, positive',
  'dc-': 'Busbar, negative',
  l: 'Busbar, line',
  n: 'Busbar, neutral',
  pe: 'Busbar, protective earth',
  bond: 'Busbar, bonding',
};
const BOND: Readonly<Record<string, string>> = {
  common: 'Common ground point',
  engine: 'Engine ground',
  plate: 'Bonding plate',
  hull: 'Hull ground',
  anode: 'Anode',
  lightning: 'Lightning ground',
};

/** By its duty, else by its drawing, else by the name it was given: nobody can buy a "load". */
function loadName({ ratings, symbol, name }: Device): string {
  const byDuty = DUTY[String(ratings.duty)];
  if (byDuty !== undefined) return byDuty;
  const bySymbol = DRAWING[symbol ?? 'plain'];
  return bySymbol ?? (name?.trim() ? name.trim() : 'DC load');
}

const DUTY: Readonly<Record<string, string>> = {
  bilge: 'Bilge pump',
  navLight: 'Navigation light',
  blower: 'Blower',
  thruster: 'Thruster',
  windlass: 'Windlass',
};
const DRAWING: Readonly<Record<string, string>> = {
  motor: 'Motor',
  pump: 'Pump',
  lamp: 'Lamp',
  heater: 'Heater',
  horn: 'Horn',
  socket: 'Socket',
  radio: 'Radio',
  instrument: 'Instrument',
  fridge: 'Refrigerator',
};

function ratingWords({ kind, ratings }: Device): string[] {
  const say = (key: string, format: (value: number) => string) =>
    typeof ratings[key] === 'number' ? format(ratings[key]) : '';
  const count = (key: string, one: string, many: string) =>
    typeof ratings[key] === 'number' ? `${ratings[key]} ${ratings[key] === 1 ? one : many}` : '';
  const breaks = say('interruptA', (amps) => `breaks ${formatA(amps)}`);
  switch (kind) {
    case 'battery':
      return [say('nominalV', formatV), say('capacityAh', formatAh), say('ccaA', (amps) => `${formatA(amps)} CCA`)];
    case 'fuse':
      return [say('ratedA', formatA), say('maxV', formatV), breaks];
    case 'breaker':
      return [say('ratedA', formatA), count('poles', 'pole', 'poles'), say('maxV', formatV), breaks];
    case 'switch':
      return [say('continuousA', formatA), count('poles', 'pole', 'poles'), say('maxV', formatV)];
    case 'selector':
      return [say('continuousA', formatA), say('maxV', formatV)];
    case 'busbar':
      return [say('ratedA', formatA), count('studs', 'stud', 'studs')];
    case 'terminal':
      return [say('ratedA', formatA), count('ways', 'way', 'ways')];
    case 'bond':
      return [];
    case 'alternator':
      return [say('regulatedV', formatV), say('maxA', formatA)];
    case 'starter':
      return [say('crankA', formatA)];
    case 'load':
      return [say('nominalV', formatV), say('ratedA', formatA) || say('ratedW', formatW)];
    default:
      return [say('ratedA', formatA)];
  }
}
