import { useState } from 'react';

import type { Revision } from '#shared/api/design.ts';
import { useOpenDesign } from '#src/design/open-design.ts';
import { nameOfSheet, SheetPicture, sheetsInOrder } from '#src/design/sheet-picture.tsx';
import { Button } from '#src/ui/button.tsx';
import { Severity } from '#src/ui/severity.tsx';
import { Tabs } from '#src/ui/tabs.tsx';

/** The sheets of a frozen revision, to read and to print; nothing here can be changed. */
export function RevisionSheets({ revision, shopName }: { readonly revision: Revision; readonly shopName: string }) {
  const design = useOpenDesign((open) => open.design);
  const analysis = useOpenDesign((open) => open.analysis);
  const sheets = sheetsInOrder(design);
  const [chosen, setChosen] = useState(sheets[0]?.id ?? '');
  const [isLarge, setIsLarge] = useState(false);
  const musts = analysis?.findings.filter((f) => f.severity === 'must' && f.accepted !== true).length ?? 0;

  return (
    <div className="revision-view">
      <div className="revision-bar">
        {analysis === null ? (
          <span className="quiet">Checking</span>
        ) : musts === 0 ? (
          <Severity of="good">no must-fix</Severity>
        ) : (
          <>
            <Severity of="must">{musts} must fix</Severity>
            <span>In review, not for building.</span>
          </>
        )}
        <Button onClick={() => setIsLarge(!isLarge)} aria-pressed={isLarge}>
          {isLarge ? 'Whole sheet' : 'Larger'}
        </Button>
      </div>
      <div className="revision-stage" id="revision-sheet" role="tabpanel" aria-label="The sheet" tabIndex={0}>
        <SheetPicture
          className={isLarge ? 'revision-sheet large' : 'revision-sheet'}
          design={design}
          sheetId={chosen}
          inReview={musts > 0}
          facts={{
            legalOwner: shopName,
            revision: revision.letter,
            created: revision.issuedBy,
            issued: revision.issuedAt.slice(0, 10),
          }}
        />
      </div>
      <Tabs
        label="Sheets"
        panelId="revision-sheet"
        tabs={sheets.map((sheet) => ({ id: sheet.id, title: nameOfSheet(sheet) }))}
        current={chosen}
        onChoose={setChosen}
      />
    </div>
  );
}
