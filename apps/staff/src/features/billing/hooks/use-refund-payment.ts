import { formatMoney } from "@withy/core/money";
import { refundPayment, retryRefund } from "../api-client";
import { useInvoiceWrite } from "./use-invoice-write";

export function useRefundPayment() {
  return useInvoiceWrite(refundPayment, (view, { amountPence }) => {
    return `${formatMoney(amountPence)} given back on ${view.reference}`;
  });
}

export function useRetryRefund() {
  return useInvoiceWrite(retryRefund, (view) => `The card company was asked again for ${view.reference}`);
}
