import { FAMILIES, type Design } from '#shared/model/design.ts';
import type { Database } from '#server/db/connect.ts';
import { insertReferences, writeEntities } from '#server/db/design-queries.ts';
import { design as designTable } from '#server/db/schema/designs.ts';

import { referenceRowsOf } from './check-references.ts';

/** A design as `readDesign` let it through, put down row by row as the first state of a vessel that has none. */
export async function insertDesign(tx: Database, vesselId: string, design: Design): Promise<void> {
  await tx.insert(designTable).values({ vesselId, seq: 0, vessel: design.vessel ?? null, basis: design.basis });
  for (const family of FAMILIES) {
    const entities = Object.entries(design[family] ?? {});
    await writeEntities(tx, vesselId, family, 0, entities);
    await insertReferences(
      tx,
      vesselId,
      entities.flatMap(([id, entity]) => referenceRowsOf(family, id, entity)),
    );
  }
}
