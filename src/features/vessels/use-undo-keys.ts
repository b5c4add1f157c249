import { useEffect } from 'react';

import { useOpenDesignStore } from '#src/design/open-design.ts';

/** Undo and redo by keyboard on the pages around the drawing; the drawing screen has keys of its own. */
export function useUndoKeys(isOn: boolean): void {
  const store = useOpenDesignStore();
  useEffect(() => {
    if (!isOn) return;
    function handleKey(event: KeyboardEvent) {
      if (event.defaultPrevented || !(event.ctrlKey || event.metaKey) || event.altKey) return;
      const key = event.key.toLowerCase();
      if (key === 's') {
        // Everything is saved as it is changed; the browser's own page saving would only be in the way.
        event.preventDefault();
        return;
      }
      const { mayEdit, undo, redo } = store.getState();
      if (!mayEdit || hasKeysOfItsOwn(event.target)) return;
      if (key === 'y' || (key === 'z' && event.shiftKey)) redo();
      else if (key === 'z') undo();
      else return;
      event.preventDefault();
    }
    document.addEventListener('keydown', handleKey);
    return () => document.removeEventListener('keydown', handleKey);
  }, [store, isOn]);
}

/** A text that is being typed is taken back letter by letter, until it is kept; a dialog or a menu is answered first. */
function hasKeysOfItsOwn(target: EventTarget | null): boolean {
  if (!(target instanceof Element)) return false;
  if (target.closest('[role="dialog"], [role="menu"]') !== null) return true;
  if (target instanceof HTMLTextAreaElement) return true;
  return target instanceof HTMLInputElement && target.type !== 'checkbox' && target.dataset['kept'] === undefined;
}
