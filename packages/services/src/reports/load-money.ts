import type { PayerKind } from "@withy/contracts/reports";
import { sumPence } from "@withy/core/money";
import { invoices, payers, payments, refunds } from "@withy/db/schema";
import { and, between, count, eq, gte, inArray, lt, notInArray, type SQL, sql } from "drizzle-orm";
import type { Context } from "../context";
import type { MonthSpan } from "./month-span";

export interface BilledRow {
  readonly kind: PayerKind;
  readonly invoices: number;
  readonly netPence: number;
}

/** Invoices that count as billed: issued in the month and not made void since. */
export function billedWhere(ctx: Context, span: MonthSpan, siteIds: string[]): SQL | undefined {
  return and(
    eq(invoices.practiceId, ctx.practiceId),
    between(invoices.issuedOn, span.firstOn, span.lastOn),
    notInArray(invoices.state, ["draft", "void"]),
    inArray(invoices.siteId, siteIds),
  );
}

/** Whose money it is: the patient's own, or the kind of payer. */
export const payerKindColumn = sql<PayerKind>`coalesce(${payers.kind}, 'patient')`;

export async function loadBilled(ctx: Context, span: MonthSpan, siteIds: string[]): Promise<BilledRow[]> {
  const rows = await ctx.db
    .select({ kind: payerKindColumn, invoices: count(), net: sql<string>`sum(${invoices.netPence})` })
    .from(invoices)
    .leftJoin(payers, and(eq(payers.practiceId, invoices.practiceId), eq(payers.id, invoices.payerId)))
    .where(billedWhere(ctx, span, siteIds))
    .groupBy(payerKindColumn);
  return rows.map((row) => ({ kind: row.kind, invoices: row.invoices, netPence: Number(row.net) }));
}

export function receivedWhere(ctx: Context, span: MonthSpan, siteIds: string[]): SQL | undefined {
  return and(
    eq(payments.practiceId, ctx.practiceId),
    gte(payments.receivedAt, span.from),
    lt(payments.receivedAt, span.to),
    inArray(payments.siteId, siteIds),
  );
}

export function refundedWhere(ctx: Context, span: MonthSpan, siteIds: string[]): SQL | undefined {
  return and(
    eq(refunds.practiceId, ctx.practiceId),
    eq(refunds.state, "done"),
    gte(refunds.refundedAt, span.from),
    lt(refunds.refundedAt, span.to),
    inArray(payments.siteId, siteIds),
  );
}

/** Money received in the month less money given back in it. */
export async function loadCollected(ctx: Context, span: MonthSpan, siteIds: string[]) {
  const [[received], [returned]] = await Promise.all([
    ctx.db
      .select({ n: count(), pence: sql<string>`coalesce(sum(${payments.amountPence}), 0)` })
      .from(payments)
      .where(receivedWhere(ctx, span, siteIds)),
    ctx.db
      .select({ n: count(), pence: sql<string>`coalesce(sum(${refunds.amountPence}), 0)` })
      .from(refunds)
      .innerJoin(
        payments,
        and(eq(payments.practiceId, refunds.practiceId), eq(payments.id, refunds.paymentId)),
      )
      .where(refundedWhere(ctx, span, siteIds)),
  ]);
  return {
    pence: sumPence([Number(received?.pence ?? 0), -Number(returned?.pence ?? 0)]),
    payments: received?.n ?? 0,
    refunds: returned?.n ?? 0,
  };
}
