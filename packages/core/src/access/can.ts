import type { Permission } from "./permissions";
import { type Role, rolePermissions } from "./roles";

/** A role as it is held: at one site, or at every site of the practice (null). */
export interface RoleHolding {
  readonly role: Role;
  readonly siteId: string | null;
}

/** The name of a role comes from a row: one that is not in the table allows nothing. */
const allows = (role: Role, permission: Permission): boolean =>
  Object.hasOwn(rolePermissions, role) && rolePermissions[role].includes(permission);

/**
 * Whether these roles allow the permission. With a site: at that site. Without: at any site, which opens a verb
 * but not yet a row (the row's own site is asked for once it is loaded).
 */
export function can(holdings: readonly RoleHolding[], permission: Permission, siteId?: string): boolean {
  return holdings.some(
    (h) => (siteId === undefined || h.siteId === null || h.siteId === siteId) && allows(h.role, permission),
  );
}

/** The sites where these roles allow the permission; "all" where one of them is held everywhere. */
export function sitesWith(holdings: readonly RoleHolding[], permission: Permission): "all" | string[] {
  const allowed = holdings.filter((h) => allows(h.role, permission));
  if (allowed.some((h) => h.siteId === null)) return "all";
  return [...new Set(allowed.flatMap((h) => (h.siteId === null ? [] : [h.siteId])))];
}
