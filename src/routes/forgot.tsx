import { ForgotForm } from '#src/features/sign-in/forgot-form.tsx';
import { SignInSheet } from '#src/features/sign-in/sign-in-sheet.tsx';

import { usePageTitle } from './page-title.ts';

export function ForgotRoute() {
  usePageTitle('Forgotten the password');
  return (
    <SignInSheet title="Forgotten the password">
      <ForgotForm />
    </SignInSheet>
  );
}
