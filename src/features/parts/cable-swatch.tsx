import { runColour } from '#shared/layout/run-colour.ts';
import type { PartsLine } from '#shared/model/analysis.ts';
import type { Design } from '#shared/model/design.ts';

/** The colour of the cable as it is drawn; its name stands beside it in words. */
export function CableSwatch({ design, line }: { readonly design: Design; readonly line: PartsLine }) {
  const [base, stripe] = coloursOf(design, line);
  if (base === undefined) return null;
  return (
    <i
      className="swatch"
      aria-hidden="true"
      style={{
        background:
          stripe === undefined
            ? `var(--c-${base})`
            : `repeating-linear-gradient(90deg, var(--c-${base}) 0 6px, var(--c-${stripe}) 6px 9px)`,
      }}
    />
  );
}

export function coloursOf(design: Design, line: PartsLine): readonly string[] {
  const run = design.runs[line.runs[0] ?? ''];
  return run === undefined ? [] : runColour(design, run).split('/');
}
