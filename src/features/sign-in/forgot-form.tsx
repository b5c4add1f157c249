import { useState, type FormEvent } from 'react';
import { Link } from 'react-router';

import { askForReset } from '#src/lib/session.ts';
import { Button } from '#src/ui/button.tsx';
import { TextField } from '#src/ui/text-field.tsx';

import { ReadTheMail } from './read-the-mail.tsx';
import { SaidWrong } from './said-wrong.tsx';

export function ForgotForm() {
  const [email, setEmail] = useState('');
  const [wrong, setWrong] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const [isSent, setIsSent] = useState(false);

  async function handleSubmit(event: FormEvent) {
    event.preventDefault();
    setBusy(true);
    const says = await askForReset(email.trim());
    setBusy(false);
    setWrong(says);
    setIsSent(says === null);
  }

  if (isSent) {
    return (
      <ReadTheMail to={email}>If there is an account with this address, a mail with a link is on its way.</ReadTheMail>
    );
  }
  return (
    <form onSubmit={(event) => void handleSubmit(event)}>
      <p className="gate-lead">We send a link with which you set a new one.</p>
      <div className="cells">
        <TextField
          caption="E-mail"
          type="email"
          autoComplete="username"
          required
          autoFocus
          value={email}
          onChange={(event) => setEmail(event.currentTarget.value)}
        />
      </div>
      <SaidWrong says={wrong} />
      <Button type="submit" look="go" wide off={busy}>
        Send the link
      </Button>
      <p className="gate-foot">
        <Link to="/sign-in">To sign in</Link>
      </p>
    </form>
  );
}
