import { z } from 'zod';

import { ROLES } from '#shared/access/matrix.ts';
import { PROFILES } from '#shared/model/design.ts';

import { endpoint, Instant, PageQuery, pageOf, VesselParams } from './endpoint.ts';

export const VesselState = z.enum(['active', 'archived', 'deleted']);

/** A line of the list of vessels. What its reader may not see is null. */
export const VesselSummary = z.object({
  vesselId: z.uuid(),
  shopId: z.uuid(),
  shopName: z.string(),
  name: z.string(),
  type: z.string().nullable(),
  lengthM: z.number().nullable(),
  owner: z.string().nullable(),
  nominalV: z.array(z.number()),
  shore: z.object({ acV: z.number(), hz: z.number(), amps: z.number() }).nullable(),
  profile: z.enum(PROFILES),
  units: z.enum(['us', 'metric']),
  state: VesselState,
  role: z.enum(ROLES),
  /** Counts of the drawing as it stands; null for an owner. */
  drawn: z.object({ sheets: z.int(), devices: z.int(), runs: z.int() }).nullable(),
  /** The latest issued revision. */
  revision: z.object({ letter: z.string(), issuedAt: Instant }).nullable(),
  lastChange: z.object({ at: Instant, by: z.string(), label: z.string() }).nullable(),
  people: z.array(z.object({ name: z.string(), role: z.enum(ROLES) })),
  deletedAt: Instant.nullable(),
});
export type VesselSummary = z.infer<typeof VesselSummary>;

export const listVessels = endpoint({
  method: 'GET',
  path: '/api/vessels',
  query: PageQuery.extend({ state: VesselState.optional() }),
  reply: pageOf(VesselSummary),
});

export const getVessel = endpoint({
  method: 'GET',
  path: '/api/vessels/:vesselId',
  params: VesselParams,
  reply: VesselSummary,
});

const Name = z.string().trim().min(1, 'a vessel needs a name').max(100);

export const NewVessel = z.strictObject({
  shopId: z.uuid(),
  name: Name,
  type: z.string().trim().max(100).optional(),
  lengthM: z.number().gt(0).max(500).optional(),
  nominalV: z.array(z.number().gt(0).max(1000)).max(8).optional(),
  shore: z.strictObject({ acV: z.number().gt(0).max(250), hz: z.number().gt(0), amps: z.number().gt(0) }).optional(),
  profile: z.enum(PROFILES).optional(),
  units: z.enum(['us', 'metric']).optional(),
  zones: z
    .array(
      z.strictObject({
        name: z.string().trim().min(1).max(100),
        engineSpace: z.boolean().optional(),
        wet: z.boolean().optional(),
      }),
    )
    .max(50)
    .optional(),
});
export const createVessel = endpoint({ method: 'POST', path: '/api/vessels', body: NewVessel, reply: VesselSummary });

/** A file of a design opened as a new vessel: refused whole with path and reason, or there. */
export const importVessel = endpoint({
  method: 'POST',
  path: '/api/vessels/import',
  body: z.strictObject({ shopId: z.uuid(), file: z.string().max(20_000_000) }),
  reply: VesselSummary,
});

export const renameVessel = endpoint({
  method: 'PATCH',
  path: '/api/vessels/:vesselId',
  params: VesselParams,
  body: z.strictObject({ name: Name }),
  reply: VesselSummary,
});
export const duplicateVessel = endpoint({
  method: 'POST',
  path: '/api/vessels/:vesselId/duplicate',
  params: VesselParams,
  reply: VesselSummary,
});
export const archiveVessel = endpoint({
  method: 'POST',
  path: '/api/vessels/:vesselId/archive',
  params: VesselParams,
  reply: VesselSummary,
});
export const unarchiveVessel = endpoint({
  method: 'POST',
  path: '/api/vessels/:vesselId/unarchive',
  params: VesselParams,
  reply: VesselSummary,
});
/** Soft: 30 days to bring it back. */
export const deleteVessel = endpoint({
  method: 'DELETE',
  path: '/api/vessels/:vesselId',
  params: VesselParams,
  reply: VesselSummary,
});
export const restoreVessel = endpoint({
  method: 'POST',
  path: '/api/vessels/:vesselId/restore',
  params: VesselParams,
  reply: VesselSummary,
});
