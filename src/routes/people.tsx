import { PeoplePage } from '#src/features/people/people-page.tsx';

import { usePageTitle } from './page-title.ts';
import { useVesselContext } from './vessel-layout.tsx';

export function PeopleRoute() {
  const { me, vessel } = useVesselContext();
  usePageTitle('People', vessel.name);
  return (
    <main id="page" className="sheet-page">
      <PeoplePage
        vesselId={vessel.vesselId}
        vesselName={vessel.name}
        role={vessel.role}
        myId={me.personId}
        shopAdmin={me.shops.some((shop) => shop.shopId === vessel.shopId && shop.admin)}
      />
    </main>
  );
}
