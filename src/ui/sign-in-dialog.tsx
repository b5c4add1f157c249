import { useState, type FormEvent } from 'react';

import { Button } from './button.tsx';
import { Dialog } from './dialog.tsx';
import { TextField } from './text-field.tsx';

/**
 * An ended session asks for the password in place, so that nothing on the screen is lost. `onSignIn` answers null
 * when it worked, else the sentence that says why not.
 */
export function SignInDialog({
  open,
  email,
  waiting,
  onSignIn,
  onLater,
}: {
  readonly open: boolean;
  readonly email: string;
  /** How many changes wait on this device. */
  readonly waiting: number;
  readonly onSignIn: (email: string, password: string) => Promise<string | null>;
  readonly onLater: () => void;
}) {
  const [address, setAddress] = useState(email);
  const [password, setPassword] = useState('');
  const [wrong, setWrong] = useState<string>();
  const [busy, setBusy] = useState(false);

  async function handleSubmit(event: FormEvent) {
    event.preventDefault();
    setBusy(true);
    const says = await onSignIn(address || email, password);
    setBusy(false);
    setWrong(says ?? undefined);
    if (says === null) setPassword('');
  }

  return (
    <Dialog
      open={open}
      onClose={onLater}
      insist
      title="Sign in again"
      lead={
        waiting === 0
          ? 'Your sign-in has ended. What is on the screen stays.'
          : `Your sign-in has ended. ${waiting === 1 ? 'One change is' : `${waiting} changes are`} kept on this device and sent when you are back.`
      }
    >
      <form onSubmit={(event) => void handleSubmit(event)}>
        <div className="cells">
          <TextField
            caption="E-mail"
            type="email"
            autoComplete="username"
            required
            value={address || email}
            onChange={(event) => setAddress(event.currentTarget.value)}
          />
          <TextField
            caption="Password"
            type="password"
            autoComplete="current-password"
            required
            value={password}
            wrong={wrong}
            onChange={(event) => setPassword(event.currentTarget.value)}
          />
        </div>
        <div className="does">
          <Button onClick={onLater}>Later</Button>
          <Button type="submit" look="go" off={busy}>
            Sign in
          </Button>
        </div>
      </form>
    </Dialog>
  );
}
