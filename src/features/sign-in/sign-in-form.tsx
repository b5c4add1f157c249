import { useState, type FormEvent } from 'react';
import { Link } from 'react-router';

import { signIn } from '#src/lib/session.ts';
import { Button } from '#src/ui/button.tsx';
import { TextField } from '#src/ui/text-field.tsx';

import { PasswordField } from './password-field.tsx';
import { SaidWrong } from './said-wrong.tsx';

export function SignInForm({
  onSignedIn,
  email: fixedEmail,
}: {
  readonly onSignedIn: () => Promise<unknown> | void;
  /** The address of an invitation: shown, not typed. */
  readonly email?: string;
}) {
  const [email, setEmail] = useState(fixedEmail ?? '');
  const [password, setPassword] = useState('');
  const [wrong, setWrong] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);

  async function handleSubmit(event: FormEvent) {
    event.preventDefault();
    setBusy(true);
    const says = await signIn(email.trim(), password);
    setWrong(says);
    if (says === null) await onSignedIn();
    setBusy(false);
  }

  return (
    <form onSubmit={(event) => void handleSubmit(event)}>
      <div className="cells">
        <TextField
          caption="E-mail"
          type="email"
          autoComplete="username"
          required
          readOnly={fixedEmail !== undefined}
          autoFocus={fixedEmail === undefined}
          value={email}
          onChange={(event) => setEmail(event.currentTarget.value)}
        />
        <PasswordField value={password} onChange={setPassword} />
      </div>
      <SaidWrong says={wrong} />
      <Button type="submit" look="go" wide off={busy}>
        Sign in
      </Button>
      {fixedEmail === undefined && (
        <Link className="btn wide" to="/sign-up">
          Make an account
        </Link>
      )}
      <p className="gate-foot">
        <Link to="/forgot">Forgotten the password</Link>
        {fixedEmail === undefined && <span>Invited? Open the e-mail.</span>}
      </p>
    </form>
  );
}
