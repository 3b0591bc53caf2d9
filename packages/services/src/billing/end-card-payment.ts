import type { CheckoutReport } from "@withy/billing/card/card-gateway";
import { newId } from "@withy/core/ids";
import { cardAttempts, invoices, payments, practices } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { SystemContext } from "../context";
import { loadRecord } from "../load-record";
import { inTransaction } from "../transaction";
import { changeInvoiceSums } from "./change-invoice-sums";
import { type InvoiceRow, sumsOf } from "./load-invoice";

type AttemptRow = typeof cardAttempts.$inferSelect;
type AttemptKey = Pick<AttemptRow, "practiceId" | "id">;

/** The provider took another sum than was asked for: nothing may be posted until a person has looked. */
export class CardMismatch extends Error {
  constructor(readonly cardPaymentId: string) {
    super("The card provider reports another amount than was asked for.");
    this.name = "CardMismatch";
  }
}

/**
 * Ends a card payment by what the provider reports: paid becomes one payment, expired lets go of the amount that was
 * held, open leaves all as it is. Any number of calls, in any order, end it once.
 */
export async function settleCardPayment(
  ctx: SystemContext,
  key: AttemptKey,
  report: CheckoutReport,
): Promise<void> {
  if (report.status === "open" || report.status === "unpaid") return;
  if (report.status === "expired") return endCardPayment(ctx, key, "expired");
  await inTransaction(ctx, async (tx) => {
    const open = await lockOpen(tx, key);
    if (!open) return;
    const { attempt, invoice } = open;
    const currency = await currencyOf(tx, key.practiceId);
    if (report.amountPence !== attempt.amountPence || report.currency !== currency)
      throw new CardMismatch(attempt.id);
    const sums = sumsOf(invoice);
    const id = newId();
    await tx.db.insert(payments).values({
      practiceId: attempt.practiceId,
      id,
      invoiceId: invoice.id,
      siteId: invoice.siteId,
      method: "card",
      amountPence: attempt.amountPence,
      cardAttemptId: attempt.id,
      receivedAt: tx.clock.now(),
    });
    await changeInvoiceSums(tx, invoice, {
      ...sums,
      paidPence: sums.paidPence + attempt.amountPence,
      pendingPence: sums.pendingPence - attempt.amountPence,
    });
    await closeAttempt(tx, attempt, {
      state: "paid",
      sessionReference: report.checkoutId,
      paymentReference: report.paymentRef,
    });
    await audit(tx, attempt, invoice, "payment.taken", { paymentId: id, method: "card" });
  });
}

/** Ends a card payment without money and lets go of the amount that it held. */
export async function endCardPayment(
  ctx: SystemContext,
  key: AttemptKey,
  state: "failed" | "expired",
): Promise<void> {
  await inTransaction(ctx, async (tx) => {
    const open = await lockOpen(tx, key);
    if (!open) return;
    const { attempt, invoice } = open;
    const sums = sumsOf(invoice);
    await changeInvoiceSums(tx, invoice, { ...sums, pendingPence: sums.pendingPence - attempt.amountPence });
    await closeAttempt(tx, attempt, { state });
    await audit(tx, attempt, invoice, "card-payment.ended", { state });
  });
}

/** The invoice is locked before the attempt, as everywhere else, so that two ways of ending cannot lock each other. */
async function lockOpen(
  tx: SystemContext,
  key: AttemptKey,
): Promise<{ attempt: AttemptRow; invoice: InvoiceRow } | null> {
  const within = { db: tx.db, practiceId: key.practiceId };
  const { invoiceId } = await loadRecord(within, cardAttempts, key.id, "card payment");
  const invoice = await loadRecord(within, invoices, invoiceId, "invoice", { lock: true });
  const attempt = await loadRecord(within, cardAttempts, key.id, "card payment", { lock: true });
  return attempt.state === "asked" || attempt.state === "open" ? { attempt, invoice } : null;
}

async function closeAttempt(tx: SystemContext, attempt: AttemptRow, set: Partial<AttemptRow>): Promise<void> {
  await tx.db
    .update(cardAttempts)
    .set({ ...set, settledAt: tx.clock.now() })
    .where(and(eq(cardAttempts.practiceId, attempt.practiceId), eq(cardAttempts.id, attempt.id)));
}

async function currencyOf(tx: SystemContext, practiceId: string): Promise<string | undefined> {
  const [row] = await tx.db
    .select({ currency: practices.currency })
    .from(practices)
    .where(eq(practices.id, practiceId));
  return row?.currency;
}

async function audit(
  tx: SystemContext,
  attempt: AttemptRow,
  invoice: InvoiceRow,
  action: string,
  detail: Record<string, unknown>,
): Promise<void> {
  await recordAudit(
    { ...tx, practiceId: attempt.practiceId },
    {
      action,
      subjectKind: "invoice",
      subjectId: invoice.id,
      patientId: invoice.patientId,
      siteId: invoice.siteId,
      detail: { cardPaymentId: attempt.id, amountPence: attempt.amountPence, ...detail },
    },
  );
}
