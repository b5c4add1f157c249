import { useQuery } from '@tanstack/react-query';

import { may, ROLES, type Role } from '#shared/access/matrix.ts';
import { Button } from '#src/ui/button.tsx';
import { PickCell } from '#src/ui/cell.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { Initials } from '#src/ui/initials.tsx';
import { When } from '#src/ui/when.tsx';

import { InviteForm } from './invite-form.tsx';
import { peopleQuery, useChangeRole, useRemovePerson, useWithdrawInvitation } from './people-api.ts';
import { ROLE_WORDS } from './role-words.ts';

/** Who is on this vessel and as what, who is invited, and the way to invite. */
export function PeoplePage({
  vesselId,
  vesselName,
  role,
  myId,
  shopAdmin,
}: {
  readonly vesselId: string;
  readonly vesselName: string;
  readonly role: Role;
  readonly myId: string;
  readonly shopAdmin: boolean;
}) {
  const people = useQuery(peopleQuery(vesselId));
  const change = useChangeRole(vesselId);
  const remove = useRemovePerson(vesselId);
  const withdraw = useWithdrawInvitation(vesselId);
  const mayManage = shopAdmin || may(role, 'manage-vessel');
  const wrong = change.error ?? remove.error ?? withdraw.error;

  return (
    <div className="people">
      <h1 className="page-title">People on {vesselName}</h1>
      {people.error !== null && people.data === undefined && (
        <EmptyState title="The people could not be read">{people.error.message}</EmptyState>
      )}
      {wrong !== null && (
        <p className="said-wrong px-4" role="alert">
          {wrong.message}
        </p>
      )}
      <ul className="people-list">
        {people.data?.people.map((person) => (
          <li key={person.personId}>
            <Initials people={[{ name: person.name, here: person.personId === myId }]} />
            <div className="people-name">
              <b>{person.name}</b>
              <span className="quiet">
                {person.email}
                {person.personId === myId && ', you'}
              </span>
            </div>
            {mayManage && !person.admin && person.personId !== myId ? (
              <>
                <PickCell
                  alone
                  caption="Role"
                  label={`Role of ${person.name}`}
                  value={person.role}
                  choices={ROLES.map((one) => ({ value: one, title: one }))}
                  onPick={(next) => change.mutate({ personId: person.personId, role: next as Role })}
                />
                <Button
                  onClick={() => remove.mutate(person.personId)}
                  aria-label={`Take ${person.name} off this vessel`}
                >
                  Take off
                </Button>
              </>
            ) : (
              <span className="people-role">{person.admin ? 'shop admin, designer on every vessel' : person.role}</span>
            )}
          </li>
        ))}
      </ul>
      {(people.data?.invitations.length ?? 0) > 0 && (
        <>
          <h2 className="group-head">Invited, not here yet</h2>
          <ul className="people-list">
            {people.data?.invitations.map((invitation) => (
              <li key={invitation.invitationId}>
                <Initials people={[{ name: invitation.email }]} />
                <div className="people-name">
                  <b>{invitation.email}</b>
                  <span className="quiet">
                    as {invitation.role}, by {invitation.invitedBy} <When at={invitation.invitedAt} />
                  </span>
                </div>
                {mayManage && (
                  <Button
                    onClick={() => withdraw.mutate(invitation.invitationId)}
                    aria-label={`Withdraw the invitation of ${invitation.email}`}
                  >
                    Withdraw
                  </Button>
                )}
              </li>
            ))}
          </ul>
        </>
      )}
      {mayManage && <InviteForm vesselId={vesselId} />}
      <h2 className="group-head">What each may do</h2>
      <dl className="role-words">
        {ROLES.map((one) => (
          <div key={one}>
            <dt>{one}</dt>
            <dd>{ROLE_WORDS[one]}</dd>
          </div>
        ))}
      </dl>
    </div>
  );
}
