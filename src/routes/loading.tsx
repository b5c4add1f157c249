import { useEffect, useState } from 'react';

/** Nothing for 300 ms, then a word; no spinner. */
export function Loading({ what }: { readonly what: string }) {
  const [isLong, setIsLong] = useState(false);
  useEffect(() => {
    const timer = setTimeout(() => setIsLong(true), 300);
    return () => clearTimeout(timer);
  }, []);
  return (
    <main className="page-plain" aria-busy="true">
      {isLong && (
        <p className="p-6 quiet" role="status">
          {what}
        </p>
      )}
    </main>
  );
}
