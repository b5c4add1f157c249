import { basisOf, sheetOf } from '#shared/model/defaults.ts';
import type { Design, EntityId } from '#shared/model/design.ts';

import type { TitleBlockFields } from './title-block.tsx';

/** What the document does not know: whose drawing it is, its revision and who signed. */
export interface IssueFacts {
  readonly legalOwner?: string;
  readonly revision?: string;
  readonly created?: string;
  readonly approved?: string;
  /** As written on the sheet: 2026-11-27. */
  readonly issued?: string;
  readonly checked?: string;
  /** Pages in the whole set. */
  readonly pages?: number;
}

export function titleFieldsOf(design: Design, sheetId: EntityId, facts: IssueFacts = {}): TitleBlockFields {
  const sheet = design.sheets[sheetId];
  const full = sheetOf(sheet ?? { id: sheetId });
  const count = Object.keys(design.sheets).length;
  return {
    legalOwner: facts.legalOwner ?? '',
    title: full.title,
    drawingNumber: design.vessel?.drawingNumber ?? '',
    vessel: design.vessel?.name ?? '',
    documentType: `Circuit diagram, ${basisOf(design).profile === 'iso-13297' ? 'ISO 13297' : 'ABYC E-11'}`,
    revision: facts.revision ?? '–',
    sheet: `${full.number} of ${facts.pages ?? count}`,
    created: facts.created ?? '',
    approved: facts.approved ?? '',
    issued: facts.issued ?? '',
    paper: paperName(full.paper),
    checked: facts.checked ?? '',
  };
}

function paperName(paper: string): string {
  return /^[a-z]/.test(paper) ? paper[0]!.toUpperCase() + paper.slice(1) : paper;
}
