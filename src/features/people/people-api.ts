import { queryOptions, useMutation, useQueryClient } from '@tanstack/react-query';

import type { Role } from '#shared/access/matrix.ts';
import { changeRole, invitePerson, listPeople, removePerson, withdrawInvitation } from '#shared/api/people.ts';
import { call } from '#src/lib/call.ts';

export function peopleQuery(vesselId: string) {
  return queryOptions({
    queryKey: ['vessels', vesselId, 'people'],
    queryFn: ({ signal }) => call(listPeople, { params: { vesselId }, signal }),
  });
}

export function useInvitePerson(vesselId: string) {
  return usePeopleMutation(vesselId, (body: { email: string; role: Role }) =>
    call(invitePerson, { params: { vesselId }, body }),
  );
}

export function useWithdrawInvitation(vesselId: string) {
  return usePeopleMutation(vesselId, (invitationId: string) =>
    call(withdrawInvitation, { params: { vesselId, invitationId } }),
  );
}

export function useChangeRole(vesselId: string) {
  return usePeopleMutation(vesselId, ({ personId, role }: { personId: string; role: Role }) =>
    call(changeRole, { params: { vesselId, personId }, body: { role } }),
  );
}

export function useRemovePerson(vesselId: string) {
  return usePeopleMutation(vesselId, (personId: string) => call(removePerson, { params: { vesselId, personId } }));
}

function usePeopleMutation<Input, Reply>(vesselId: string, send: (input: Input) => Promise<Reply>) {
  const client = useQueryClient();
  return useMutation({
    mutationFn: send,
    onSettled: () => client.invalidateQueries({ queryKey: ['vessels', vesselId] }),
  });
}
