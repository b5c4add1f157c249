import { useQuery } from '@tanstack/react-query';
import type { CSSProperties } from 'react';
import { Link, useParams } from 'react-router';

import { may } from '#shared/access/matrix.ts';
import { FrozenDesignProvider } from '#src/design/frozen-design-provider.tsx';
import { revisionQuery, revisionsQuery } from '#src/features/revisions/revisions-api.ts';
import { RevisionSheets } from '#src/features/revisions/revision-sheets.tsx';
import { CAUTION } from '#src/features/vessels/shop-head.tsx';
import { vesselQuery } from '#src/features/vessels/vessels-api.ts';
import { Mark } from '#src/ui/wordmark.tsx';
import { When } from '#src/ui/when.tsx';

import { Loading } from './loading.tsx';
import { SayError } from './page-error.tsx';
import { usePageTitle } from './page-title.ts';

/** One issued revision, frozen: for everyone on the vessel, and all that its owner sees. */
export function RevisionRoute() {
  const { vesselId = '', letter = '' } = useParams();
  const vessel = useQuery(vesselQuery(vesselId));
  const revision = useQuery(revisionQuery(vesselId, letter));
  const all = useQuery(revisionsQuery(vesselId));
  usePageTitle(`Revision ${letter}`, vessel.data?.name);

  const error = vessel.error ?? revision.error;
  if (vessel.data === undefined || revision.data === undefined) {
    return error === null ? (
      <Loading what={`Opening revision ${letter}`} />
    ) : (
      <SayError error={error} onRetry={() => void Promise.all([vessel.refetch(), revision.refetch()])} />
    );
  }
  const { name, role, profile, shopName } = vessel.data;
  const issued = revision.data;
  return (
    <div className="frame" data-profile={profile}>
      <header className="head shop">
        <Link className="home" to="/" title="All vessels">
          <Mark label="Ampwright, all vessels" />
          <div>
            <b>{name}</b>
            <span>revision {issued.letter}, frozen</span>
          </div>
        </Link>
        <nav
          className="path revisions-path"
          aria-label="Revisions"
          style={{ '--path-width': `${72 * (all.data?.length ?? 1)}px` } as CSSProperties}
        >
          {(all.data ?? [issued]).map((one) => (
            <Link
              key={one.letter}
              to={`/vessels/${vesselId}/revisions/${one.letter}`}
              aria-current={one.letter === issued.letter ? 'page' : undefined}
            >
              <b className="mono">{one.letter}</b>
              <span>{one.issuedAt.slice(0, 10)}</span>
              <i aria-hidden="true">
                <u style={{ width: '100%' }} />
              </i>
            </Link>
          ))}
        </nav>
        <div className="end">
          <span className="kept quiet">
            issued <When at={issued.issuedAt} /> by {issued.issuedBy}
          </span>
          {may(role, 'see-design') && (
            <Link className="btn" to={`/vessels/${vesselId}/draw`}>
              To the drawing
            </Link>
          )}
        </div>
      </header>
      <main id="page" className="revision-page">
        <h1 className="visually-hidden">
          {name}, revision {issued.letter}
        </h1>
        {issued.note !== null && <p className="revision-note">{issued.note}</p>}
        <FrozenDesignProvider
          key={issued.revisionId}
          vesselId={vesselId}
          role={role}
          seq={issued.seq}
          issuedAt={issued.issuedAt}
          design={issued.design}
        >
          <RevisionSheets revision={issued} shopName={shopName} />
        </FrozenDesignProvider>
      </main>
      <footer className="strip">
        <span className="quiet caution-end">{CAUTION}</span>
      </footer>
    </div>
  );
}
