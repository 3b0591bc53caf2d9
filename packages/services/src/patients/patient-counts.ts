import type { PatientView } from "@withy/contracts/patients";
import { sitesWith } from "@withy/core/access/can";
import type { Permission } from "@withy/core/access/permissions";
import { auditEvents, episodes, invoices, letters, measureRecords } from "@withy/db/schema";
import { and, count, countDistinct, eq, exists, inArray, isNull, ne, type SQL, sql } from "drizzle-orm";
import type { MySqlColumn, MySqlTable } from "drizzle-orm/mysql-core";
import type { Context } from "../context";

type PatientsTable = MySqlTable & { practiceId: MySqlColumn; patientId: MySqlColumn };

/** How many rows stand behind each tab of the record, of those that the person may open. */
export async function rowCounts(ctx: Context, patientId: string): Promise<PatientView["counts"]> {
  const of = async (
    permission: Permission,
    table: PatientsTable,
    where: (sites: string[] | "all") => SQL[],
  ) => {
    const allowed = sitesWith(ctx.roles, permission);
    if (allowed !== "all" && allowed.length === 0) return null;
    const [row] = await ctx.db
      .select({ n: count() })
      .from(table)
      .where(and(eq(table.practiceId, ctx.practiceId), eq(table.patientId, patientId), ...where(allowed)));
    return row?.n ?? 0;
  };
  const [ofEpisodes, ofMeasures, ofLetters, ofInvoices] = await Promise.all([
    of("clinical.read", episodes, (at) => atSites(episodes.siteId, at)),
    of("clinical.read", measureRecords, (at) => [
      isNull(measureRecords.replacedBy),
      ...throughEpisode(ctx, measureRecords.episodeId, at),
    ]),
    of("letters.read", letters, (at) => throughEpisode(ctx, letters.episodeId, at)),
    of("billing.read", invoices, (at) => [ne(invoices.state, "draft"), ...atSites(invoices.siteId, at)]),
  ]);
  return { episodes: ofEpisodes, measures: ofMeasures, letters: ofLetters, invoices: ofInvoices };
}

/** How many people have opened the record. */
export async function lookedAtBy(ctx: Context, patientId: string): Promise<number> {
  const [row] = await ctx.db
    .select({ n: countDistinct(auditEvents.actorId) })
    .from(auditEvents)
    .where(and(eq(auditEvents.practiceId, ctx.practiceId), eq(auditEvents.patientId, patientId)));
  return row?.n ?? 0;
}

/** Rows at these sites; nothing to ask where the role is held everywhere. */
export function atSites(siteId: MySqlColumn, allowed: string[] | "all"): SQL[] {
  return allowed === "all" ? [] : [inArray(siteId, allowed)];
}

/** Rows whose episode of care is at these sites. */
export function throughEpisode(ctx: Context, episodeId: MySqlColumn, allowed: string[] | "all"): SQL[] {
  if (allowed === "all") return [];
  const episode = ctx.db
    .select({ one: sql`1` })
    .from(episodes)
    .where(
      and(
        eq(episodes.practiceId, ctx.practiceId),
        eq(episodes.id, episodeId),
        inArray(episodes.siteId, allowed),
      ),
    );
  return [exists(episode)];
}
