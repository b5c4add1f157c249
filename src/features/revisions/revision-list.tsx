import { useQuery } from '@tanstack/react-query';
import { Link } from 'react-router';

import { EmptyState } from '#src/ui/empty-state.tsx';
import { When } from '#src/ui/when.tsx';

import { revisionsQuery } from './revisions-api.ts';

/** All that was issued, the latest first. */
export function RevisionList({ vesselId, mayIssue }: { readonly vesselId: string; readonly mayIssue: boolean }) {
  const revisions = useQuery(revisionsQuery(vesselId));
  if (revisions.error !== null && revisions.data === undefined) {
    return <EmptyState title="The revisions could not be read">{revisions.error.message}</EmptyState>;
  }
  if (revisions.data?.length === 0) {
    return mayIssue ? (
      <EmptyState
        title="Nothing has been issued yet"
        does={
          <Link className="btn" to={`/vessels/${vesselId}/draw`}>
            To the drawing
          </Link>
        }
      >
        Issue a revision when the drawing may be read by others: it is frozen under a letter, and the owner sees it.
      </EmptyState>
    ) : (
      <EmptyState title="Nothing has been issued to you yet">
        What the yard draws comes here when they issue it. Until then there is nothing to read.
      </EmptyState>
    );
  }
  return (
    <ol className="revision-list">
      {[...(revisions.data ?? [])]
        .sort((a, b) => b.issuedAt.localeCompare(a.issuedAt))
        .map((revision) => (
          <li key={revision.revisionId}>
            <b className="mono">{revision.letter}</b>
            <div>
              <Link to={`/vessels/${vesselId}/revisions/${revision.letter}`}>Open revision {revision.letter}</Link>
              <p className="quiet">
                issued <When at={revision.issuedAt} /> by {revision.issuedBy}
              </p>
              {revision.note !== null && <p>{revision.note}</p>}
            </div>
          </li>
        ))}
    </ol>
  );
}
