import { PrintPage } from '#src/features/print/print-page.tsx';

import { usePageTitle } from './page-title.ts';
import { useVesselContext } from './vessel-layout.tsx';

export function PrintRoute() {
  const { me, vessel } = useVesselContext();
  usePageTitle('Print', vessel.name);
  return (
    <main id="page" className="stacked-page">
      <PrintPage vessel={vessel} myName={me.name} />
    </main>
  );
}
