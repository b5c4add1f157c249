import type { ReactNode } from 'react';

/** An empty list says what would stand here and offers the next step. */
export function EmptyState({
  title,
  children,
  does,
}: {
  readonly title: string;
  readonly children?: ReactNode;
  readonly does?: ReactNode;
}) {
  return (
    <section className="empty">
      <h2>{title}</h2>
      {children !== undefined && <p>{children}</p>}
      {does !== undefined && <div className="does">{does}</div>}
    </section>
  );
}
