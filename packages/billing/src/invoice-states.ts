import { type InvoiceSums, owedPence } from "./invoice-balance";

export const invoiceStates = ["draft", "issued", "part-paid", "paid", "void", "refunded"] as const;
export type InvoiceState = (typeof invoiceStates)[number];

export const invoiceStateWords: Record<InvoiceState, string> = {
  draft: "Draft",
  issued: "Issued",
  "part-paid": "Part paid",
  paid: "Paid",
  void: "Void",
  refunded: "Refunded",
};

/** From each state, the states that may follow. Money moves between the middle four; void and draft are one-way. */
export const invoiceMoves: Record<InvoiceState, readonly InvoiceState[]> = {
  draft: ["issued", "paid"],
  issued: ["part-paid", "paid", "void"],
  "part-paid": ["issued", "paid"],
  paid: ["issued", "part-paid", "refunded"],
  void: [],
  refunded: [],
};

export const canMoveInvoice = (from: InvoiceState, to: InvoiceState): boolean =>
  invoiceMoves[from].includes(to);

/** The states in which an invoice can be owed on. */
export const owingStates: readonly InvoiceState[] = ["issued", "part-paid"];

/** The state that an issued invoice's sums put it in. An invoice for nothing is paid as soon as it is issued. */
export function stateOfSums(sums: InvoiceSums): InvoiceState {
  if (owedPence(sums) > 0) return sums.paidPence > 0 ? "part-paid" : "issued";
  return sums.paidPence === 0 && sums.creditedPence > 0 ? "refunded" : "paid";
}
