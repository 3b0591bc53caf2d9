import { formatMoney, type Pence } from "@withy/core/money";
import { type Refusal, refusal } from "@withy/core/refusal";
import type { PaymentMethod } from "./check-payment";

export interface RefundablePayment {
  readonly method: PaymentMethod;
  readonly amountPence: Pence;
  readonly refundedPence: Pence;
}

export interface RefundWish {
  readonly amountPence: Pence;
  readonly method: PaymentMethod;
  readonly reason: string;
}

/** Null where the money may be given back: never more than was paid, and an online card only to that card. */
export function checkRefund(payment: RefundablePayment, wish: RefundWish): Refusal | null {
  const left = payment.amountPence - payment.refundedPence;
  if (left <= 0) return refusal("already-refunded", "All of this payment has been given back already.");
  if (!Number.isSafeInteger(wish.amountPence) || wish.amountPence <= 0) {
    return refusal("amount-not-positive", "Enter an amount above zero.", "amountPence");
  }
  if (wish.amountPence > left) {
    return refusal(
      "more-than-paid",
      `Only ${formatMoney(left)} of this payment can be given back. Enter that or less.`,
      "amountPence",
    );
  }
  if (wish.method === "card" && payment.method !== "card") {
    return refusal(
      "not-paid-by-card",
      "This was not paid by card online. Choose how you gave the money back.",
      "method",
    );
  }
  if (wish.method !== "card" && payment.method === "card") {
    return refusal(
      "card-to-card",
      "This was paid by card online, so it goes back to the same card.",
      "method",
    );
  }
  if (wish.reason.trim() === "")
    return refusal("reason-missing", "Say why the money is given back.", "reason");
  return null;
}
