import { paymentMethods } from "@withy/billing/check-payment";
import { z } from "zod";
import { idField, optionalText, penceField, requiredText } from "../fields";

export const takePaymentInput = z.strictObject({
  invoiceId: idField,
  amountPence: penceField,
  method: z.enum(["cash", "terminal", "bank"], "Choose how the money came."),
  reference: optionalText(80, "The reference"),
});

export const startCardPaymentInput = z.strictObject({ invoiceId: idField, amountPence: penceField });

export const cardPaymentInput = z.strictObject({ cardPaymentId: idField });

export interface StartedCardPaymentView {
  readonly cardPaymentId: string;
  /** The card company's payment page. */
  readonly url: string;
}

export interface CardPaymentView {
  readonly cardPaymentId: string;
  readonly invoiceId: string;
  readonly state: "asked" | "open" | "paid" | "failed" | "expired";
}

export const refundPaymentInput = z.strictObject({
  paymentId: idField,
  amountPence: penceField,
  method: z.enum(paymentMethods, "Choose how the money goes back."),
  reason: requiredText(200, "Say why the money is given back."),
  /** True where the invoice is to be paid again, as after a payment taken by mistake. */
  isOwedAgain: z.boolean("Choose what happens to the invoice."),
});

export const refundIdInput = z.strictObject({ refundId: idField });
