import { formatMoney, type Pence } from "@withy/core/money";
import { type Refusal, refusal } from "@withy/core/refusal";
import type { InvoiceState } from "./invoice-states";

export const paymentMethods = ["cash", "terminal", "bank", "card"] as const;
export type PaymentMethod = (typeof paymentMethods)[number];

export const paymentMethodWords: Record<PaymentMethod, string> = {
  cash: "cash",
  terminal: "card reader",
  bank: "bank",
  card: "card online",
};

export interface PayableInvoice {
  readonly state: InvoiceState;
  readonly owedPence: Pence;
  /** Owed, and not held by a card payment that was begun and has not ended. */
  readonly freePence: Pence;
}

const closed: Partial<Record<InvoiceState, string>> = {
  draft: "Issue this invoice before you take money for it.",
  void: "This invoice is void. Take the money on the invoice that replaced it.",
  paid: "This invoice is already paid. Nothing is owed on it.",
  refunded: "This invoice was refunded. Draft a new one to take money again.",
};

/** Null where the amount may be taken; never more than is owed and not already promised by a card payment. */
export function checkPayment(invoice: PayableInvoice, amountPence: Pence): Refusal | null {
  const sentence = closed[invoice.state];
  if (sentence !== undefined) return refusal(`invoice-${invoice.state}`, sentence);
  if (!Number.isSafeInteger(amountPence) || amountPence <= 0) {
    return refusal("amount-not-positive", "Enter an amount above zero.", "amountPence");
  }
  if (amountPence > invoice.owedPence) {
    return refusal(
      "more-than-owed",
      `Only ${formatMoney(invoice.owedPence)} is owed. Enter that or less.`,
      "amountPence",
    );
  }
  if (amountPence > invoice.freePence) {
    const pending = formatMoney(invoice.owedPence - invoice.freePence);
    return refusal(
      "card-payment-open",
      `A card payment of ${pending} is still open on this invoice. Wait for it, or cancel it first.`,
      "amountPence",
    );
  }
  return null;
}
