import { useOpenDesign, useOpenDesignStore, type Keeping } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { When } from '#src/ui/when.tsx';

/** How the drawing is kept, in words in the head. */
export function KeepingWords() {
  const keeping = useOpenDesign((open) => open.keeping);
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  if (!mayEdit) return <span className="kept quiet">Read only</span>;
  return (
    <span className="kept quiet" role="status">
      <Words keeping={keeping} />
    </span>
  );
}

function Words({ keeping }: { readonly keeping: Keeping }) {
  switch (keeping.state) {
    case 'saved':
      return (
        <>
          Saved <When at={keeping.at} />
        </>
      );
    case 'saving':
      return <>Saving</>;
    case 'offline':
      return <>Offline: {sayWaiting(keeping.waiting)} kept on this device</>;
    case 'signed-out':
      return <>Signed out: {sayWaiting(keeping.waiting)} kept on this device</>;
    case 'conflict':
      return <>Someone else changed the same</>;
    case 'refused':
      return <>Not saved</>;
  }
}

/** What keeps changes from being saved stands across the top until it is over. */
export function KeepingAcross() {
  const keeping = useOpenDesign((open) => open.keeping);
  const store = useOpenDesignStore();
  if (keeping.state === 'offline') {
    return (
      <div className="across" role="status">
        <span>
          No signal. {sayWaiting(keeping.waiting, true)} here and {keeping.waiting === 1 ? 'is' : 'are'} sent when it is
          back.
        </span>
        <Button look="plain" onClick={() => store.getState().retry()}>
          Try now
        </Button>
      </div>
    );
  }
  if (keeping.state === 'refused') {
    return (
      <div className="across" role="alert">
        <span>
          The server did not take the last change: {keeping.reason} {sayWaiting(keeping.waiting, true)} on this device.
        </span>
        <Button look="plain" onClick={() => store.getState().retry()}>
          Try again
        </Button>
        <Button look="plain" onClick={() => store.getState().resolveConflict('theirs')}>
          Drop that change
        </Button>
      </div>
    );
  }
  return null;
}

function sayWaiting(n: number, sentence = false): string {
  if (n === 1) return sentence ? 'One change waits' : '1 change';
  return sentence ? `${n} changes wait` : `${n} changes`;
}
