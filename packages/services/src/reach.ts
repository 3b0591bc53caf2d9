import { can } from "@withy/core/access/can";
import type { Permission } from "@withy/core/access/permissions";
import { notFound } from "@withy/core/errors";
import type { Context } from "./context";

/** Refuses as "not found" where the person does not hold the permission at the row's own site. */
export function requireReach(ctx: Context, permission: Permission, siteId: string, what: string): void {
  if (!can(ctx.roles, permission, siteId)) throw notFound(what);
}
