import type { z } from 'zod';

import type { Invitation } from '#shared/api/people.ts';
import type { InvitationRow } from '#server/db/people-queries.ts';

export function presentInvitation(row: InvitationRow): z.output<typeof Invitation> {
  return {
    invitationId: row.invitationId,
    email: row.email,
    role: row.role,
    invitedBy: row.invitedBy,
    invitedAt: row.invitedAt.toISOString(),
    expiresAt: row.expiresAt.toISOString(),
  };
}
