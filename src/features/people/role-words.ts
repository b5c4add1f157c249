import type { Role } from '#shared/access/matrix.ts';

/** The matrix of rights as sentences, for those who give a role. */
export const ROLE_WORDS: Readonly<Record<Role, string>> = {
  designer: 'draws, changes the basis, issues revisions, brings people on and takes them off',
  installer: 'reads the drawing as it stands, the findings, the parts and the prints',
  reviewer: 'reads the drawing as it stands, the findings, the parts and the prints',
  owner: 'reads what was issued, and nothing that is still being drawn',
};
