import { useSearchParams } from 'react-router';

import { ResetForm } from '#src/features/sign-in/reset-form.tsx';
import { SignInSheet } from '#src/features/sign-in/sign-in-sheet.tsx';

import { usePageTitle } from './page-title.ts';

export function ResetRoute() {
  usePageTitle('A new password');
  const [search] = useSearchParams();
  return (
    <SignInSheet title="A new password">
      <ResetForm token={search.get('token')} />
    </SignInSheet>
  );
}
