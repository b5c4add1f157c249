import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';

import { getRevision, issueRevision, listRevisions } from '#shared/api/design.ts';
import { call } from '#src/lib/call.ts';

export function revisionsQuery(vesselId: string) {
  return queryOptions({
    queryKey: ['vessels', vesselId, 'revisions'],
    queryFn: async ({ signal }) => (await call(listRevisions, { params: { vesselId }, signal })).rows,
  });
}

/** A revision never changes once it is issued. */
export function revisionQuery(vesselId: string, letter: string) {
  return queryOptions({
    queryKey: ['vessels', vesselId, 'revisions', letter],
    queryFn: ({ signal }) => call(getRevision, { params: { vesselId, letter }, signal }),
    staleTime: Number.POSITIVE_INFINITY,
  });
}

export function useIssueRevision(vesselId: string) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: ({ id, seq, note }: { id: string; seq: number; note?: string }) =>
      call(issueRevision, { params: { vesselId }, body: { id, seq, note }, idempotencyKey: id }),
    onSuccess: () => client.invalidateQueries({ queryKey: ['vessels'] }),
  });
}
