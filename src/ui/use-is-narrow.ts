import { useSyncExternalStore } from 'react';

/** Whether the window is at most this wide: for what is laid out otherwise there, not only styled. */
export function useIsNarrow(mostPx: number): boolean {
  const query = `(max-width: ${mostPx}px)`;
  return useSyncExternalStore(
    (listener) => {
      const list = matchMedia(query);
      list.addEventListener('change', listener);
      return () => list.removeEventListener('change', listener);
    },
    () => matchMedia(query).matches,
  );
}
