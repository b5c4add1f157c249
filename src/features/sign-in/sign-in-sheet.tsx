import type { ReactNode } from 'react';

import { Wordmark } from '#src/ui/wordmark.tsx';

import { LampCircuit } from './lamp-circuit.tsx';

/** The sheet that stands before sign-in: a lamp whose switch is open, a form, a title block. Nothing of a shop. */
export function SignInSheet({
  title,
  lit = false,
  children,
}: {
  readonly title: string;
  /** The switch is closed: someone has just signed in. */
  readonly lit?: boolean;
  readonly children: ReactNode;
}) {
  return (
    <main className="gate" data-profile="abyc-e11">
      <div className="gate-sheet">
        <LampCircuit closed={lit} />
        <div className="gate-name">
          <Wordmark className="gate-wordmark" />
          <p>The electrical system of a boat: drawn, proved, bought, printed, built and handed over.</p>
        </div>
        <section className="gate-form" aria-labelledby="gate-title">
          <h1 id="gate-title">{title}</h1>
          {children}
        </section>
        <dl className="gate-block" aria-hidden="true">
          <Field caption="Drawn with">Ampwright</Field>
          <Field caption="Title">{title}</Field>
          <Field caption="Kept at">this server, nowhere else</Field>
          <Field caption="Date">{today()}</Field>
          <Field caption="Caution">a design aid</Field>
          <Field caption="Sheet">1 of 1</Field>
        </dl>
      </div>
    </main>
  );
}

function Field({ caption, children }: { readonly caption: string; readonly children: ReactNode }) {
  return (
    <div>
      <dt>{caption}</dt>
      <dd>{children}</dd>
    </div>
  );
}

function today(): string {
  return new Date().toLocaleDateString('en-GB', { day: 'numeric', month: 'short', year: 'numeric' });
}
