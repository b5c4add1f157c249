import { useQuery } from '@tanstack/react-query';
import { Navigate, Outlet, useLocation, useOutletContext, useParams } from 'react-router';

import { may } from '#shared/access/matrix.ts';
import type { Me } from '#shared/api/me.ts';
import type { VesselSummary } from '#shared/api/vessels.ts';
import { basisOf } from '#shared/model/defaults.ts';
import { DesignProvider } from '#src/design/design-provider.tsx';
import { useOpenDesign } from '#src/design/open-design.ts';
import { KeepingDialogs } from '#src/features/keeping/keeping-dialogs.tsx';
import { IssueRevision } from '#src/features/revisions/issue-revision.tsx';
import { VesselHead } from '#src/features/vessels/vessel-head.tsx';
import { useUndoKeys } from '#src/features/vessels/use-undo-keys.ts';
import { vesselQuery } from '#src/features/vessels/vessels-api.ts';
import { Hatch } from '#src/ui/scale.tsx';

import { Loading } from './loading.tsx';
import { SayError } from './page-error.tsx';
import { useMe } from './signed-in.tsx';

export interface VesselContext {
  readonly me: Me;
  readonly vessel: VesselSummary;
}

/** Everything of a vessel hangs here: its design is opened once, and the pages are laid into one frame. */
export function VesselLayout() {
  const me = useMe();
  const { vesselId = '' } = useParams();
  const { pathname } = useLocation();
  const vessel = useQuery(vesselQuery(vesselId));

  if (vessel.data === undefined) {
    return vessel.error === null ? (
      <Loading what="Opening the vessel" />
    ) : (
      <SayError error={vessel.error} onRetry={() => void vessel.refetch()} />
    );
  }
  // An owner sees what was issued, and nothing of what is being drawn.
  if (!may(vessel.data.role, 'see-design')) return <Navigate replace to={`/vessels/${vesselId}/revisions`} />;
  if (/^\/vessels\/[^/]+\/?$/.test(pathname)) return <Navigate replace to={`/vessels/${vesselId}/draw`} />;

  return (
    <DesignProvider
      vesselId={vesselId}
      loading={<Loading what={`Opening ${vessel.data.name}`} />}
      failed={(error, retry) => <SayError error={error} onRetry={retry} />}
    >
      <VesselFrame me={me} vessel={vessel.data} isDrawing={pathname.includes('/draw')} />
    </DesignProvider>
  );
}

function VesselFrame({ me, vessel, isDrawing }: VesselContext & { readonly isDrawing: boolean }) {
  const profile = useOpenDesign((open) => basisOf(open.design).profile);
  useUndoKeys(!isDrawing);
  return (
    <div className="frame" data-profile={profile}>
      <a className="skip-link" href="#page">
        To the page
      </a>
      <Hatch />
      <VesselHead
        vessel={vessel}
        myName={me.name}
        heading={isDrawing ? `Drawing of ${vessel.name}` : undefined}
        action={may(vessel.role, 'issue-revision') && <IssueRevision vesselId={vessel.vesselId} primary={isDrawing} />}
      />
      <Outlet context={{ me, vessel } satisfies VesselContext} />
      <KeepingDialogs />
    </div>
  );
}

/** The vessel that is open and who looks at it, on any page below the layout. */
export function useVesselContext(): VesselContext {
  return useOutletContext<VesselContext>();
}
