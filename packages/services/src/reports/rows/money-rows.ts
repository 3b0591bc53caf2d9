import type { FigureRow } from "@withy/contracts/reports";
import { sumPence } from "@withy/core/money";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { invoices, patients, payers, payments, refunds } from "@withy/db/schema";
import { and, asc, count, eq, sql } from "drizzle-orm";
import { unionAll } from "drizzle-orm/mysql-core";
import type { Context } from "../../context";
import { billedWhere, loadCollected, payerKindColumn, receivedWhere, refundedWhere } from "../load-money";
import type { Asked, RowsAnswer } from "./asked";

/** Invoices issued in the month, with their net sums. */
export async function billedRows(ctx: Context, asked: Asked): Promise<RowsAnswer> {
  const where = and(
    billedWhere(ctx, asked.span, [...asked.siteIds]),
    asked.payerKind === undefined ? undefined : eq(payerKindColumn, asked.payerKind),
  );
  const ofPayer = and(eq(payers.practiceId, invoices.practiceId), eq(payers.id, invoices.payerId));
  const [rows, [sums]] = await Promise.all([
    ctx.db
      .select({
        invoice: invoices,
        payerName: payers.name,
        givenName: patients.givenName,
        familyName: patients.familyName,
      })
      .from(invoices)
      .leftJoin(payers, ofPayer)
      .innerJoin(
        patients,
        and(eq(patients.practiceId, invoices.practiceId), eq(patients.id, invoices.patientId)),
      )
      .where(where)
      .orderBy(asc(invoices.number))
      .limit(asked.limit)
      .offset(asked.offset),
    ctx.db
      .select({ n: count(), net: sql<string>`coalesce(sum(${invoices.netPence}), 0)` })
      .from(invoices)
      .leftJoin(payers, ofPayer)
      .where(where),
  ]);
  return {
    rows: rows.map(
      ({ invoice, payerName, givenName, familyName }): FigureRow => ({
        id: invoice.id,
        day: invoice.issuedOn ?? "",
        time: null,
        title: invoice.reference ?? "",
        detail:
          payerName === null ? `${givenName} ${familyName}` : `${givenName} ${familyName}, ${payerName}`,
        minutes: null,
        pence: invoice.netPence,
        opens: { kind: "invoice", id: invoice.id },
      }),
    ),
    total: sums?.n ?? 0,
    sumMinutes: null,
    sumPence: Number(sums?.net ?? 0),
  };
}

const methods: Record<string, string> = {
  cash: "Cash",
  card: "Card by link",
  terminal: "Card terminal",
  bank: "Bank",
};

/** Payments received in the month, and refunds made in it with a minus, in time order. */
export async function collectedRows(ctx: Context, asked: Asked): Promise<RowsAnswer> {
  const siteIds = [...asked.siteIds];
  const received = ctx.db
    .select({
      id: payments.id,
      at: sql`${payments.receivedAt}`.mapWith(payments.receivedAt).as("at"),
      invoiceId: payments.invoiceId,
      method: sql<string>`${payments.method}`.as("method"),
      pence: sql<number>`${payments.amountPence}`.mapWith(Number).as("pence"),
      reference: invoices.reference,
    })
    .from(payments)
    .innerJoin(
      invoices,
      and(eq(invoices.practiceId, payments.practiceId), eq(invoices.id, payments.invoiceId)),
    )
    .where(receivedWhere(ctx, asked.span, siteIds));
  const returned = ctx.db
    .select({
      id: refunds.id,
      at: sql`${refunds.refundedAt}`.mapWith(refunds.refundedAt).as("at"),
      invoiceId: refunds.invoiceId,
      method: sql<string>`${refunds.method}`.as("method"),
      pence: sql<number>`-${refunds.amountPence}`.mapWith(Number).as("pence"),
      reference: invoices.reference,
    })
    .from(refunds)
    .innerJoin(payments, and(eq(payments.practiceId, refunds.practiceId), eq(payments.id, refunds.paymentId)))
    .innerJoin(invoices, and(eq(invoices.practiceId, refunds.practiceId), eq(invoices.id, refunds.invoiceId)))
    .where(refundedWhere(ctx, asked.span, siteIds));
  const [rows, sums] = await Promise.all([
    unionAll(received, returned)
      .orderBy(sql`${sql.identifier("at")}, ${sql.identifier("id")}`)
      .limit(asked.limit)
      .offset(asked.offset),
    loadCollected(ctx, asked.span, siteIds),
  ]);
  return {
    rows: rows.map((row): FigureRow => {
      const at = row.at as Date;
      return {
        id: row.id,
        day: dayOf(at, ctx.zone),
        time: timeOf(at, ctx.zone),
        title: row.pence < 0 ? `Refund, ${row.reference}` : `Payment, ${row.reference}`,
        detail: methods[row.method] ?? row.method,
        minutes: null,
        pence: row.pence,
        opens: { kind: "invoice", id: row.invoiceId },
      };
    }),
    total: sums.payments + sums.refunds,
    sumMinutes: null,
    sumPence: sumPence([sums.pence]),
  };
}
