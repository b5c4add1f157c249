import { useQuery } from '@tanstack/react-query';
import { Navigate, Outlet, useLocation, useOutletContext } from 'react-router';

import type { Me } from '#shared/api/me.ts';
import { meQuery } from '#src/lib/session.ts';

import { Loading } from './loading.tsx';
import { SayError } from './page-error.tsx';

/** The gate: before sign-in nothing of a shop is shown. */
export function SignedInRoute() {
  const me = useQuery(meQuery);
  const location = useLocation();
  if (me.data === undefined) {
    return me.error === null ? (
      <Loading what="Opening" />
    ) : (
      <SayError error={me.error} onRetry={() => void me.refetch()} />
    );
  }
  if (me.data === null) {
    const next = location.pathname + location.search;
    return <Navigate replace to={next === '/' ? '/sign-in' : `/sign-in?next=${encodeURIComponent(next)}`} />;
  }
  return <Outlet context={me.data satisfies Me} />;
}

/** Who is signed in, on any page behind the gate. */
export function useMe(): Me {
  return useOutletContext<Me>();
}
