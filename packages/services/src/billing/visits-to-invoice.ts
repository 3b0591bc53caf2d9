import { choosePrice, type Price } from "@withy/billing/prices";
import { sitesWith } from "@withy/core/access/can";
import { addMinutes, dayOf } from "@withy/core/zoned-time";
import {
  appointments,
  invoiceLines,
  patientPayers,
  patients,
  payers,
  prices,
  services,
  sites,
} from "@withy/db/schema";
import { and, asc, desc, eq, gte, inArray, isNull } from "drizzle-orm";
import type { Context } from "../context";

export interface VisitToInvoice {
  readonly appointmentId: string;
  readonly patientId: string;
  readonly patientName: string;
  readonly payerId: string | null;
  readonly payerName: string | null;
  readonly siteId: string;
  readonly siteName: string;
  readonly serviceName: string;
  readonly minutes: number;
  readonly on: string;
  readonly price: Price | null;
}

/** How far back visits are looked for: a year-old visit is a question for a person, not for a list. */
const daysBack = 180;

/** The most visits that one list shows; the oldest come first, the rest once these are drafted. */
export const mostVisits = 1000;

export type PricedVisit = VisitToInvoice & { readonly price: Price };

/** A visit without a price waits for a person, and is never drafted. */
export const hasPrice = (visit: VisitToInvoice): visit is PricedVisit => visit.price !== null;

/** The practice's price list in the shape that the rule takes. */
export async function loadPrices(ctx: Context): Promise<Price[]> {
  const rows = await ctx.db.select().from(prices).where(eq(prices.practiceId, ctx.practiceId));
  return rows.map((row) => ({ ...row, itemId: row.serviceId ?? row.productId ?? "" }));
}

/**
 * Attended visits that stand on no invoice, oldest first, each with the price that held on its day.
 * @param most how many at most; null for every one
 */
export async function visitsToInvoice(
  ctx: Context,
  wish: { patientId?: string | undefined; siteId?: string | undefined },
  most: number | null = mostVisits,
): Promise<VisitToInvoice[]> {
  const reach = sitesWith(ctx.roles, "billing.draft");
  if (reach !== "all" && reach.length === 0) return [];
  const query = ctx.db
    .select({
      appointmentId: appointments.id,
      startsAt: appointments.startsAt,
      patientId: appointments.patientId,
      givenName: patients.givenName,
      familyName: patients.familyName,
      payerId: payers.id,
      payerName: payers.name,
      siteId: sites.id,
      siteName: sites.name,
      zone: sites.zone,
      serviceId: services.id,
      serviceName: services.name,
      minutes: services.durationMinutes,
    })
    .from(appointments)
    .innerJoin(
      patients,
      and(eq(patients.practiceId, appointments.practiceId), eq(patients.id, appointments.patientId)),
    )
    .innerJoin(sites, and(eq(sites.practiceId, appointments.practiceId), eq(sites.id, appointments.siteId)))
    .innerJoin(
      services,
      and(eq(services.practiceId, appointments.practiceId), eq(services.id, appointments.serviceId)),
    )
    .leftJoin(
      invoiceLines,
      and(
        eq(invoiceLines.practiceId, appointments.practiceId),
        eq(invoiceLines.appointmentId, appointments.id),
      ),
    )
    .leftJoin(
      patientPayers,
      and(
        eq(patientPayers.practiceId, appointments.practiceId),
        eq(patientPayers.patientId, appointments.patientId),
        eq(patientPayers.isCurrent, true),
      ),
    )
    .leftJoin(
      payers,
      and(eq(payers.practiceId, patientPayers.practiceId), eq(payers.id, patientPayers.payerId)),
    )
    .where(
      and(
        eq(appointments.practiceId, ctx.practiceId),
        eq(appointments.state, "fulfilled"),
        gte(appointments.startsAt, addMinutes(ctx.clock.now(), -daysBack * 1440)),
        isNull(invoiceLines.id),
        wish.patientId === undefined ? undefined : eq(appointments.patientId, wish.patientId),
        wish.siteId === undefined ? undefined : eq(appointments.siteId, wish.siteId),
        reach === "all" ? undefined : inArray(appointments.siteId, reach),
      ),
    )
    .orderBy(asc(appointments.startsAt), asc(appointments.id), desc(patientPayers.createdAt));
  const rows = await (most === null ? query : query.limit(most));
  const list = await loadPrices(ctx);
  const seen = new Set<string>();
  return rows.flatMap((row) => {
    // Two payers marked as current: the one added last pays.
    if (seen.has(row.appointmentId)) return [];
    seen.add(row.appointmentId);
    const on = dayOf(row.startsAt, row.zone);
    const price = choosePrice(list, { itemId: row.serviceId, siteId: row.siteId, payerId: row.payerId, on });
    return [{ ...row, patientName: `${row.givenName} ${row.familyName}`, on, price }];
  });
}
