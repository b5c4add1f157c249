import type { Design } from '#shared/model/design.ts';
import { useOpenDesign, type FieldConflict } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { Cell } from '#src/ui/cell.tsx';
import { Dialog } from '#src/ui/dialog.tsx';

/** Two people changed the same: both values with their names, and one's own choice. */
export function Conflict() {
  const keeping = useOpenDesign((open) => open.keeping);
  const design = useOpenDesign((open) => open.design);
  const resolve = useOpenDesign((open) => open.resolveConflict);
  const conflicts = keeping.state === 'conflict' ? keeping.conflicts : [];
  const isWhole = conflicts.length === 0;

  return (
    <Dialog
      open={keeping.state === 'conflict'}
      onClose={() => {}}
      insist
      title="Someone else changed the same"
      lead={
        isWhole
          ? 'Your last change no longer fits the drawing: what it speaks of was deleted meanwhile.'
          : 'Your change is kept on this device until you choose.'
      }
    >
      {conflicts.slice(0, 8).map((conflict) => (
        <section key={conflict.path.join('.')}>
          <p className="quiet">{namePlace(design, conflict.path)}</p>
          <div className="cells conflict-values">
            <Cell caption="Yours">{sayValue(conflict.mine)}</Cell>
            <Cell caption={conflict.by}>{sayValue(conflict.theirs)}</Cell>
          </div>
        </section>
      ))}
      {conflicts.length > 8 && <p className="quiet">and {conflicts.length - 8} more</p>}
      <div className="does">
        <Button onClick={() => resolve('theirs')}>{isWhole ? 'Let mine go' : `Take ${namesOf(conflicts)}`}</Button>
        {!isWhole && (
          <Button look="go" onClick={() => resolve('mine')}>
            Keep mine
          </Button>
        )}
      </div>
    </Dialog>
  );
}

function namesOf(conflicts: readonly FieldConflict[]): string {
  const names = [...new Set(conflicts.map(({ by }) => by))];
  return names.length === 1 ? `${names[0]!}’s` : 'theirs';
}

/** `W12, conductor size`. */
function namePlace(design: Design, path: readonly string[]): string {
  const [family, id, ...rest] = path;
  const entity = family === 'devices' || family === 'runs' ? design[family][id ?? ''] : undefined;
  const field = rest.map(spaceWords).join(' ');
  const who = entity?.mark ?? (family === undefined ? '' : spaceWords(family));
  return field === '' ? who : `${who}, ${field}`;
}

function spaceWords(key: string): string {
  return key.replaceAll(/([A-Z])/g, (letter) => ` ${letter.toLowerCase()}`);
}

function sayValue(value: unknown): string {
  if (value === undefined || value === null) return 'nothing';
  if (typeof value === 'object') {
    const named = value as { mark?: unknown; name?: unknown };
    return typeof named.mark === 'string' ? named.mark : JSON.stringify(value).slice(0, 60);
  }
  return String(value);
}
