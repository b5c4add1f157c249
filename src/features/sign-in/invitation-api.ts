import { queryOptions, useMutation } from '@tanstack/react-query';

import { acceptInvitation, getInvitation, joinByInvitation } from '#shared/api/people.ts';
import { call } from '#src/lib/call.ts';

export function invitationQuery(token: string) {
  return queryOptions({
    queryKey: ['invitations', token],
    queryFn: ({ signal }) => call(getInvitation, { params: { token }, signal }),
    staleTime: Number.POSITIVE_INFINITY,
    retry: false,
  });
}

export function useAcceptInvitation(token: string) {
  return useMutation({ mutationFn: () => call(acceptInvitation, { params: { token } }) });
}

export function useJoinByInvitation(token: string) {
  return useMutation({
    mutationFn: (body: { name: string; password: string }) => call(joinByInvitation, { params: { token }, body }),
  });
}
