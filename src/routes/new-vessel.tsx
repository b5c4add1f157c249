import { useNavigate } from 'react-router';

import { mayInShop } from '#shared/access/matrix.ts';
import { NewVesselForm } from '#src/features/vessels/new-vessel-form.tsx';
import { CAUTION, ShopHead } from '#src/features/vessels/shop-head.tsx';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { Hatch } from '#src/ui/scale.tsx';

import { usePageTitle } from './page-title.ts';
import { useMe } from './signed-in.tsx';

export function NewVesselRoute() {
  usePageTitle('New vessel');
  const me = useMe();
  const navigate = useNavigate();
  const shops = me.shops.filter((shop) => mayInShop(shop, 'make-vessel'));
  return (
    <div className="frame">
      <Hatch />
      <ShopHead me={me} />
      <main id="page" className="home-page">
        {shops.length === 0 ? (
          <EmptyState title="You have no shop of your own">
            Vessels are made in a shop; you see those that are shared with you.
          </EmptyState>
        ) : (
          <NewVesselForm shops={shops} onMade={(vessel) => void navigate(`/vessels/${vessel.vesselId}/draw`)} />
        )}
        <footer className="strip">
          <span className="quiet caution-end">{CAUTION}</span>
        </footer>
      </main>
    </div>
  );
}
