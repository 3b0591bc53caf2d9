import { sitesWith } from "@withy/core/access/can";
import { notFound } from "@withy/core/errors";
import { sites } from "@withy/db/schema";
import { and, asc, eq, inArray } from "drizzle-orm";
import type { Context } from "../context";

export type ReportSite = typeof sites.$inferSelect;

export interface ReportSites {
  /** Every site whose figures the person may read. */
  readonly readable: readonly ReportSite[];
  /** The one asked for, or all of them. */
  readonly chosen: readonly ReportSite[];
}

/** The sites that a report covers. A site out of reach is not found. */
export async function reportSites(ctx: Context, siteId: string | undefined): Promise<ReportSites> {
  const held = sitesWith(ctx.roles, "reports.read");
  const readable = await ctx.db
    .select()
    .from(sites)
    .where(and(eq(sites.practiceId, ctx.practiceId), held === "all" ? undefined : inArray(sites.id, held)))
    .orderBy(asc(sites.position));
  if (siteId === undefined) return { readable, chosen: readable };
  const chosen = readable.filter((site) => site.id === siteId);
  if (chosen.length === 0) throw notFound("site");
  return { readable, chosen };
}
