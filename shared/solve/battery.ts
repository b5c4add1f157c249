import type { BatteryElement } from '#shared/kinds/element.ts';
import { LEAD_ACID_REST_VOLTAGE, LIFEPO4_REST_VOLTAGE, LOW_SOC, USUAL_SOC } from '#shared/tables/battery-emf.ts';
import { AGED_FACTOR, BATTERY_MILLIOHM } from '#shared/tables/battery-resistance.ts';

/** Working: as a mode says. Greatest and least: what a fault can at most and will at least be fed with. */
export type BatteryCase = 'working' | 'greatest' | 'least';

export interface Behind {
  readonly emfV: number;
  readonly ohm: number;
}

/** A battery as an EMF behind a resistance: the maker's figures where they are given, else the tables by chemistry. */
export function batteryBehind(battery: BatteryElement, batteryCase: BatteryCase): Behind {
  const soc = { working: battery.soc ?? USUAL_SOC, greatest: 1, least: LOW_SOC }[batteryCase];
  const emfV = battery.soc === undefined || batteryCase !== 'working' ? battery.emfV : undefined;
  const volts = emfV ?? restV(battery, soc);
  return { emfV: volts, ohm: internalOhm(battery, volts, batteryCase) };
}

/** Rest voltage by the chemistry's table. */
export function restV(battery: BatteryElement, soc: number): number {
  const { rows, nominalV } = battery.chemistry === 'lifepo4' ? LIFEPO4_REST_VOLTAGE : LEAD_ACID_REST_VOLTAGE;
  const wanted = Math.min(1, Math.max(0, soc));
  const above = Math.max(
    1,
    rows.findIndex(([rowSoc]) => rowSoc >= wanted),
  );
  const [[lowSoc, lowV], [highSoc, highV]] = [rows[above - 1]!, rows[above]!];
  const unitV = lowV + ((highV - lowV) * (wanted - lowSoc)) / (highSoc - lowSoc);
  return unitV * (battery.chemistry === 'lifepo4' ? units(battery) : battery.nominalV / nominalV);
}

/** How many 12 V units (six lead cells, four LiFePO4) a battery is worth. */
function units({ chemistry, nominalV }: BatteryElement): number {
  // LiFePO4 is sold as 12.8 V and, of the same four cells, as 12 V.
  return chemistry === 'lifepo4' && nominalV % 12 !== 0 ? nominalV / 12.8 : nominalV / 12;
}

/** What the resistance of a battery in the greatest fault is taken from. */
export function resistanceFrom({ internalMilliohm, shortCircuitA }: BatteryElement): 'maker' | 'entered' | 'usual' {
  if (shortCircuitA !== undefined && shortCircuitA > 0) return 'maker';
  return internalMilliohm !== undefined && internalMilliohm >= 0 ? 'entered' : 'usual';
}

function internalOhm(battery: BatteryElement, emfV: number, batteryCase: BatteryCase): number {
  const { internalMilliohm, shortCircuitA, chemistry, capacityAh } = battery;
  const told = internalMilliohm !== undefined && internalMilliohm >= 0 ? internalMilliohm / 1000 : undefined;
  const maker = shortCircuitA !== undefined && shortCircuitA > 0 ? Math.abs(emfV) / shortCircuitA : undefined;
  const usual = (milliohm: number) => Math.abs((milliohm / 1000) * units(battery) * (100 / capacityAh)) || 0;
  if (batteryCase === 'greatest') return maker ?? told ?? usual(BATTERY_MILLIOHM[chemistry].least);
  if (batteryCase === 'working') return told ?? usual(BATTERY_MILLIOHM[chemistry].least);
  return AGED_FACTOR * (told ?? usual(BATTERY_MILLIOHM[chemistry].greatest));
}
