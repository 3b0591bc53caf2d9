import type { Pence } from "@withy/core/money";

/** The running sums of an issued invoice, in pence, each zero or more. */
export interface InvoiceSums {
  readonly totalPence: Pence;
  /** Received and not given back. */
  readonly paidPence: Pence;
  /** The part of the total that is no longer asked for, because its money was given back for good. */
  readonly creditedPence: Pence;
  /** Held by card payments that were begun and are not settled yet: still owed, but not to be taken twice. */
  readonly pendingPence: Pence;
}

/** What the payer still owes. */
export const owedPence = (sums: InvoiceSums): Pence => sums.totalPence - sums.creditedPence - sums.paidPence;

/** What may be taken now: owed, and not already promised by an open card payment. */
export const freePence = (sums: InvoiceSums): Pence => owedPence(sums) - sums.pendingPence;

/** The law of an invoice's sums, held by the database as well: nothing below zero, nothing above what it pays. */
export function areSumsSound(sums: InvoiceSums): boolean {
  const all = [sums.totalPence, sums.paidPence, sums.creditedPence, sums.pendingPence];
  return all.every((p) => Number.isSafeInteger(p) && p >= 0) && freePence(sums) >= 0;
}

/** The sums after money given back: owed again, or forgiven with it. */
export function afterRefund(sums: InvoiceSums, amountPence: Pence, isOwedAgain: boolean): InvoiceSums {
  return {
    ...sums,
    paidPence: sums.paidPence - amountPence,
    creditedPence: sums.creditedPence + (isOwedAgain ? 0 : amountPence),
  };
}
