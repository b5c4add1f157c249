import { Link } from 'react-router';

import { Mailbox } from '#src/features/mailbox/mailbox.tsx';
import { Mark } from '#src/ui/wordmark.tsx';

import { usePageTitle } from './page-title.ts';

export function MailboxRoute() {
  usePageTitle('Mailbox');
  return (
    <div className="frame">
      <header className="head shop">
        <Link className="home" to="/">
          <Mark />
          <div>
            <b>Mailbox</b>
            <span>of this local server</span>
          </div>
        </Link>
        <div className="end">
          <span className="quiet">Nothing here has left this machine.</span>
        </div>
      </header>
      <main id="page" className="home-page">
        <h1 className="page-title">Mails</h1>
        <Mailbox />
      </main>
    </div>
  );
}
