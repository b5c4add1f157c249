import { COLOURS, type Design, type End, type EntityId } from '#shared/model/design.ts';
import { SIZES, sizeOf, type Size } from '#shared/model/size.ts';
import { terminalAt, terminalsOf } from '#shared/kinds/place.ts';
import { LENGTH_ACCEPTED, readLengthM, type UnitSystem } from '#shared/units/length.ts';
import type { Reading } from '#src/ui/cell.tsx';

/** How the fields of runs read what is typed: a value, or the line that says what is accepted. */

/** Empty is not yet known. */
export function readLength(text: string, units: UnitSystem): Reading<number | undefined> {
  if (text.trim() === '') return { ok: true, value: undefined };
  const lengthM = readLengthM(text, units);
  return lengthM === undefined ? { ok: false, says: LENGTH_ACCEPTED[units] } : { ok: true, value: lengthM };
}

/** `2/0`, `6`, `6 AWG`, `35 mm2`; a bare number is of the series that the profile uses. */
export function readSize(text: string, isMetric: boolean): Reading<Size> {
  const plain = text.trim().replace(/\s+/g, ' ');
  const candidates = [
    plain,
    plain.replace(/^(\S+)\s*awg$/i, '$1 AWG'),
    plain.replace(/^(\S+)\s*mm(2|²)?$/i, '$1 mm²'),
    `${plain} ${isMetric ? 'mm²' : 'AWG'}`,
    `${plain} ${isMetric ? 'AWG' : 'mm²'}`,
  ];
  const size = candidates.map(sizeOf).find((known) => known !== undefined);
  if (size !== undefined) return { ok: true, value: size };
  return {
    ok: false,
    says: isMetric ? 'Type a size such as 35 mm² or 2/0 AWG.' : 'Type a size such as 2/0, 6 AWG or 35 mm².',
  };
}

/** A colour or two joined by `/`; empty takes the profile's. */
export function readColour(text: string): Reading<string | undefined> {
  const plain = text
    .trim()
    .toLowerCase()
    .replace(/\s*\/\s*/g, '/')
    .replace(/\s+/g, '-')
    .replace('gray', 'grey');
  if (plain === '') return { ok: true, value: undefined };
  const isKnown = plain.split('/').length <= 2 && plain.split('/').every((part) => COLOURS.some((c) => c === part));
  return isKnown ? { ok: true, value: plain } : { ok: false, says: 'Type a colour such as red, or two joined by /.' };
}

export function readCount(text: string): Reading<number> {
  const value = Number(text.trim());
  return Number.isInteger(value) && value >= 1
    ? { ok: true, value }
    : { ok: false, says: 'Type a whole number from 1.' };
}

/** `F4 : b` or `F4.b`. */
export function readEnd(text: string, design: Design): Reading<End> {
  const [mark = '', terminal = ''] = text.split(/\s*[:.]\s*/).map((part) => part.trim());
  const device = Object.values(design.devices).find((one) => one.mark?.toLowerCase() === mark.toLowerCase());
  if (device === undefined) return { ok: false, says: 'Type a device and its terminal, such as F4 : b.' };
  const place =
    terminalAt(device, terminal) ??
    terminalsOf(device).find((one) => one.name.toLowerCase() === terminal.toLowerCase());
  if (place !== undefined) return { ok: true, value: { device: device.id, terminal: place.name } };
  const names = terminalsOf(device).map((one) => one.name);
  return { ok: false, says: `${device.mark ?? 'It'} has ${names.slice(0, 12).join(', ')}.` };
}

/** Names of zones, joined by commas; empty is none. */
export function readZones(text: string, design: Design): Reading<EntityId[] | undefined> {
  const names = text
    .split(/[,;]/)
    .map((name) => name.trim())
    .filter((name) => name !== '');
  const zones = Object.values(design.zones);
  const ids: EntityId[] = [];
  for (const name of names) {
    const zone =
      zones.find((one) => one.name.toLowerCase() === name.toLowerCase()) ??
      zones.find((one) => one.name.toLowerCase().startsWith(name.toLowerCase()));
    if (zone === undefined) {
      const known = zones.map((one) => one.name).join(', ');
      return { ok: false, says: known === '' ? 'No zones yet: add them on the Basis page.' : `Zones are ${known}.` };
    }
    if (!ids.includes(zone.id)) ids.push(zone.id);
  }
  return { ok: true, value: ids.length === 0 ? undefined : ids };
}

export const SIZE_CHOICES = SIZES.map((size) => ({ value: size, title: size }));
