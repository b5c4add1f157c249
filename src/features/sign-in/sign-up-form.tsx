import { useState, type FormEvent } from 'react';
import { Link } from 'react-router';

import { signUp } from '#src/lib/session.ts';
import { Button } from '#src/ui/button.tsx';
import { TextField } from '#src/ui/text-field.tsx';

import { PasswordField } from './password-field.tsx';
import { ReadTheMail } from './read-the-mail.tsx';
import { SaidWrong } from './said-wrong.tsx';

/** An account and, once its address is confirmed, a shop of one's own. */
export function SignUpForm() {
  const [name, setName] = useState('');
  const [email, setEmail] = useState('');
  const [password, setPassword] = useState('');
  const [wrong, setWrong] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const [isSent, setIsSent] = useState(false);

  async function handleSubmit(event: FormEvent) {
    event.preventDefault();
    setBusy(true);
    const says = await signUp(name.trim(), email.trim(), password);
    setBusy(false);
    setWrong(says);
    setIsSent(says === null);
  }

  if (isSent) {
    return (
      <ReadTheMail to={email}>
        A mail is on its way. Open its link to confirm the address; your shop is made then, and you can sign in.
      </ReadTheMail>
    );
  }
  return (
    <form onSubmit={(event) => void handleSubmit(event)}>
      <div className="cells">
        <TextField
          caption="Your name"
          autoComplete="name"
          required
          maxLength={100}
          autoFocus
          value={name}
          hint="It stands in the title block as who drew it."
          onChange={(event) => setName(event.currentTarget.value)}
        />
        <TextField
          caption="E-mail"
          type="email"
          autoComplete="username"
          required
          maxLength={254}
          value={email}
          onChange={(event) => setEmail(event.currentTarget.value)}
        />
        <PasswordField isNew value={password} onChange={setPassword} />
      </div>
      <SaidWrong says={wrong} />
      <Button type="submit" look="go" wide off={busy}>
        Make the account
      </Button>
      <p className="gate-foot">
        <Link to="/sign-in">I have one: sign in</Link>
      </p>
    </form>
  );
}
