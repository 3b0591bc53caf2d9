import { freePence, type InvoiceSums } from "@withy/billing/invoice-balance";
import { stateOfSums } from "@withy/billing/invoice-states";
import { stale } from "@withy/core/errors";
import { invoices } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import type { SystemContext } from "../context";
import type { InvoiceRow } from "./load-invoice";

/**
 * Writes an issued invoice's new sums and the state that follows from them. The row must be as it was loaded: the
 * version in the where-clause catches a change from another node, which a row lock would not.
 */
export async function changeInvoiceSums(
  ctx: SystemContext,
  row: InvoiceRow,
  sums: InvoiceSums,
): Promise<void> {
  if (freePence(sums) < 0) throw new RangeError("An invoice cannot be paid beyond its total.");
  const [result] = await ctx.db
    .update(invoices)
    .set({
      paidPence: sums.paidPence,
      creditedPence: sums.creditedPence,
      pendingPence: sums.pendingPence,
      state: stateOfSums(sums),
      version: row.version + 1,
      updatedAt: ctx.clock.now(),
    })
    .where(
      and(
        eq(invoices.practiceId, row.practiceId),
        eq(invoices.id, row.id),
        eq(invoices.version, row.version),
      ),
    );
  if (result.affectedRows !== 1) throw stale("invoice");
}
