import { useQuery } from '@tanstack/react-query';
import { Link, Navigate, useParams } from 'react-router';

import { may } from '#shared/access/matrix.ts';
import { RevisionList } from '#src/features/revisions/revision-list.tsx';
import { CAUTION, ShopHead } from '#src/features/vessels/shop-head.tsx';
import { vesselQuery } from '#src/features/vessels/vessels-api.ts';

import { Loading } from './loading.tsx';
import { SayError } from './page-error.tsx';
import { usePageTitle } from './page-title.ts';
import { useMe } from './signed-in.tsx';

/** All revisions of a vessel; an owner lands on the latest one. */
export function RevisionsRoute() {
  const me = useMe();
  const { vesselId = '' } = useParams();
  const vessel = useQuery(vesselQuery(vesselId));
  usePageTitle('Revisions', vessel.data?.name);

  if (vessel.data === undefined) {
    return vessel.error === null ? (
      <Loading what="Opening the vessel" />
    ) : (
      <SayError error={vessel.error} onRetry={() => void vessel.refetch()} />
    );
  }
  const { name, role, revision } = vessel.data;
  if (!may(role, 'see-design') && revision !== null) {
    return <Navigate replace to={`/vessels/${vesselId}/revisions/${revision.letter}`} />;
  }
  return (
    <div className="frame" data-profile={vessel.data.profile}>
      <ShopHead me={me} />
      <main id="page" className="home-page">
        <h1 className="page-title">Issued revisions of {name}</h1>
        {may(role, 'see-design') && (
          <p className="page-lead">
            <Link to={`/vessels/${vesselId}/draw`}>To the drawing as it stands</Link>
          </p>
        )}
        <RevisionList vesselId={vesselId} mayIssue={may(role, 'issue-revision')} />
        <footer className="strip">
          <span className="quiet caution-end">{CAUTION}</span>
        </footer>
      </main>
    </div>
  );
}
