import { CardGatewayError } from "@withy/billing/card/card-gateway";
import { checkRefund } from "@withy/billing/check-refund";
import { afterRefund } from "@withy/billing/invoice-balance";
import { type InvoiceView, refundIdInput, refundPaymentInput } from "@withy/contracts/billing";
import { refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { cardAttempts, payments, refunds } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { cardGateway, cardProblem } from "./card-gateway";
import { changeInvoiceSums } from "./change-invoice-sums";
import { viewInvoice } from "./get-invoice";
import { type InvoiceRow, loadInvoice, sumsOf } from "./load-invoice";

type RefundRow = typeof refunds.$inferSelect;
type RefundInput = Parameters<typeof checkRefund>[1] & { paymentId: string; isOwedAgain: boolean };

/**
 * Gives money back from one payment, never more than was paid. Cash and the like are done at once; a card is asked
 * first: the refund is written and its amount held before the provider is called.
 */
export const refundPayment = verb(
  "billing.refund",
  refundPaymentInput,
  async (ctx, input): Promise<InvoiceView> => {
    const { id } = await once(ctx, "billing.refund-payment", (tx) => holdRefund(tx, input));
    return giveBack(ctx, id);
  },
);

/** Asks the card provider again for a refund that it has not answered; under the same key, so it is given once. */
export const retryRefund = verb("billing.refund", refundIdInput, (ctx, input) =>
  giveBack(ctx, input.refundId),
);

async function holdRefund(tx: Context, input: RefundInput): Promise<{ id: string }> {
  const found = await loadRecord(tx, payments, input.paymentId, "payment");
  const invoice = await loadInvoice(tx, found.invoiceId, "billing.refund", { lock: true });
  const payment = await loadRecord(tx, payments, found.id, "payment", { lock: true });
  refuseIf(checkRefund(payment, input));
  await setRefunded(tx, payment.id, payment.refundedPence + input.amountPence);
  const id = newId();
  await tx.db.insert(refunds).values({
    practiceId: tx.practiceId,
    id,
    paymentId: payment.id,
    invoiceId: invoice.id,
    amountPence: input.amountPence,
    reason: input.reason,
    method: input.method,
    isOwedAgain: input.isOwedAgain,
    state: "asked",
    refundedAt: tx.clock.now(),
    refundedBy: tx.staffMemberId,
  });
  await audit(tx, invoice, "refund.asked", {
    refundId: id,
    amountPence: input.amountPence,
    method: input.method,
  });
  if (input.method !== "card") await finish(tx, invoice, id, null);
  return { id };
}

async function giveBack(ctx: Context, id: string): Promise<InvoiceView> {
  const refund = await loadRecord(ctx, refunds, id, "refund");
  await loadInvoice(ctx, refund.invoiceId, "billing.refund");
  if (refund.state === "asked") await askProvider(ctx, refund);
  return viewInvoice(ctx, refund.invoiceId);
}

async function askProvider(ctx: Context, refund: RefundRow): Promise<void> {
  const payment = await loadRecord(ctx, payments, refund.paymentId, "payment");
  const attempt = await loadRecord(ctx, cardAttempts, payment.cardAttemptId ?? "", "card payment");
  try {
    const report = await cardGateway().refund({
      idempotencyKey: refund.id,
      paymentRef: attempt.paymentReference ?? "",
      amountPence: refund.amountPence,
      reference: refund.id,
    });
    if (report.status === "failed") await letGo(ctx, refund);
    if (report.status === "succeeded") {
      await inTransaction(ctx, async (tx) => {
        const invoice = await loadInvoice(tx, refund.invoiceId, "billing.refund", { lock: true });
        await finish(tx, invoice, refund.id, report.refundRef);
      });
    }
  } catch (error) {
    if (error instanceof CardGatewayError && error.isRefused) await letGo(ctx, refund);
    throw cardProblem(error);
  }
}

/** The money has gone back: the invoice's sums follow, once. */
async function finish(
  tx: Context,
  invoice: InvoiceRow,
  id: string,
  cardReference: string | null,
): Promise<void> {
  const refund = await loadRecord(tx, refunds, id, "refund", { lock: true });
  if (refund.state !== "asked") return;
  await changeInvoiceSums(tx, invoice, afterRefund(sumsOf(invoice), refund.amountPence, refund.isOwedAgain));
  await setState(tx, id, { state: "done", cardReference });
  await audit(tx, invoice, "refund.given", {
    refundId: id,
    amountPence: refund.amountPence,
    method: refund.method,
  });
}

/** The provider said no: the amount can be given back another time. */
async function letGo(ctx: Context, asked: RefundRow): Promise<void> {
  await inTransaction(ctx, async (tx) => {
    const invoice = await loadInvoice(tx, asked.invoiceId, "billing.refund", { lock: true });
    const payment = await loadRecord(tx, payments, asked.paymentId, "payment", { lock: true });
    const refund = await loadRecord(tx, refunds, asked.id, "refund", { lock: true });
    if (refund.state !== "asked") return;
    await setRefunded(tx, payment.id, payment.refundedPence - refund.amountPence);
    await setState(tx, refund.id, { state: "failed" });
    await audit(tx, invoice, "refund.failed", { refundId: refund.id, amountPence: refund.amountPence });
  });
}

async function setRefunded(tx: Context, id: string, refundedPence: number): Promise<void> {
  const isPayment = and(eq(payments.practiceId, tx.practiceId), eq(payments.id, id));
  await tx.db.update(payments).set({ refundedPence }).where(isPayment);
}

async function setState(tx: Context, id: string, set: Partial<RefundRow>): Promise<void> {
  const isRefund = and(eq(refunds.practiceId, tx.practiceId), eq(refunds.id, id));
  await tx.db.update(refunds).set(set).where(isRefund);
}

async function audit(
  tx: Context,
  invoice: InvoiceRow,
  action: string,
  detail: Record<string, unknown>,
): Promise<void> {
  const { patientId, siteId } = invoice;
  await recordAudit(tx, { action, subjectKind: "invoice", subjectId: invoice.id, patientId, siteId, detail });
}
