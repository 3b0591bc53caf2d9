import { CardGatewayError, type OpenedCheckout } from "@withy/billing/card/card-gateway";
import { checkPayment } from "@withy/billing/check-payment";
import { freePence, owedPence } from "@withy/billing/invoice-balance";
import { type StartedCardPaymentView, startCardPaymentInput } from "@withy/contracts/billing";
import { refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { cardAttempts } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import { cardGateway, cardProblem } from "./card-gateway";
import { changeInvoiceSums } from "./change-invoice-sums";
import { endCardPayment } from "./end-card-payment";
import { loadInvoice, sumsOf } from "./load-invoice";
import { loadPractice } from "./load-practice";

export type CardAttemptRow = typeof cardAttempts.$inferSelect;

/**
 * Begins a card payment and answers with the provider's payment page. The attempt is written and its amount held
 * before the provider is called: whatever happens in between, the row knows of it, and the same call can be made
 * again under the same key.
 */
export const startCardPayment = verb(
  "billing.take-payment",
  startCardPaymentInput,
  async (ctx, input): Promise<StartedCardPaymentView> => {
    const { id } = await once(ctx, "billing.start-card-payment", (tx) => holdAmount(tx, input));
    const attempt = await loadAttempt(ctx, id);
    try {
      const opened = await openCheckout(ctx, attempt);
      return { cardPaymentId: id, url: opened.url };
    } catch (error) {
      if (error instanceof CardGatewayError && error.isRefused) await endCardPayment(ctx, attempt, "failed");
      throw cardProblem(error);
    }
  },
);

async function holdAmount(
  tx: Context,
  input: { invoiceId: string; amountPence: number },
): Promise<{ id: string }> {
  const invoice = await loadInvoice(tx, input.invoiceId, "billing.take-payment", { lock: true });
  const sums = sumsOf(invoice);
  refuseIf(
    checkPayment(
      { state: invoice.state, owedPence: owedPence(sums), freePence: freePence(sums) },
      input.amountPence,
    ),
  );
  const id = newId();
  await tx.db.insert(cardAttempts).values({
    practiceId: tx.practiceId,
    id,
    invoiceId: invoice.id,
    amountPence: input.amountPence,
    state: "asked",
    startedBy: tx.staffMemberId,
    startedAt: tx.clock.now(),
  });
  await changeInvoiceSums(tx, invoice, { ...sums, pendingPence: sums.pendingPence + input.amountPence });
  await recordAudit(tx, {
    action: "card-payment.started",
    subjectKind: "invoice",
    subjectId: invoice.id,
    patientId: invoice.patientId,
    siteId: invoice.siteId,
    detail: { cardPaymentId: id, amountPence: input.amountPence },
  });
  return { id };
}

export async function loadAttempt(ctx: Context, id: string): Promise<CardAttemptRow> {
  return loadRecord(ctx, cardAttempts, id, "card payment");
}

/** Opens the attempt's checkout, or finds the one that an earlier call with the same key opened. */
export async function openCheckout(ctx: Context, attempt: CardAttemptRow): Promise<OpenedCheckout> {
  const invoice = await loadInvoice(ctx, attempt.invoiceId, "billing.take-payment");
  const practice = await loadPractice(ctx);
  const page = `${process.env.NEXTAUTH_URL ?? "http://localhost:3000"}/billing/invoices/${invoice.id}`;
  const opened = await cardGateway().openCheckout({
    idempotencyKey: attempt.id,
    amountPence: attempt.amountPence,
    currency: practice.currency,
    description: `Invoice ${invoice.reference}`,
    reference: attempt.id,
    returnUrl: `${page}?card=${attempt.id}`,
    cancelUrl: `${page}?card=${attempt.id}`,
  });
  await ctx.db
    .update(cardAttempts)
    .set({ sessionReference: opened.checkoutId, state: "open" })
    .where(
      and(
        eq(cardAttempts.practiceId, ctx.practiceId),
        eq(cardAttempts.id, attempt.id),
        eq(cardAttempts.state, "asked"),
      ),
    );
  return opened;
}
