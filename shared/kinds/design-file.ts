import { z } from 'zod';

import {
  Accepted,
  Basis,
  Cable,
  deviceShape,
  EntityId,
  FORMAT,
  FORMAT_VERSION,
  Mode,
  Note,
  Run,
  Sheet,
  Vessel,
  Zone,
} from '#shared/model/design.ts';

import { KINDS } from './index.ts';

/**
 * The whole document: the model's schemas with each kind's ratings in its devices. References between entities
 * and keys that must equal ids are checked by `readDesign` (shared/files), which a schema can't say.
 */
const deviceSchemas = KINDS.map((kind) =>
  z.strictObject({
    ...deviceShape,
    kind: z.literal(kind.kind),
    ratings: kind.ratings,
    symbol: z.enum(kind.symbols as readonly [string, ...string[]]).optional(),
  }),
);

export const DeviceFile = z.discriminatedUnion('kind', deviceSchemas as unknown as [z.ZodObject, ...z.ZodObject[]]);

export const DesignFile = z.strictObject({
  format: z.literal(FORMAT),
  version: z.literal(FORMAT_VERSION),
  vessel: Vessel.optional(),
  basis: Basis,
  sheets: z.record(EntityId, Sheet),
  zones: z.record(EntityId, Zone),
  devices: z.record(EntityId, DeviceFile),
  runs: z.record(EntityId, Run),
  modes: z.record(EntityId, Mode),
  notes: z.record(EntityId, Note),
  cables: z.record(EntityId, Cable).optional(),
  accepted: z.record(z.string(), Accepted).optional(),
});
