import { isRouteErrorResponse, Link, useNavigate, useRouteError } from 'react-router';

import { ProblemError, Unreachable } from '#src/lib/problem-error.ts';
import { Button, buttonClass } from '#src/ui/button.tsx';

/** What failed, what is safe, one way on. Stands where the page would have stood. */
export function PageError() {
  return <SayError error={useRouteError()} />;
}

export function SayError({ error, onRetry }: { readonly error: unknown; readonly onRetry?: () => void }) {
  const navigate = useNavigate();
  const { title, says } = sayError(error);
  return (
    <main className="page-plain">
      <section className="empty" role="alert">
        <h1 className="text-20 font-head">{title}</h1>
        <p>{says}</p>
        <div className="does">
          <Button look="go" onClick={onRetry ?? (() => void navigate(0))}>
            Try again
          </Button>
          <Link className={buttonClass()} to="/">
            All vessels
          </Link>
        </div>
      </section>
    </main>
  );
}

function sayError(error: unknown): { readonly title: string; readonly says: string } {
  if (isRouteErrorResponse(error) && error.status === 404) return NOT_THERE;
  if (error instanceof ProblemError) {
    if (error.code === 'not-found' || error.code === 'forbidden') return NOT_THERE;
    return { title: 'The server could not do this', says: `${error.message} What was saved is safe.` };
  }
  if (error instanceof Unreachable) {
    return {
      title: 'No signal',
      says: 'This page has not been read on this device yet, and the server cannot be reached. What you drew is kept here.',
    };
  }
  if (error instanceof TypeError && /import|module|fetch/i.test(error.message)) {
    return {
      title: 'This page could not be fetched',
      says: 'The server cannot be reached, or a newer version has been put there. What you drew is kept on this device.',
    };
  }
  return {
    title: 'This page has a fault',
    says: 'Something in the program went wrong. What was saved is safe, and what waits is kept on this device.',
  };
}

const NOT_THERE = {
  title: 'There is nothing here',
  says: 'The address may be wrong, the vessel may have been deleted, or it is not shown to you.',
} as const;

export function NotFoundRoute() {
  return (
    <main className="page-plain">
      <section className="empty">
        <h1 className="text-20 font-head">There is nothing at this address</h1>
        <p>It may have been written wrongly, or what stood here is gone.</p>
        <div className="does">
          <Link className={buttonClass('go')} to="/">
            All vessels
          </Link>
        </div>
      </section>
    </main>
  );
}
