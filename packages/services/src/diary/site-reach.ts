import { can, sitesWith } from "@withy/core/access/can";
import { notFound } from "@withy/core/errors";
import { sites } from "@withy/db/schema";
import { eq } from "drizzle-orm";
import type { Context } from "../context";

/**
 * The sites whose diary is read: those asked for, each of which must be within reach; or the desk's own site, or
 * every site within reach where the desk's is not.
 */
export async function readableSites(ctx: Context, asked: readonly string[]): Promise<string[]> {
  const ids = [...new Set(asked)];
  for (const id of ids) if (!can(ctx.roles, "diary.read", id)) throw notFound("site");
  if (ids.length > 0) return ids;
  if (can(ctx.roles, "diary.read", ctx.deskSiteId)) return [ctx.deskSiteId];
  return reachableSites(ctx, "diary.read");
}

/** Every site where the person holds the permission. */
export async function reachableSites(
  ctx: Context,
  permission: "diary.read" | "diary.book",
): Promise<string[]> {
  const held = sitesWith(ctx.roles, permission);
  if (held !== "all") return held;
  const rows = await ctx.db.select({ id: sites.id }).from(sites).where(eq(sites.practiceId, ctx.practiceId));
  return rows.map((r) => r.id);
}
