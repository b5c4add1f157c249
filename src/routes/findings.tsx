import { FindingsPage } from '#src/features/findings/findings-page.tsx';

import { usePageTitle } from './page-title.ts';
import { useVesselContext } from './vessel-layout.tsx';

export function FindingsRoute() {
  const { me, vessel } = useVesselContext();
  usePageTitle('Findings', vessel.name);
  return (
    <main id="page" className="stacked-page">
      <FindingsPage vesselId={vessel.vesselId} myName={me.name} />
    </main>
  );
}
