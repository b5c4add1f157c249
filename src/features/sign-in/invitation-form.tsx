import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { Link } from 'react-router';

import { meQuery, signIn, signOut } from '#src/lib/session.ts';
import { Button, buttonClass } from '#src/ui/button.tsx';
import { TextField } from '#src/ui/text-field.tsx';

import { invitationQuery, useAcceptInvitation, useJoinByInvitation } from './invitation-api.ts';
import { PasswordField } from './password-field.tsx';
import { SaidWrong } from './said-wrong.tsx';
import { SignInForm } from './sign-in-form.tsx';

/** Joining a vessel from the mail: at once when signed in with that address, else by signing in or with a new account. */
export function InvitationForm({
  token,
  onJoined,
}: {
  readonly token: string;
  readonly onJoined: (vesselId: string) => void;
}) {
  const client = useQueryClient();
  const invitation = useQuery(invitationQuery(token));
  const me = useQuery(meQuery);
  const accept = useAcceptInvitation(token);

  if (invitation.error !== null) {
    return (
      <>
        <p className="gate-lead">
          This invitation has been used, was withdrawn or is too old. Ask whoever sent it for a new one.
        </p>
        <Link className={buttonClass('go', true)} to="/sign-in">
          To sign in
        </Link>
      </>
    );
  }
  if (invitation.data === undefined || me.data === undefined)
    return <p className="gate-lead">Opening the invitation</p>;

  const { email, role, vesselName, shopName, invitedBy, hasAccount } = invitation.data;
  async function handleAccept() {
    const { vesselId } = await accept.mutateAsync();
    await client.invalidateQueries();
    onJoined(vesselId);
  }

  return (
    <>
      <p className="gate-lead">
        {invitedBy} of {shopName} invites you to work on <b>{vesselName}</b> as {role}.
      </p>
      {me.data === null ? (
        hasAccount ? (
          <SignInForm email={email} onSignedIn={handleAccept} />
        ) : (
          <JoinForm token={token} email={email} onJoined={onJoined} />
        )
      ) : me.data.email.toLowerCase() === email.toLowerCase() ? (
        <>
          <SaidWrong says={accept.error?.message ?? null} />
          <Button look="go" wide off={accept.isPending} onClick={() => void handleAccept().catch(() => undefined)}>
            Join {vesselName}
          </Button>
        </>
      ) : (
        <>
          <p className="gate-lead">
            It was sent to {email}; you are signed in as {me.data.email}.
          </p>
          <Button look="go" wide onClick={() => void signOut(client).then(() => me.refetch())}>
            Sign out and go on
          </Button>
        </>
      )}
    </>
  );
}

function JoinForm({
  token,
  email,
  onJoined,
}: {
  readonly token: string;
  readonly email: string;
  readonly onJoined: (vesselId: string) => void;
}) {
  const client = useQueryClient();
  const join = useJoinByInvitation(token);
  const [name, setName] = useState('');
  const [password, setPassword] = useState('');

  async function handleSubmit(event: FormEvent) {
    event.preventDefault();
    const { vesselId } = await join.mutateAsync({ name: name.trim(), password });
    // Joining may or may not have signed in; signing in again is harmless.
    await signIn(email, password);
    await client.invalidateQueries();
    onJoined(vesselId);
  }

  return (
    <form onSubmit={(event) => void handleSubmit(event).catch(() => undefined)}>
      <div className="cells">
        <TextField caption="E-mail" type="email" autoComplete="username" readOnly value={email} />
        <TextField
          caption="Your name"
          autoComplete="name"
          required
          maxLength={100}
          autoFocus
          value={name}
          onChange={(event) => setName(event.currentTarget.value)}
        />
        <PasswordField isNew value={password} onChange={setPassword} />
      </div>
      <SaidWrong says={join.error?.message ?? null} />
      <Button type="submit" look="go" wide off={join.isPending}>
        Join
      </Button>
    </form>
  );
}
