import type { Pence } from "@withy/core/money";

/** The running sums of an issued invoice, in pence, each zero or more. */
export interface InvoiceSums {
  readonly totalPence: Pence;
  readonly paidPence: Pence;
  readonly refundedPence: Pence;
  /** The part of the total that is no longer asked for, because its money was given back for good. */
  readonly creditedPence: Pence;
}

/** What was paid and not given back. */
export const keptPence = (sums: InvoiceSums): Pence => sums.paidPence - sums.refundedPence;

/** What the payer still owes. */
export const owedPence = (sums: InvoiceSums): Pence => sums.totalPence - sums.creditedPence - keptPence(sums);

/** The law of an invoice's sums, held by the database as well: nothing below zero, nothing above what it pays. */
export function areSumsSound(sums: InvoiceSums): boolean {
  const all = [sums.totalPence, sums.paidPence, sums.refundedPence, sums.creditedPence];
  return all.every((p) => Number.isSafeInteger(p) && p >= 0) && keptPence(sums) >= 0 && owedPence(sums) >= 0;
}
