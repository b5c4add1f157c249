import type { ReactNode } from 'react';

/** A key's name beside what it does; read by eye only, the action itself tells screen readers. */
export function Kbd({ children }: { readonly children: ReactNode }) {
  return (
    <kbd className="kbd" aria-hidden="true">
      {children}
    </kbd>
  );
}
