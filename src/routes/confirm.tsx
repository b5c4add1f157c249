import { useQuery } from '@tanstack/react-query';
import { Link, useSearchParams } from 'react-router';

import { SignInSheet } from '#src/features/sign-in/sign-in-sheet.tsx';
import { confirmEmail } from '#src/lib/session.ts';
import { buttonClass } from '#src/ui/button.tsx';

import { usePageTitle } from './page-title.ts';

/** Where the link of the mail leads: with its token still to be used, or after the server has used it. */
export function ConfirmRoute() {
  usePageTitle('Confirm the address');
  const [search] = useSearchParams();
  const token = search.get('token');
  const failed = search.get('error');
  const confirmed = useQuery({
    queryKey: ['confirm', token],
    queryFn: () => confirmEmail(token ?? ''),
    enabled: token !== null,
    retry: false,
    staleTime: Number.POSITIVE_INFINITY,
  });
  const wrong =
    failed !== null ? 'This link has been used or is too old. Sign in to get a new one.' : (confirmed.data ?? null);
  const isWaiting = token !== null && confirmed.isPending;

  return (
    <SignInSheet title="Confirm the address">
      <div role="status">
        <p className="gate-lead">
          {isWaiting
            ? 'Confirming'
            : (wrong ?? confirmed.error?.message ?? 'Your address is confirmed and your shop is made.')}
        </p>
      </div>
      {!isWaiting && (
        <Link className={buttonClass('go', true)} to="/sign-in">
          Sign in
        </Link>
      )}
    </SignInSheet>
  );
}
