import { Link } from 'react-router';

import { Button, buttonClass } from '#src/ui/button.tsx';

import { HullSketch } from './hull-profile.tsx';

/** The first start: what a vessel is, the ways to begin one, and the path that follows. */
export function NoVesselYet({
  mayMake,
  onChooseFile,
}: {
  readonly mayMake: boolean;
  readonly onChooseFile: () => void;
}) {
  if (!mayMake) {
    return (
      <div className="first">
        <div className="first-lead">
          <h1>No vessel is shared with you</h1>
          <p>Open the link in the mail of your invitation; the vessel then stands here.</p>
        </div>
      </div>
    );
  }
  return (
    <div className="first">
      <div className="first-lead">
        <h1>No vessel yet</h1>
        <p>
          A vessel holds one drawing, and everything else comes from that drawing. Start it in one of two ways; each can
          be undone.
        </p>
      </div>
      <div className="first-ways">
        <section>
          <svg viewBox="0 0 400 152" aria-hidden="true">
            <Squares />
            <path d="M104 14H296V138H104Z" fill="var(--sheet)" stroke="var(--ink-1)" strokeWidth="1.5" />
            <path d="M220 138V116H296M200 8V18M200 134V144M98 76H108M292 76H302" fill="none" stroke="var(--ink-1)" />
            <path d="M258 116V138M220 127H296" stroke="var(--ink-1)" strokeWidth=".75" />
          </svg>
          <h2>From a blank sheet</h2>
          <p>Name, length, voltage, rule profile and zones, then an empty sheet with its frame and title block.</p>
          <Link className={buttonClass('go')} to="/vessels/new">
            Start blank
          </Link>
        </section>
        <section>
          <svg viewBox="0 0 400 152" aria-hidden="true">
            <Squares />
            <HullSketch type="open skiff" transform="translate(58 40) scale(.6)" />
            <HullSketch type="motor-sailer" transform="translate(196 6) scale(.56)" />
            <HullSketch type="trawler" transform="translate(58 92) scale(.42)" />
          </svg>
          <h2>From a file</h2>
          <p>
            A drawing kept as <b className="mono">.ampwright.json</b>, from this or another shop. Drop it here, or
            choose it; a file with a mistake is refused whole and says where.
          </p>
          <Button onClick={onChooseFile}>Choose a file</Button>
        </section>
      </div>
      <div className="first-path">
        <h3>The path of every job</h3>
        <ol>
          <li>
            <b>Draw</b>
            <span>place devices, wire terminals, say each length</span>
          </li>
          <li>
            <b>Findings</b>
            <span>read what is wrong, by how much, and mend it</span>
          </li>
          <li>
            <b>Parts</b>
            <span>take every device, cable and lug from the list</span>
          </li>
          <li>
            <b>Print</b>
            <span>the drawing set on real paper</span>
          </li>
        </ol>
        <p className="first-also">
          Looking for one that was put away? <Link to="/?state=archived">Archived</Link>{' '}
          <Link to="/?state=deleted">Deleted</Link>
        </p>
      </div>
    </div>
  );
}

function Squares() {
  return (
    <>
      <defs>
        <pattern id="squares" width="8" height="8" patternUnits="userSpaceOnUse">
          <path d="M8 0H0V8" fill="none" stroke="var(--grid)" />
        </pattern>
      </defs>
      <rect x="-104" y="-104" width="608" height="360" fill="url(#squares)" />
    </>
  );
}
