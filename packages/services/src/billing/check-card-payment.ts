import type { CheckoutReport } from "@withy/billing/card/card-gateway";
import { type CardPaymentView, cardPaymentInput } from "@withy/contracts/billing";
import type { Context } from "../context";
import { verb } from "../verb";
import { cardGateway, cardProblem } from "./card-gateway";
import { settleCardPayment } from "./end-card-payment";
import { loadInvoice } from "./load-invoice";
import { type CardAttemptRow, loadAttempt, openCheckout } from "./start-card-payment";

/** Asks the provider how a card payment stands and posts what it says: for a payer who is back before the event. */
export const checkCardPayment = verb("billing.take-payment", cardPaymentInput, (ctx, input) =>
  askAndSettle(ctx, input.cardPaymentId, (checkoutId) => cardGateway().getCheckout(checkoutId)),
);

/** Closes a card payment's page, so that the money can be taken another way. If it was paid just before, it is posted. */
export const cancelCardPayment = verb("billing.take-payment", cardPaymentInput, (ctx, input) =>
  askAndSettle(ctx, input.cardPaymentId, (checkoutId) => cardGateway().closeCheckout(checkoutId)),
);

async function askAndSettle(
  ctx: Context,
  id: string,
  ask: (checkoutId: string) => Promise<CheckoutReport>,
): Promise<CardPaymentView> {
  const attempt = await loadAttempt(ctx, id);
  await loadInvoice(ctx, attempt.invoiceId, "billing.take-payment");
  if (attempt.state === "asked" || attempt.state === "open") {
    try {
      const report = await ask(await checkoutOf(ctx, attempt));
      await settleCardPayment(ctx, attempt, report);
    } catch (error) {
      throw cardProblem(error);
    }
  }
  const now = await loadAttempt(ctx, id);
  return { cardPaymentId: now.id, invoiceId: now.invoiceId, state: now.state };
}

/** An attempt whose first call was never answered is asked for again under its own key, which opens no second page. */
async function checkoutOf(ctx: Context, attempt: CardAttemptRow): Promise<string> {
  return attempt.sessionReference ?? (await openCheckout(ctx, attempt)).checkoutId;
}
