import { useQuery } from '@tanstack/react-query';
import { useState, type FormEvent } from 'react';
import { Link } from 'react-router';

import { useOpenDesign, useOpenDesignStore } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { Dialog } from '#src/ui/dialog.tsx';
import { Severity } from '#src/ui/severity.tsx';

import { revisionsQuery, useIssueRevision } from './revisions-api.ts';

/** The button in the head and its dialog: the design as it stands becomes the next letter and is never changed again. */
export function IssueRevision({ vesselId, primary }: { readonly vesselId: string; readonly primary: boolean }) {
  const [isOpen, setIsOpen] = useState(false);
  const revisions = useQuery(revisionsQuery(vesselId));
  const letter = letterAfter(revisions.data?.map((row) => row.letter));
  return (
    <>
      <Button
        look={primary ? 'go' : 'normal'}
        className="issue"
        aria-label={`Issue revision ${letter}`}
        onClick={() => setIsOpen(true)}
      >
        <span>
          Issue <span className="desk-only">revision </span>
          {letter}
        </span>
      </Button>
      {isOpen && <IssueDialog vesselId={vesselId} letter={letter} onClose={() => setIsOpen(false)} />}
    </>
  );
}

function IssueDialog({
  vesselId,
  letter,
  onClose,
}: {
  readonly vesselId: string;
  readonly letter: string;
  readonly onClose: () => void;
}) {
  const store = useOpenDesignStore();
  const analysis = useOpenDesign((open) => open.analysis);
  const keeping = useOpenDesign((open) => open.keeping);
  const issue = useIssueRevision(vesselId);
  const [note, setNote] = useState('');
  // One id for the dialog: pressing twice, or after a lost answer, issues once.
  const [id] = useState(() => crypto.randomUUID());
  const open = analysis?.findings.filter((finding) => finding.accepted !== true) ?? [];
  const musts = open.filter((finding) => finding.severity === 'must').length;
  const isKept = keeping.state === 'saved';
  const issued = issue.data;

  function handleSubmit(event: FormEvent) {
    event.preventDefault();
    issue.mutate({ id, seq: store.getState().seq, note: note.trim() === '' ? undefined : note.trim() });
  }

  if (issued !== undefined) {
    return (
      <Dialog
        open
        onClose={onClose}
        title={`Revision ${issued.letter} is issued`}
        lead="Everyone on this vessel can open it; it does not change any more."
      >
        <div className="does">
          <Button onClick={onClose}>Close</Button>
          <Link className="btn go" to={`/vessels/${vesselId}/revisions/${issued.letter}`} onClick={onClose}>
            Open revision {issued.letter}
          </Link>
        </div>
      </Dialog>
    );
  }

  return (
    <Dialog
      open
      onClose={onClose}
      title={`Issue revision ${letter}`}
      lead="The drawing as it stands is frozen under this letter. The owner sees issued revisions and nothing else."
    >
      <form onSubmit={handleSubmit}>
        <p className="mb-3 flex flex-wrap items-center gap-2">
          {analysis === null ? (
            <span className="quiet">The check has not answered yet.</span>
          ) : musts === 0 ? (
            <Severity of="good">no must-fix</Severity>
          ) : (
            <>
              <Severity of="must">{musts} must fix</Severity>
              <span>
                The sheets will say &quot;In review, not for building&quot; until {musts === 1 ? 'it is' : 'they are'}{' '}
                mended.
              </span>
            </>
          )}
        </p>
        <label className="cell edit big alone">
          <small>What this revision is, for its readers (may stay empty)</small>
          <textarea
            className="in"
            rows={3}
            maxLength={500}
            value={note}
            onChange={(event) => setNote(event.currentTarget.value)}
          />
        </label>
        {issue.error !== null && (
          <p role="alert" className="mt-2 font-label text-must">
            {issue.error.message}
          </p>
        )}
        {!isKept && <p className="mt-2 quiet">Wait until everything is saved; then it can be issued.</p>}
        <div className="does">
          <Button onClick={onClose}>Cancel</Button>
          <Button type="submit" look="go" off={!isKept || issue.isPending}>
            Issue revision {letter}
          </Button>
        </div>
      </form>
    </Dialog>
  );
}

/** The letter after the greatest there is: A … Z, AA … . */
function letterAfter(letters: readonly string[] = []): string {
  const numbers = letters.map(numberOfLetter);
  return letterOfNumber(Math.max(0, ...numbers) + 1);
}

function numberOfLetter(letter: string): number {
  return [...letter].reduce((n, character) => n * 26 + (character.charCodeAt(0) - 64), 0);
}

function letterOfNumber(n: number): string {
  if (n <= 0) return '';
  const last = (n - 1) % 26;
  return letterOfNumber((n - 1 - last) / 26) + String.fromCharCode(65 + last);
}
