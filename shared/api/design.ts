import { z } from 'zod';

import type { Design } from '#shared/model/design.ts';
import { MOST_PATCHES, Patch } from '#shared/model/patch.ts';

import { endpoint, Instant, VesselParams } from './endpoint.ts';

const DesignReply = z.custom<Design>((value) => typeof value === 'object' && value !== null);

/** The design as it stands and the sequence number of its last change. */
export const getDesign = endpoint({
  method: 'GET',
  path: '/api/vessels/:vesselId/design',
  params: VesselParams,
  reply: z.object({ seq: z.int(), design: DesignReply }),
});

/** The design as a file, `*.ampwright.json`. Answers the file itself, not wrapped. */
export const exportDesign = endpoint({
  method: 'GET',
  path: '/api/vessels/:vesselId/design/file',
  params: VesselParams,
  reply: DesignReply,
});

/**
 * One change, applied whole or not at all. Its id is the idempotency key: sent again it answers the number it got
 * the first time. `base` is the number it was made on; where the log since then holds an overlapping path by
 * someone else, or where it would leave a run without its device, the answer is a `conflict`.
 */
export const Change = z.strictObject({
  id: z.uuid(),
  base: z.int().min(0),
  label: z.string().trim().min(1).max(200),
  patches: z.array(Patch).min(1).max(MOST_PATCHES),
});
export type Change = z.infer<typeof Change>;

export const makeChange = endpoint({
  method: 'POST',
  path: '/api/vessels/:vesselId/changes',
  params: VesselParams,
  body: Change,
  reply: z.object({ seq: z.int() }),
});

export const LoggedChange = z.object({
  id: z.uuid(),
  seq: z.int(),
  label: z.string(),
  patches: z.array(Patch),
  by: z.object({ personId: z.uuid(), name: z.string() }),
  at: Instant,
});
export type LoggedChange = z.infer<typeof LoggedChange>;

/** The log after a sequence number, oldest first; at most 500 a call, `more` tells of others. */
export const listChanges = endpoint({
  method: 'GET',
  path: '/api/vessels/:vesselId/changes',
  params: VesselParams,
  query: z.strictObject({ since: z.coerce.number().int().min(0) }),
  reply: z.object({ changes: z.array(LoggedChange), more: z.boolean() }),
});

/**
 * Server-sent events: each `change` event's data is a LoggedChange with its vesselId, its id the design's sequence
 * number as `vesselId:seq`. Resumes from `Last-Event-ID` or `since`. Rights are asked again at each message.
 */
export const streamNews = endpoint({
  method: 'GET',
  path: '/api/vessels/:vesselId/news',
  params: VesselParams,
  query: z.strictObject({ since: z.coerce.number().int().min(0).optional() }),
});

export const Revision = z.object({
  revisionId: z.uuid(),
  letter: z.string(),
  note: z.string().nullable(),
  issuedBy: z.string(),
  issuedAt: Instant,
  seq: z.int(),
});
export type Revision = z.infer<typeof Revision>;

export const listRevisions = endpoint({
  method: 'GET',
  path: '/api/vessels/:vesselId/revisions',
  params: VesselParams,
  reply: z.object({ rows: z.array(Revision) }),
});

/** Freezes the design at `seq` as the next letter. */
export const issueRevision = endpoint({
  method: 'POST',
  path: '/api/vessels/:vesselId/revisions',
  params: VesselParams,
  body: z.strictObject({ id: z.uuid(), seq: z.int().min(0), note: z.string().trim().max(500).optional() }),
  reply: Revision,
});

export const getRevision = endpoint({
  method: 'GET',
  path: '/api/vessels/:vesselId/revisions/:letter',
  params: VesselParams.extend({ letter: z.string().regex(/^[A-Z]{1,2}$/) }),
  reply: Revision.extend({ design: DesignReply }),
});

/** The JSON Schema of the file format; no sign-in asked. */
export const getDesignSchema = endpoint({
  method: 'GET',
  path: '/api/schemas/ampwright-design.json',
  reply: z.record(z.string(), z.unknown()),
});

/** Parts as CSV, from the design as it stands. */
export const exportParts = endpoint({
  method: 'GET',
  path: '/api/vessels/:vesselId/parts.csv',
  params: VesselParams,
  reply: z.string(),
});
