import { z } from 'zod';

/** RFC 9457, with our code. The client switches on `code`, never on the text. */
export const PROBLEM_CODES = [
  'invalid',
  'not-signed-in',
  'forbidden',
  'not-found',
  'conflict',
  'too-many-requests',
  'unavailable',
  'internal',
] as const;

export const Problem = z.object({
  type: z.string(),
  title: z.string(),
  status: z.int(),
  code: z.enum(PROBLEM_CODES),
  detail: z.string(),
  /** The field of the body that is wrong: `conductor.size`. */
  field: z.string().optional(),
  /** Of sign-in and its kin, why: `EMAIL_NOT_VERIFIED`, `INVALID_EMAIL_OR_PASSWORD`, `INVALID_TOKEN`, `TOO_MANY_TRIES` … */
  reason: z.string().optional(),
  /** With `conflict` on a change: what stands there now. */
  conflicts: z
    .array(z.object({ path: z.array(z.string()), theirs: z.unknown(), by: z.string(), at: z.string() }))
    .optional(),
  /** With `conflict` on a change: the design's sequence number now. */
  seq: z.int().optional(),
});
export type Problem = z.infer<typeof Problem>;
