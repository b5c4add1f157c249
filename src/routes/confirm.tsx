import { useQuery, useQueryClient } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router';

import { SignInSheet } from '#src/features/sign-in/sign-in-sheet.tsx';
import { confirmEmail, meQuery } from '#src/lib/session.ts';
import { buttonClass } from '#src/ui/button.tsx';

import { usePageTitle } from './page-title.ts';

/** Where the link of the mail leads: with its token still to be used, or after the server has used it. */
export function ConfirmRoute() {
  usePageTitle('Confirm the address');
  const [search] = useSearchParams();
  const token = search.get('token');
  const failed = search.get('error');
  const client = useQueryClient();
  const confirmed = useQuery({
    queryKey: ['confirm', token],
    queryFn: async () => {
      const says = await confirmEmail(token ?? '');
      // The first use of the link has signed in: whoever reads the mail is the one who signed up.
      await client.fetchQuery({ ...meQuery, staleTime: 0 });
      return says;
    },
    enabled: token !== null,
    retry: false,
    staleTime: Number.POSITIVE_INFINITY,
  });
  const wrong =
    failed !== null ? 'This link has been used or is too old. Sign in to get a new one.' : (confirmed.data ?? null);
  const isWaiting = token !== null && confirmed.isPending;
  const isSignedIn = useQuery({ ...meQuery, enabled: !isWaiting }).data != null;

  return (
    <SignInSheet title="Confirm the address">
      <div role="status">
        <p className="gate-lead">
          {isWaiting
            ? 'Confirming'
            : isSignedIn && wrong !== null
              ? 'This link has been used, and you are signed in.'
              : (wrong ?? confirmed.error?.message ?? 'Your address is confirmed and your shop is made.')}
        </p>
      </div>
      {!isWaiting && (
        <Link className={buttonClass('go', true)} to={isSignedIn ? '/' : '/sign-in'}>
          {isSignedIn ? 'Open your shop' : 'Sign in'}
        </Link>
      )}
    </SignInSheet>
  );
}
