import { type DraftView, listDraftsInput, type ToIssueView } from "@withy/contracts/billing";
import { sitesWith } from "@withy/core/access/can";
import { sumPence } from "@withy/core/money";
import { dayOf } from "@withy/core/zoned-time";
import { appointments, invoiceLines, invoices, patients, payers, sites } from "@withy/db/schema";
import { and, asc, eq, inArray, sql } from "drizzle-orm";
import type { Context } from "../context";
import { findLiveJob } from "../messaging/start-job";
import { verb } from "../verb";
import { draftingView, draftVisitsKind } from "./draft-visits-job";
import { draftingKey } from "./start-drafting";
import { mostVisits, visitsToInvoice } from "./visits-to-invoice";

type Wish = { siteId?: string | undefined; patientId?: string | undefined };

/** What waits to become an invoice: drafts to issue, and attended visits that are on no draft yet. */
export const listToIssue = verb("billing.draft", listDraftsInput, async (ctx, wish): Promise<ToIssueView> => {
  const [drafts, visits, live] = await Promise.all([
    listDrafts(ctx, wish),
    visitsToInvoice(ctx, wish),
    findLiveJob(ctx, draftVisitsKind, draftingKey(ctx, wish)),
  ]);
  return {
    drafts,
    draftsTotalPence: sumPence(drafts.map((d) => d.totalPence)),
    visits: visits.map((v) => ({
      appointmentId: v.appointmentId,
      patientId: v.patientId,
      patientName: v.patientName,
      payerName: v.payerName,
      siteName: v.siteName,
      serviceName: v.serviceName,
      on: v.on,
      pricePence: v.price?.amountPence ?? null,
    })),
    areMoreVisits: visits.length >= mostVisits,
    drafting: live && draftingView(live),
    visitsTotalPence: sumPence(visits.map((v) => v.price?.amountPence ?? 0)),
  };
});

async function listDrafts(ctx: Context, wish: Wish): Promise<DraftView[]> {
  const reach = sitesWith(ctx.roles, "billing.draft");
  if (reach !== "all" && reach.length === 0) return [];
  const rows = await ctx.db
    .select({
      id: invoices.id,
      version: invoices.version,
      totalPence: invoices.totalPence,
      givenName: patients.givenName,
      familyName: patients.familyName,
      payerName: payers.name,
      siteName: sites.name,
      zone: sites.zone,
      visits: sql<string>`count(${appointments.id})`,
      lines: sql<string>`count(${invoiceLines.id})`,
      firstAt: sql<string | null>`min(${appointments.startsAt})`,
      lastAt: sql<string | null>`max(${appointments.startsAt})`,
    })
    .from(invoices)
    .innerJoin(
      patients,
      and(eq(patients.practiceId, invoices.practiceId), eq(patients.id, invoices.patientId)),
    )
    .innerJoin(sites, and(eq(sites.practiceId, invoices.practiceId), eq(sites.id, invoices.siteId)))
    .leftJoin(payers, and(eq(payers.practiceId, invoices.practiceId), eq(payers.id, invoices.payerId)))
    .leftJoin(
      invoiceLines,
      and(eq(invoiceLines.practiceId, invoices.practiceId), eq(invoiceLines.invoiceId, invoices.id)),
    )
    .leftJoin(
      appointments,
      and(
        eq(appointments.practiceId, invoiceLines.practiceId),
        eq(appointments.id, invoiceLines.appointmentId),
      ),
    )
    .where(
      and(
        eq(invoices.practiceId, ctx.practiceId),
        eq(invoices.state, "draft"),
        wish.siteId === undefined ? undefined : eq(invoices.siteId, wish.siteId),
        wish.patientId === undefined ? undefined : eq(invoices.patientId, wish.patientId),
        reach === "all" ? undefined : inArray(invoices.siteId, reach),
      ),
    )
    .groupBy(
      invoices.id,
      invoices.version,
      invoices.totalPence,
      patients.givenName,
      patients.familyName,
      payers.name,
      sites.name,
      sites.zone,
    )
    .orderBy(asc(sql`min(${appointments.startsAt})`), asc(invoices.id));
  return rows.map((row) => ({
    id: row.id,
    version: row.version,
    patientName: `${row.givenName} ${row.familyName}`,
    payerName: row.payerName,
    siteName: row.siteName,
    visits: Number(row.visits),
    items: Number(row.lines) - Number(row.visits),
    firstOn: dayIn(row.firstAt, row.zone),
    lastOn: dayIn(row.lastAt, row.zone),
    totalPence: row.totalPence,
  }));
}

/** An aggregate comes back as the driver has it: a Date, or text in UTC without its zone. */
function dayIn(at: Date | string | null, zone: string): string | null {
  if (at === null) return null;
  return dayOf(at instanceof Date ? at : new Date(`${at.replace(" ", "T")}Z`), zone);
}
