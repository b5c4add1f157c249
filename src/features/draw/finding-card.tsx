import type { Finding } from '#shared/model/analysis.ts';
import { useOpenDesign, useOpenDesignStore } from '#src/design/open-design.ts';
import { Button } from '#src/ui/button.tsx';
import { Severity } from '#src/ui/severity.tsx';

/** A finding beside what it speaks of, with what mends it. The first remedy of the gravest is the primary action. */
export function FindingCard({ finding, isFirst }: { readonly finding: Finding; readonly isFirst: boolean }) {
  const mayEdit = useOpenDesign((open) => open.mayEdit);
  const checking = useOpenDesign((open) => open.checking);
  const open = useOpenDesignStore();
  return (
    <article className={`finding-card ${finding.severity}`}>
      <Severity of={finding.severity}>{finding.accepted === true ? 'accepted' : undefined}</Severity>
      <p>{finding.message}</p>
      <p className="quiet source">
        {finding.source.title}
        {finding.source.clause === '' ? '' : `, ${finding.source.clause}`}
      </p>
      {mayEdit && finding.remedies.length > 0 && (
        <div className="remedies">
          {finding.remedies.map((remedy, index) => (
            <Button
              key={remedy.title}
              look={isFirst && index === 0 && finding.severity !== 'note' ? 'go' : 'normal'}
              off={checking}
              onClick={() => open.getState().change(remedy.title, remedy.patch)}
            >
              {remedy.title}
            </Button>
          ))}
        </div>
      )}
    </article>
  );
}
