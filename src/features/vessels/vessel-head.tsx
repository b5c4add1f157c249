import type { CSSProperties, ReactNode } from 'react';
import { Link, NavLink } from 'react-router';

import type { VesselSummary } from '#shared/api/vessels.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { Initials } from '#src/ui/initials.tsx';
import { Mark } from '#src/ui/wordmark.tsx';

import { KeepingAcross, KeepingWords } from './keeping-words.tsx';
import { useJobPath } from './job-path.ts';
import { VesselMenu } from './vessel-menu.tsx';

/**
 * The head of every screen of a vessel: whose it is, the path of the job as a divided rule, how it is kept, who is
 * on it, and the menu. It never moves between screens.
 */
export function VesselHead({
  vessel,
  myName,
  heading,
  action,
}: {
  readonly vessel: VesselSummary;
  readonly myName: string;
  /** What the screen is, read out where the screen itself shows no heading: the drawing. */
  readonly heading?: string;
  /** The screen's own button at the right: issuing a revision. */
  readonly action?: ReactNode;
}) {
  const path = useJobPath(vessel);
  const name = useOpenDesign((open) => open.design.vessel?.name) ?? vessel.name;
  return (
    <>
      <header className="head">
        {heading !== undefined && <h1 className="visually-hidden">{heading}</h1>}
        <Link className="home" to="/" title="All vessels">
          <Mark label="Ampwright, all vessels" />
          <div>
            <b>{name}</b>
            <span>{sayRevision(vessel)}</span>
          </div>
        </Link>
        <nav className="path" aria-label="Path of the job" style={{ '--divisions': path.length } as CSSProperties}>
          {path.map((step) => (
            <NavLink key={step.to} to={step.to}>
              <b>{step.title}</b>
              <span>{step.says}</span>
              <i aria-hidden="true">
                <u style={{ width: `${Math.round(step.done * 100)}%` }} />
              </i>
            </NavLink>
          ))}
        </nav>
        <div className="end">
          <KeepingWords />
          <span className="who-name">
            <Initials
              people={vessel.people
                .slice(0, 4)
                .map((person) => ({ name: person.name, says: person.role, here: person.name === myName }))}
            />
          </span>
          <VesselMenu vessel={vessel} myName={myName} />
          {action}
        </div>
      </header>
      <KeepingAcross />
    </>
  );
}

export function sayRevision(vessel: Pick<VesselSummary, 'revision'>): string {
  return vessel.revision === null ? 'nothing issued yet' : `revision ${vessel.revision.letter} issued`;
}
