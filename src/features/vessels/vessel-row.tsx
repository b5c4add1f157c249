import { Link } from 'react-router';

import { may } from '#shared/access/matrix.ts';
import type { VesselSummary } from '#shared/api/vessels.ts';
import { formatLength } from '#shared/units/length.ts';
import { useUnits } from '#src/lib/reader-settings.ts';
import { Button } from '#src/ui/button.tsx';
import { Cell } from '#src/ui/cell.tsx';
import { Initials } from '#src/ui/initials.tsx';
import { Menu, MenuLine } from '#src/ui/menu.tsx';
import { When } from '#src/ui/when.tsx';

import { HullProfile } from './hull-profile.tsx';
import { useDuplicateVessel, useMoveVessel, type VesselMove } from './vessels-api.ts';

/** One boat of the list: its profile to scale, its name, the path of its job, its facts. */
export function VesselRow({
  vessel,
  pxPerM,
  myName,
  showShop,
}: {
  readonly vessel: VesselSummary;
  readonly pxPerM: number;
  readonly myName: string;
  readonly showShop: boolean;
}) {
  const units = useUnits(vessel.units);
  const isOpen = vessel.state !== 'deleted';
  const to = may(vessel.role, 'see-design')
    ? `/vessels/${vessel.vesselId}/draw`
    : `/vessels/${vessel.vesselId}/revisions`;
  const length = vessel.lengthM === null ? 'length not said' : formatLength(vessel.lengthM, units);
  const type = vessel.type === null ? null : vessel.type.charAt(0).toLowerCase() + vessel.type.slice(1);
  const about = [vessel.lengthM === null ? null : length, type].filter(Boolean).join(' ');

  return (
    <li className="vessel">
      <div className="vessel-profile">
        <HullProfile type={vessel.type} lengthM={vessel.lengthM} pxPerM={pxPerM} says={length} />
      </div>
      <div className="vessel-name">
        <h2>{isOpen ? <Link to={to}>{vessel.name}</Link> : vessel.name}</h2>
        <p className="quiet">
          {about || 'type not said'}
          {vessel.owner !== null && `, for ${vessel.owner}`}
          {showShop && `, ${vessel.shopName}`}
        </p>
        {isOpen && may(vessel.role, 'see-design') && <MiniPath vessel={vessel} />}
        <p className="vessel-state">
          {vessel.revision === null ? (
            <span>Nothing issued yet.</span>
          ) : (
            <span>
              <Link to={`/vessels/${vessel.vesselId}/revisions/${vessel.revision.letter}`}>
                Revision {vessel.revision.letter}
              </Link>{' '}
              issued <When at={vessel.revision.issuedAt} />.
            </span>
          )}
          <span className="quiet">You are its {vessel.role}.</span>
        </p>
      </div>
      <div className="vessel-facts">
        <div className="cells">
          <Cell caption="DC">
            {vessel.nominalV.length === 0 ? 'not said' : vessel.nominalV.map((v) => `${v} V`).join(', ')}
          </Cell>
          <Cell caption="Shore">
            {vessel.shore === null ? 'none' : `${vessel.shore.acV} V, ${vessel.shore.hz} Hz, ${vessel.shore.amps} A`}
          </Cell>
          <Cell caption="Rules">{vessel.profile === 'iso-13297' ? 'ISO 13297, mm²' : 'ABYC E-11, AWG'}</Cell>
          <Cell caption="Drawn">
            {vessel.drawn === null
              ? 'issued only'
              : `${count(vessel.drawn.sheets, 'sheet')}, ${count(vessel.drawn.runs, 'run')}`}
          </Cell>
          <Cell caption="Revision">{vessel.revision?.letter ?? 'none'}</Cell>
          <Cell caption="Last change">
            {vessel.lastChange === null ? 'none yet' : <When at={vessel.lastChange.at} />}
          </Cell>
        </div>
        <div className="vessel-people">
          <Initials
            people={vessel.people
              .slice(0, 6)
              .map((person) => ({ ...person, says: person.role, here: person.name === myName }))}
          />
          <RowActions vessel={vessel} />
        </div>
      </div>
    </li>
  );
}

const STEPS = ['draw', 'findings', 'parts', 'print'] as const;

function MiniPath({ vessel }: { readonly vessel: VesselSummary }) {
  const isIssued = vessel.revision !== null;
  const isDrawn = (vessel.drawn?.runs ?? 0) > 0;
  return (
    <div className="mini" role="group" aria-label={`Path of ${vessel.name}`}>
      {STEPS.map((step) => (
        <Link key={step} to={`/vessels/${vessel.vesselId}/${step}`}>
          <span>{step[0]!.toUpperCase() + step.slice(1)}</span>
          <i aria-hidden="true">
            <u style={{ width: isIssued || (isDrawn && step === 'draw') ? '100%' : '0%' }} />
          </i>
        </Link>
      ))}
    </div>
  );
}

/** Putting away and bringing back; nothing asks first, since each has its way back. */
function RowActions({ vessel }: { readonly vessel: VesselSummary }) {
  const move = useMoveVessel();
  const duplicate = useDuplicateVessel(vessel.vesselId);
  if (!may(vessel.role, 'manage-vessel')) return null;
  const go = (to: VesselMove) => move.mutate({ vesselId: vessel.vesselId, move: to });
  const wrong = move.error ?? duplicate.error;

  return (
    <>
      {vessel.state === 'deleted' && (
        <>
          <Button onClick={() => go('restore')}>Bring back {vessel.name}</Button>
          {vessel.deletedAt !== null && <span className="quiet">{daysLeft(vessel.deletedAt)}</span>}
        </>
      )}
      {vessel.state === 'archived' && <Button onClick={() => go('unarchive')}>Bring back {vessel.name}</Button>}
      {vessel.state !== 'deleted' && (
        <Menu
          trigger={
            <Button look="plain" aria-label={`More for ${vessel.name}`}>
              More
            </Button>
          }
        >
          <MenuLine onChoose={() => duplicate.mutate()}>Duplicate</MenuLine>
          {vessel.state === 'active' && <MenuLine onChoose={() => go('archive')}>Archive</MenuLine>}
          <MenuLine onChoose={() => go('delete')}>Delete, 30 days to bring it back</MenuLine>
        </Menu>
      )}
      {wrong !== null && (
        <span role="alert" className="text-must">
          {wrong.message}
        </span>
      )}
    </>
  );
}

function daysLeft(deletedAt: string): string {
  const gone = (Date.now() - new Date(deletedAt).getTime()) / 86_400_000;
  const left = Math.max(0, Math.ceil(30 - gone));
  return left === 1 ? 'one day left' : `${left} days left`;
}

function count(n: number, word: string): string {
  return `${n} ${word}${n === 1 ? '' : 's'}`;
}
