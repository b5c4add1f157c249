import { SignInSheet } from '#src/features/sign-in/sign-in-sheet.tsx';
import { SignUpForm } from '#src/features/sign-in/sign-up-form.tsx';

import { usePageTitle } from './page-title.ts';

export function SignUpRoute() {
  usePageTitle('Make an account');
  return (
    <SignInSheet title="Make an account">
      <SignUpForm />
    </SignInSheet>
  );
}
