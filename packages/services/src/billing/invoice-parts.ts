import type { VatTreatment } from "@withy/billing/vat";
import type { InvoiceLineView, OpenCardPaymentView, PaymentView, RefundView } from "@withy/contracts/billing";
import { dayOf, timeOf } from "@withy/core/zoned-time";
import { appointments, cardAttempts, invoiceLines, payments, refunds, staffMembers } from "@withy/db/schema";
import { and, asc, eq, inArray } from "drizzle-orm";
import type { Context } from "../context";
import type { InvoiceRow } from "./load-invoice";

export interface LinesAndTherapists {
  readonly lines: readonly InvoiceLineView[];
  readonly treatedBy: readonly string[];
}

/** An invoice's lines in order, and who treated: a name with its registration, each once. */
export async function linesOf(ctx: Context, invoice: InvoiceRow, zone: string): Promise<LinesAndTherapists> {
  const rows = await ctx.db
    .select({ line: invoiceLines, startsAt: appointments.startsAt, therapist: staffMembers })
    .from(invoiceLines)
    .leftJoin(
      appointments,
      and(
        eq(appointments.practiceId, invoiceLines.practiceId),
        eq(appointments.id, invoiceLines.appointmentId),
      ),
    )
    .leftJoin(
      staffMembers,
      and(
        eq(staffMembers.practiceId, appointments.practiceId),
        eq(staffMembers.id, appointments.therapistId),
      ),
    )
    .where(and(eq(invoiceLines.practiceId, ctx.practiceId), eq(invoiceLines.invoiceId, invoice.id)))
    .orderBy(asc(invoiceLines.position));
  const treatedBy = rows.flatMap(({ therapist }) => {
    if (!therapist) return [];
    const registration =
      therapist.registrationNumber === null ? "" : `, HCPC ${therapist.registrationNumber}`;
    return [`${therapist.givenName} ${therapist.familyName}, ${therapist.jobTitle}${registration}`];
  });
  const lines = rows.map(({ line, startsAt }): InvoiceLineView => {
    const { id, kind, appointmentId, productId, description, quantity, unitPence, discountBasisPoints } =
      line;
    const { netPence, vatPence, totalPence } = line;
    const vatTreatment = line.vatTreatment as VatTreatment;
    const on = startsAt === null ? invoice.issuedOn : dayOf(startsAt, zone);
    const what = {
      id,
      kind,
      appointmentId,
      productId,
      on,
      description,
      quantity,
      unitPence,
      discountBasisPoints,
    };
    return { ...what, vatTreatment, netPence, vatPence, totalPence };
  });
  return { lines, treatedBy: [...new Set(treatedBy)] };
}

export async function paymentsOf(ctx: Context, invoice: InvoiceRow, zone: string): Promise<PaymentView[]> {
  const rows = await ctx.db
    .select()
    .from(payments)
    .where(and(eq(payments.practiceId, ctx.practiceId), eq(payments.invoiceId, invoice.id)))
    .orderBy(asc(payments.receivedAt), asc(payments.id));
  return rows.map(({ id, method, amountPence, refundedPence, reference, receivedAt }) => {
    return { id, method, amountPence, refundedPence, reference, on: dayOf(receivedAt, zone) };
  });
}

export async function refundsOf(ctx: Context, invoice: InvoiceRow, zone: string): Promise<RefundView[]> {
  const rows = await ctx.db
    .select()
    .from(refunds)
    .where(and(eq(refunds.practiceId, ctx.practiceId), eq(refunds.invoiceId, invoice.id)))
    .orderBy(asc(refunds.refundedAt), asc(refunds.id));
  return rows.map(({ id, paymentId, method, amountPence, reason, isOwedAgain, state, refundedAt }) => {
    return { id, paymentId, method, amountPence, reason, isOwedAgain, state, on: dayOf(refundedAt, zone) };
  });
}

/** The card payment that still holds money on this invoice; the newest, should there be two. */
export async function openCardPaymentOf(
  ctx: Context,
  invoice: InvoiceRow,
  zone: string,
): Promise<OpenCardPaymentView | null> {
  const rows = await ctx.db
    .select()
    .from(cardAttempts)
    .where(
      and(
        eq(cardAttempts.practiceId, ctx.practiceId),
        eq(cardAttempts.invoiceId, invoice.id),
        inArray(cardAttempts.state, ["asked", "open"]),
      ),
    )
    .orderBy(asc(cardAttempts.startedAt));
  const row = rows.at(-1);
  return row ? { id: row.id, amountPence: row.amountPence, startedTime: timeOf(row.startedAt, zone) } : null;
}
