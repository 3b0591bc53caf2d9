import { isDuplicate } from "@withy/db/database-error";
import { invoiceCounters } from "@withy/db/schema";
import { and, eq, sql } from "drizzle-orm";
import type { Context } from "../context";

const series = "invoice";

/**
 * Takes the practice's next invoice number inside the caller's transaction. The counter's row stays locked until
 * that commits, so a number is given back when it does not, and none is missing or used twice.
 */
export async function nextInvoiceNumber(tx: Context): Promise<number> {
  const row = and(eq(invoiceCounters.practiceId, tx.practiceId), eq(invoiceCounters.series, series));
  const take = () =>
    tx.db
      .update(invoiceCounters)
      .set({ nextNumber: sql`${invoiceCounters.nextNumber} + 1` })
      .where(row);
  const [taken] = await take();
  if (taken.affectedRows === 0) {
    try {
      await tx.db.insert(invoiceCounters).values({ practiceId: tx.practiceId, series, nextNumber: 2 });
    } catch (error) {
      // The practice's first two invoices at once: the other one made the row.
      if (!isDuplicate(error, "PRIMARY")) throw error;
      await take();
    }
  }
  const [counter] = await tx.db.select({ next: invoiceCounters.nextNumber }).from(invoiceCounters).where(row);
  if (!counter) throw new Error("The invoice counter is missing.");
  return counter.next - 1;
}
