import { useQuery } from '@tanstack/react-query';
import { useMemo, useState } from 'react';
import { Link, useSearchParams } from 'react-router';

import type { Me } from '#shared/api/me.ts';
import type { VesselSummary } from '#shared/api/vessels.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import { EmptyState } from '#src/ui/empty-state.tsx';
import { FindField } from '#src/ui/find-field.tsx';
import { When } from '#src/ui/when.tsx';

import { scaleOfList } from './hull-profile.tsx';
import { LengthRuler } from './length-ruler.tsx';
import { VesselRow } from './vessel-row.tsx';
import { vesselsQuery, type VesselListState } from './vessels-api.ts';

const STATES: readonly { readonly state: VesselListState; readonly title: string }[] = [
  { state: 'active', title: 'In hand' },
  { state: 'archived', title: 'Archived' },
  { state: 'deleted', title: 'Deleted' },
];

/** The boats of a state to one scale, with what happened lately. */
export function VesselList({ me, state }: { readonly me: Me; readonly state: VesselListState }) {
  const [search] = useSearchParams();
  const [find, setFind] = useState(search.get('find') ?? '');
  const lists = {
    active: useQuery(vesselsQuery('active')),
    archived: useQuery(vesselsQuery('archived')),
    deleted: useQuery(vesselsQuery('deleted')),
  };
  const all = lists[state].data;
  const shown = useMemo(() => (all ?? []).filter((vessel) => isFound(vessel, find)), [all, find]);
  const pxPerM = useMemo(() => scaleOfList(all ?? []), [all]);
  const units = useUnits(all?.[0]?.units ?? 'us');
  const showShop = new Set((all ?? []).map((vessel) => vessel.shopId)).size > 1;

  return (
    <>
      <div className="vessels-top">
        <LengthRuler pxPerM={pxPerM} units={units} />
        <h1>{all === undefined ? 'Vessels' : sayCount(all.length, state)}</h1>
        <FindField label="Find a vessel, a person" value={find} onChange={setFind} />
        <nav className="seg" aria-label="Vessels by state">
          {STATES.map(({ state: other, title }) => (
            <Link
              key={other}
              to={other === 'active' ? '/' : `/?state=${other}`}
              aria-current={other === state ? 'page' : undefined}
            >
              {title}
              {lists[other].data === undefined ? '' : `, ${lists[other].data.length}`}
            </Link>
          ))}
        </nav>
      </div>
      {all !== undefined && shown.length === 0 && <NothingShown state={state} find={find} />}
      <ol>
        {shown.map((vessel) => (
          <VesselRow key={vessel.vesselId} vessel={vessel} pxPerM={pxPerM} myName={me.name} showShop={showShop} />
        ))}
      </ol>
      {state === 'active' && <Lately vessels={all ?? []} />}
    </>
  );
}

function NothingShown({ state, find }: { readonly state: VesselListState; readonly find: string }) {
  if (find !== '')
    return (
      <EmptyState title={`No vessel has "${find}" in it`}>
        The name, the type, the owner and the people are looked through.
      </EmptyState>
    );
  if (state === 'archived') {
    return (
      <EmptyState title="Nothing is archived">
        A vessel whose job is over can be archived from its menu; it stays readable here.
      </EmptyState>
    );
  }
  return (
    <EmptyState title="Nothing is deleted">A deleted vessel stays here for 30 days and can be brought back.</EmptyState>
  );
}

function Lately({ vessels }: { readonly vessels: readonly VesselSummary[] }) {
  const changed = vessels
    .flatMap((vessel) => (vessel.lastChange === null ? [] : [{ vessel, change: vessel.lastChange }]))
    .sort((a, b) => b.change.at.localeCompare(a.change.at))
    .slice(0, 8);
  if (changed.length === 0) return null;
  return (
    <section className="lately" aria-labelledby="lately">
      <h3 id="lately">Lately</h3>
      <ul>
        {changed.map(({ vessel, change }) => (
          <li key={vessel.vesselId}>
            <span className="quiet">
              <When at={change.at} />
            </span>
            <span>{change.by}</span>
            <b>{vessel.name}</b>
            <span className="what">{change.label}</span>
            <Link to={`/vessels/${vessel.vesselId}/draw`} aria-label={`Show ${vessel.name}`}>
              Show
            </Link>
          </li>
        ))}
      </ul>
    </section>
  );
}

function isFound(vessel: VesselSummary, find: string): boolean {
  const words = find.toLowerCase().split(/\s+/).filter(Boolean);
  const text = [vessel.name, vessel.type, vessel.owner, vessel.shopName, ...vessel.people.map((person) => person.name)]
    .filter(Boolean)
    .join(' ')
    .toLowerCase();
  return words.every((word) => text.includes(word));
}

const NUMBERS = [
  'No',
  'One',
  'Two',
  'Three',
  'Four',
  'Five',
  'Six',
  'Seven',
  'Eight',
  'Nine',
  'Ten',
  'Eleven',
  'Twelve',
];

function sayCount(n: number, state: VesselListState): string {
  const what = state === 'active' ? '' : `${state} `;
  return `${NUMBERS[n] ?? n} ${what}vessel${n === 1 ? '' : 's'}`;
}
