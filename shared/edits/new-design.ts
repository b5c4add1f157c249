import { FORMAT, FORMAT_VERSION, type Basis, type Design, type Vessel, type Zone } from '#shared/model/design.ts';

import { withoutUndefined, type NewId } from './edit.ts';

export interface NewDesign {
  readonly name: string;
  readonly type?: string;
  readonly lengthM?: number;
  readonly owner?: string;
  readonly nominalV?: readonly number[];
  readonly shore?: Vessel['shore'];
  readonly profile?: Basis['profile'];
  readonly units?: Basis['units'];
  readonly zones?: readonly Omit<Zone, 'id'>[];
}

/** The blank drawing of a new vessel: what is known of her, her zones, and one empty sheet. */
export function newDesign(facts: NewDesign, newId: NewId): Design {
  const zones = (facts.zones ?? []).map((zone): Zone => withoutUndefined({ ...zone, id: newId() }));
  const sheetId = newId();
  return {
    format: FORMAT,
    version: FORMAT_VERSION,
    vessel: withoutUndefined({
      name: facts.name,
      type: facts.type,
      lengthM: facts.lengthM,
      owner: facts.owner,
      nominalV: facts.nominalV === undefined ? undefined : [...facts.nominalV],
      shore: facts.shore,
    }),
    basis: withoutUndefined({ profile: facts.profile, units: facts.units }),
    sheets: { [sheetId]: { id: sheetId, number: 1, title: 'DC system', paper: 'A4', orientation: 'landscape' } },
    zones: Object.fromEntries(zones.map((zone) => [zone.id, zone])),
    devices: {},
    runs: {},
    modes: {},
    notes: {},
  };
}
