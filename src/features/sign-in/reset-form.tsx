import { useState, type FormEvent } from 'react';
import { Link } from 'react-router';

import { resetPassword } from '#src/lib/session.ts';
import { Button, buttonClass } from '#src/ui/button.tsx';

import { PasswordField } from './password-field.tsx';
import { SaidWrong } from './said-wrong.tsx';

export function ResetForm({ token }: { readonly token: string | null }) {
  const [password, setPassword] = useState('');
  const [wrong, setWrong] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const [isDone, setIsDone] = useState(false);

  async function handleSubmit(event: FormEvent) {
    event.preventDefault();
    setBusy(true);
    const says = await resetPassword(token ?? '', password);
    setBusy(false);
    setWrong(says);
    setIsDone(says === null);
  }

  if (token === null || token === '') {
    return (
      <>
        <p className="gate-lead">This link is not whole, has been used or is too old.</p>
        <Link className={buttonClass('go', true)} to="/forgot">
          Ask for a new link
        </Link>
      </>
    );
  }
  if (isDone) {
    return (
      <div role="status">
        <p className="gate-lead">The new password is set. Every other session of yours has ended.</p>
        <Link className={buttonClass('go', true)} to="/sign-in">
          Sign in
        </Link>
      </div>
    );
  }
  return (
    <form onSubmit={(event) => void handleSubmit(event)}>
      <div className="cells">
        <PasswordField isNew value={password} onChange={setPassword} />
      </div>
      <SaidWrong says={wrong} />
      <Button type="submit" look="go" wide off={busy}>
        Set the password
      </Button>
      <p className="gate-foot">
        <Link to="/forgot">Ask for a new link</Link>
      </p>
    </form>
  );
}
