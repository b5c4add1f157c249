import { useNavigate, useParams } from 'react-router';

import { InvitationForm } from '#src/features/sign-in/invitation-form.tsx';
import { SignInSheet } from '#src/features/sign-in/sign-in-sheet.tsx';

import { usePageTitle } from './page-title.ts';

export function InvitationRoute() {
  usePageTitle('An invitation');
  const { token = '' } = useParams();
  const navigate = useNavigate();
  return (
    <SignInSheet title="An invitation">
      <InvitationForm token={token} onJoined={(vesselId) => void navigate(`/vessels/${vesselId}`)} />
    </SignInSheet>
  );
}
