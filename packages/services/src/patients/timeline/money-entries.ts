import type { InvoiceEntry, PaymentEntry } from "@withy/contracts/patients";
import { sitesWith } from "@withy/core/access/can";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { invoices, payments } from "@withy/db/schema";
import { and, desc, eq, isNotNull } from "drizzle-orm";
import type { Context } from "../../context";
import { atSites } from "../patient-counts";
import { olderThan, type Slice } from "./cursor";

const moment = (ctx: Context, at: Date) => ({
  at: at.toISOString(),
  day: dayOf(at, ctx.zone),
  time: timeOf(at, ctx.zone),
});

/** Issued invoices, at the moment of issue. */
export async function invoiceEntries(
  ctx: Context,
  { patientId, before, limit }: Slice,
): Promise<InvoiceEntry[]> {
  const rows = await ctx.db
    .select()
    .from(invoices)
    .where(
      and(
        eq(invoices.practiceId, ctx.practiceId),
        eq(invoices.patientId, patientId),
        isNotNull(invoices.issuedAt),
        olderThan(invoices.issuedAt, invoices.id, before),
        ...atSites(invoices.siteId, sitesWith(ctx.roles, "billing.read")),
      ),
    )
    .orderBy(desc(invoices.issuedAt), desc(invoices.id))
    .limit(limit);
  return rows.flatMap((row) =>
    row.issuedAt === null
      ? []
      : [
          {
            kind: "invoice",
            id: row.id,
            ...moment(ctx, row.issuedAt),
            reference: row.reference ?? "",
            state: row.state,
            totalPence: row.totalPence,
          },
        ],
  );
}

/** Money received for the patient's invoices. */
export async function paymentEntries(
  ctx: Context,
  { patientId, before, limit }: Slice,
): Promise<PaymentEntry[]> {
  const rows = await ctx.db
    .select({ payment: payments, reference: invoices.reference })
    .from(payments)
    .innerJoin(
      invoices,
      and(eq(invoices.practiceId, payments.practiceId), eq(invoices.id, payments.invoiceId)),
    )
    .where(
      and(
        eq(payments.practiceId, ctx.practiceId),
        eq(invoices.patientId, patientId),
        olderThan(payments.receivedAt, payments.id, before),
        ...atSites(invoices.siteId, sitesWith(ctx.roles, "billing.read")),
      ),
    )
    .orderBy(desc(payments.receivedAt), desc(payments.id))
    .limit(limit);
  return rows.map(({ payment, reference }) => ({
    kind: "payment",
    id: payment.id,
    ...moment(ctx, payment.receivedAt),
    invoiceId: payment.invoiceId,
    reference: reference ?? "",
    method: payment.method,
    amountPence: payment.amountPence,
  }));
}
