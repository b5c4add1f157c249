import { useEffect } from 'react';

/** The page's name in the tab: `Findings, Minnow · Ampwright`. */
export function usePageTitle(...parts: readonly (string | undefined)[]): void {
  const title = parts.filter((part) => part !== undefined && part !== '').join(', ');
  useEffect(() => {
    document.title = title === '' ? 'Ampwright' : `${title} · Ampwright`;
  }, [title]);
}
