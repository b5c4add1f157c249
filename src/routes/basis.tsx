import { BasisPage } from '#src/features/basis/basis-page.tsx';

import { usePageTitle } from './page-title.ts';
import { useVesselContext } from './vessel-layout.tsx';

export function BasisRoute() {
  const { vessel } = useVesselContext();
  usePageTitle('Basis', vessel.name);
  return (
    <main id="page" className="sheet-page">
      <BasisPage />
    </main>
  );
}
