import { useQuery } from '@tanstack/react-query';
import { useRef } from 'react';
import { Link, useSearchParams } from 'react-router';

import { mayInShop } from '#shared/access/matrix.ts';
import { FileInput, RefusedFile, useOpenFile } from '#src/features/vessels/open-file.tsx';
import { NoVesselYet } from '#src/features/vessels/no-vessel-yet.tsx';
import { CAUTION, ShopHead } from '#src/features/vessels/shop-head.tsx';
import { VesselList } from '#src/features/vessels/vessel-list.tsx';
import { vesselsQuery, type VesselListState } from '#src/features/vessels/vessels-api.ts';
import { Button, buttonClass } from '#src/ui/button.tsx';
import { Hatch } from '#src/ui/scale.tsx';

import { usePageTitle } from './page-title.ts';
import { SayError } from './page-error.tsx';
import { useMe } from './signed-in.tsx';

export function HomeRoute() {
  const me = useMe();
  const shop = me.shops.find((one) => mayInShop(one, 'make-vessel'));
  usePageTitle(shop?.name ?? 'Vessels');
  const [search] = useSearchParams();
  const state = stateOf(search.get('state'));
  const active = useQuery(vesselsQuery('active'));
  const fileInput = useRef<HTMLInputElement>(null);
  const file = useOpenFile(shop?.shopId);
  const isFirst = state === 'active' && active.data?.length === 0;
  const chooseFile = () => fileInput.current?.click();

  return (
    <div className="frame" {...file.dropHere}>
      <Hatch />
      <ShopHead
        me={me}
        onOpenFile={shop === undefined ? undefined : chooseFile}
        says={
          active.data === undefined
            ? undefined
            : active.data.length === 0
              ? 'none yet'
              : `${active.data.length} in hand`
        }
        action={
          shop !== undefined && (
            <>
              <Button className="desk-only" onClick={chooseFile} off={file.isOpening}>
                {file.isOpening ? 'Opening' : 'Open a file'}
              </Button>
              {!isFirst && (
                <Link className={buttonClass('go')} to="/vessels/new">
                  New vessel
                </Link>
              )}
            </>
          )
        }
      />
      <main id="page" className="home-page">
        {active.error !== null && active.data === undefined ? (
          <SayError error={active.error} onRetry={() => void active.refetch()} />
        ) : isFirst ? (
          <NoVesselYet mayMake={shop !== undefined} onChooseFile={chooseFile} />
        ) : (
          <VesselList me={me} state={state} />
        )}
        <footer className="strip">
          <span className="quiet">{isFirst ? '' : 'Profiles to one scale; hatched: engine space'}</span>
          <span className="quiet caution-end">{CAUTION}</span>
        </footer>
      </main>
      <FileInput fileRef={fileInput} onFile={(chosen) => void file.handleFile(chosen)} />
      {file.error !== null && <RefusedFile name={file.name} error={file.error} onClose={file.forget} />}
    </div>
  );
}

function stateOf(text: string | null): VesselListState {
  return text === 'archived' || text === 'deleted' ? text : 'active';
}
