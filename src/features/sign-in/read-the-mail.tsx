import { useQuery } from '@tanstack/react-query';
import type { ReactNode } from 'react';
import { Link } from 'react-router';

import { serverFactsQuery } from '#src/lib/session.ts';
import { buttonClass } from '#src/ui/button.tsx';

/** What to do next is in the mail. A local instance sends none: its mails lie in a mailbox page of its own. */
export function ReadTheMail({ to, children }: { readonly to: string; readonly children: ReactNode }) {
  const facts = useQuery(serverFactsQuery);
  return (
    <div role="status">
      <p className="gate-lead">{children}</p>
      <div className="cells">
        <div className="cell big">
          <small>Sent to</small>
          <b>{to}</b>
        </div>
      </div>
      {facts.data?.mailbox === true && (
        <>
          <p className="gate-lead">
            This server runs on your own machine and sends nothing out. Its mails lie in its mailbox.
          </p>
          <Link className={buttonClass('go', true)} to="/mailbox">
            Open the mailbox
          </Link>
        </>
      )}
      <p className="gate-foot">
        <Link to="/sign-in">To sign in</Link>
      </p>
    </div>
  );
}
