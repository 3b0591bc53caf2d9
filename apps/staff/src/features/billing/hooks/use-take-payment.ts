import { paymentMethodWords } from "@withy/billing/check-payment";
import { formatMoney } from "@withy/core/money";
import { takePayment } from "../api-client";
import { useInvoiceWrite } from "./use-invoice-write";

export function useTakePayment() {
  return useInvoiceWrite(takePayment, (view, { amountPence, method }) => {
    return `${formatMoney(amountPence)} by ${paymentMethodWords[method]} on ${view.reference}`;
  });
}
