import { useQuery } from '@tanstack/react-query';

import type { Revision } from '#shared/api/design.ts';
import { PrintPage } from '#src/features/print/print-page.tsx';
import { revisionsQuery } from '#src/features/revisions/revisions-api.ts';

import { usePageTitle } from './page-title.ts';
import { useVesselContext } from './vessel-layout.tsx';

export function PrintRoute() {
  const { me, vessel } = useVesselContext();
  usePageTitle('Print', vessel.name);
  const revisions = useQuery(revisionsQuery(vessel.vesselId));
  const latest = revisions.data?.reduce<Revision | undefined>(
    (best, one) => (best === undefined || one.issuedAt > best.issuedAt ? one : best),
    undefined,
  );
  return (
    <main id="page" className="stacked-page">
      <PrintPage vessel={vessel} myName={me.name} latest={latest} />
    </main>
  );
}
