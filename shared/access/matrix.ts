/**
 * Who may do what, stated once (server.md, "Roles"). The server asks it at every route, the client to hide what
 * can't be done. A shop admin is a designer on every vessel of the shop.
 */
export const ROLES = ['designer', 'installer', 'reviewer', 'owner'] as const;
export type Role = (typeof ROLES)[number];

/** Rights on one vessel. */
export const VESSEL_RIGHTS = [
  'see-vessel',
  'see-design',
  'see-issued',
  'see-parts',
  'edit-design',
  'issue-revision',
  'manage-vessel',
  'see-people',
] as const;
export type VesselRight = (typeof VESSEL_RIGHTS)[number];

const EVERYONE: readonly Role[] = ROLES;
const TRADE: readonly Role[] = ['designer', 'installer', 'reviewer'];

const MAY: Readonly<Record<VesselRight, readonly Role[]>> = {
  'see-vessel': EVERYONE,
  'see-design': TRADE,
  'see-issued': EVERYONE,
  'see-parts': TRADE,
  'edit-design': ['designer'],
  'issue-revision': ['designer'],
  'manage-vessel': ['designer'],
  'see-people': TRADE,
};

/** Rights in a shop. */
export const SHOP_RIGHTS = ['make-vessel', 'manage-people'] as const;
export type ShopRight = (typeof SHOP_RIGHTS)[number];

export function may(role: Role | undefined, right: VesselRight): boolean {
  return role !== undefined && MAY[right].includes(role);
}

/** Anyone of the shop may make a vessel and is its designer then; people are the admin's. */
export function mayInShop(member: { readonly admin: boolean } | undefined, right: ShopRight): boolean {
  if (member === undefined) return false;
  return right === 'make-vessel' || member.admin;
}
