import { useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';

import { getMe } from '#shared/api/me.ts';
import { call } from '#src/lib/call.ts';
import { signIn } from '#src/lib/session.ts';

import { useOpenDesign } from '#src/design/open-design.ts';
import { SignInDialog } from '#src/ui/sign-in-dialog.tsx';

/** Asks for the password in place when the session has ended; what waits is sent afterwards. */
export function SignedOut({ email, personId }: { readonly email: string; readonly personId: string }) {
  const keeping = useOpenDesign((state) => state.keeping);
  const retry = useOpenDesign((state) => state.retry);
  const client = useQueryClient();
  const waiting = keeping.state === 'saved' ? 0 : keeping.waiting;
  /** Put off until the next change: then it is asked again. */
  const [putOffAt, setPutOffAt] = useState<number | null>(null);

  async function handleSignIn(address: string, password: string): Promise<string | null> {
    const wrong = await signIn(address, password);
    if (wrong !== null) return wrong;
    const me = await call(getMe, {});
    if (me.personId !== personId) {
      // What waits stays on this device for the person who drew it.
      location.reload();
      return null;
    }
    await client.invalidateQueries();
    setPutOffAt(null);
    retry();
    return null;
  }

  return (
    <SignInDialog
      open={keeping.state === 'signed-out' && putOffAt !== waiting}
      email={email}
      waiting={waiting}
      onSignIn={handleSignIn}
      onLater={() => setPutOffAt(waiting)}
    />
  );
}
