import { useQuery } from '@tanstack/react-query';
import { useState } from 'react';

import { meQuery } from '#src/lib/session.ts';

import { Conflict } from './conflict.tsx';
import { SignedOut } from './signed-out.tsx';

/** What keeping a design may have to ask a person, on whichever of its screens they are. */
export function KeepingDialogs() {
  const me = useQuery(meQuery).data;
  /** The one who opened the page, also when the session has ended since. */
  const [person, setPerson] = useState(me ?? null);
  if (person === null && me !== undefined && me !== null) setPerson(me);
  return (
    <>
      <SignedOut email={person?.email ?? ''} personId={person?.personId ?? ''} />
      <Conflict />
    </>
  );
}
