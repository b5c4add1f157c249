import { PartsPage } from '#src/features/parts/parts-page.tsx';

import { usePageTitle } from './page-title.ts';
import { useVesselContext } from './vessel-layout.tsx';

export function PartsRoute() {
  const { vessel } = useVesselContext();
  usePageTitle('Parts', vessel.name);
  return (
    <main id="page" className="stacked-page">
      <PartsPage vesselId={vessel.vesselId} />
    </main>
  );
}
