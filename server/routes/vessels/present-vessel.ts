import type { VesselSummary } from '#shared/api/vessels.ts';
import { may } from '#shared/access/matrix.ts';
import { basisOf } from '#shared/model/defaults.ts';
import type { Database } from '#server/db/connect.ts';
import { readVesselFacts, readVesselRow, type VesselFacts, type VesselRow } from '#server/db/vessel-queries.ts';
import { NotFound } from '#server/refusals.ts';

/** One vessel as its reader may see it. */
export async function presentOneVessel(db: Database, vesselId: string, personId: string): Promise<VesselSummary> {
  const row = await readVesselRow(db, vesselId, personId);
  if (row === undefined) throw new NotFound();
  const facts = await readVesselFacts(db, [vesselId]);
  return presentVessel(row, facts.get(vesselId)!);
}

export function presentVessel(row: VesselRow, facts: VesselFacts): VesselSummary {
  const role = row.admin === true ? 'designer' : row.role!;
  const basis = basisOf({ basis: row.basis });
  const seesDesign = may(role, 'see-design');
  return {
    vesselId: row.vesselId,
    shopId: row.shopId,
    shopName: row.shopName,
    name: row.name,
    type: row.vessel?.type ?? null,
    lengthM: row.vessel?.lengthM ?? null,
    owner: row.vessel?.owner ?? null,
    nominalV: row.vessel?.nominalV ?? [],
    shore: row.vessel?.shore ?? null,
    profile: basis.profile,
    units: basis.units,
    state: row.deletedAt !== null ? 'deleted' : row.archivedAt !== null ? 'archived' : 'active',
    role,
    drawn: seesDesign ? facts.drawn : null,
    revision:
      facts.revision === undefined
        ? null
        : { letter: facts.revision.letter, issuedAt: facts.revision.issuedAt.toISOString() },
    lastChange:
      seesDesign && facts.lastChange !== undefined
        ? { at: facts.lastChange.at.toISOString(), by: facts.lastChange.by, label: facts.lastChange.label }
        : null,
    people: may(role, 'see-people') ? facts.people.map(({ name, role: theirs }) => ({ name, role: theirs })) : [],
    deletedAt: row.deletedAt?.toISOString() ?? null,
  };
}
