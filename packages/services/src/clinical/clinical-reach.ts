import { can } from "@withy/core/access/can";
import type { Permission } from "@withy/core/access/permissions";
import { notFound } from "@withy/core/errors";
import type { Context } from "../context";

/**
 * Refuses as "not found" unless the person holds the permission at one of these sites: that of the episode, or that
 * of the visit where someone else's clinic gave cover.
 */
export function requireClinicalReach(
  ctx: Context,
  permission: Permission,
  siteIds: readonly (string | null)[],
  what: string,
): void {
  if (!siteIds.some((siteId) => siteId !== null && can(ctx.roles, permission, siteId))) throw notFound(what);
}
