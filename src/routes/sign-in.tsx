import { useQuery, useQueryClient } from '@tanstack/react-query';
import { useState } from 'react';
import { Navigate, useNavigate, useSearchParams } from 'react-router';

import { SignInForm } from '#src/features/sign-in/sign-in-form.tsx';
import { SignInSheet } from '#src/features/sign-in/sign-in-sheet.tsx';
import { meQuery } from '#src/lib/session.ts';

import { usePageTitle } from './page-title.ts';

export function SignInRoute() {
  usePageTitle('Sign in');
  const client = useQueryClient();
  const navigate = useNavigate();
  const me = useQuery(meQuery);
  const [search] = useSearchParams();
  const [isLit, setIsLit] = useState(false);
  const next = safePath(search.get('next'));

  if (me.data !== null && me.data !== undefined && !isLit) return <Navigate replace to={next} />;
  return (
    <SignInSheet title="Sign in" lit={isLit}>
      <SignInForm
        onSignedIn={async () => {
          setIsLit(true);
          await client.invalidateQueries();
          await client.fetchQuery({ ...meQuery, staleTime: 0 });
          await navigate(next, { replace: true });
        }}
      />
    </SignInSheet>
  );
}

/** Only ways within this application: an address of another place in the link is not followed. */
function safePath(next: string | null): string {
  return next !== null && /^\/(?![/\\])/.test(next) ? next : '/';
}
