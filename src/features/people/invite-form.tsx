import { useState, type FormEvent } from 'react';

import { ROLES, type Role } from '#shared/access/matrix.ts';
import { Button } from '#src/ui/button.tsx';
import { PickCell } from '#src/ui/cell.tsx';
import { TextField } from '#src/ui/text-field.tsx';

import { useInvitePerson } from './people-api.ts';

export function InviteForm({ vesselId }: { readonly vesselId: string }) {
  const invite = useInvitePerson(vesselId);
  const [email, setEmail] = useState('');
  const [role, setRole] = useState<Role>('installer');

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    invite.mutate({ email: email.trim(), role }, { onSuccess: () => setEmail('') });
  }

  return (
    <form className="invite" onSubmit={handleSubmit}>
      <h2 className="group-head">Invite someone</h2>
      <div className="invite-row">
        <div className="cells">
          <TextField
            caption="E-mail"
            type="email"
            required
            maxLength={254}
            value={email}
            wrong={invite.error?.message}
            onChange={(event) => setEmail(event.currentTarget.value)}
          />
          <PickCell
            big
            caption="Role on this vessel"
            value={role}
            choices={ROLES.map((one) => ({ value: one, title: one }))}
            onPick={(next) => setRole(next as Role)}
          />
        </div>
        <Button type="submit" look="go" off={invite.isPending}>
          Send the invitation
        </Button>
      </div>
      <p className="quiet" role="status">
        {invite.data === undefined
          ? 'They join from the mail, with or without an account.'
          : `An invitation is on its way to ${invite.data.email}.`}
      </p>
    </form>
  );
}
