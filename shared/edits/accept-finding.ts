import type { Accepted, Design } from '#shared/model/design.ts';

import { remove, set, type Edit } from './edit.ts';

/** A finding answered for by a person, with the reason; it stays in the list. */
export function acceptFinding(findingId: string, accepted: Accepted): Edit {
  return { label: 'Accept a finding', patches: [set(['accepted', findingId], accepted)] };
}

export function withdrawAcceptance(design: Design, findingId: string): Edit {
  const isThere = Object.hasOwn(design.accepted ?? {}, findingId);
  return { label: 'Withdraw an acceptance', patches: isThere ? [remove(['accepted', findingId])] : [] };
}
