import { type InvoiceTotals, invoiceTotals, vatRoundings } from "@withy/billing/invoice-totals";
import { isVatRegistered, type VatTreatment, vatBasisPoints } from "@withy/billing/vat";
import { invoiceLines, invoices } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import type { Context } from "../context";
import type { InvoiceRow } from "./load-invoice";
import { loadPractice } from "./load-practice";

/**
 * Adds up a draft's lines by the practice's rounding and registration of today, and writes the sums to the lines
 * and to the invoice. Other columns of the invoice may be written with them.
 */
export async function reckonDraft(
  ctx: Context,
  invoice: InvoiceRow,
  more: Partial<typeof invoices.$inferInsert> = {},
): Promise<InvoiceTotals> {
  const practice = await loadPractice(ctx);
  const ofInvoice = and(eq(invoiceLines.practiceId, ctx.practiceId), eq(invoiceLines.invoiceId, invoice.id));
  const lines = await ctx.db.select().from(invoiceLines).where(ofInvoice).orderBy(asc(invoiceLines.position));
  const isRegistered = isVatRegistered(practice);
  const totals = invoiceTotals(
    lines.map((line) => ({
      quantity: line.quantity,
      unitPricePence: line.unitPence,
      isVatInclusive: false,
      discount:
        line.discountBasisPoints === 0 ? null : { kind: "percent", basisPoints: line.discountBasisPoints },
      vatTreatment: line.vatTreatment as VatTreatment,
    })),
    vatRoundings[practice.vatRounding],
    isRegistered,
  );
  for (const [i, line] of lines.entries()) {
    const sums = totals.lines[i];
    if (!sums) continue;
    const rate = isRegistered ? vatBasisPoints[line.vatTreatment as VatTreatment] : 0;
    await ctx.db
      .update(invoiceLines)
      .set({
        netPence: sums.netPence,
        vatPence: sums.vatPence,
        totalPence: sums.grossPence,
        vatBasisPoints: rate,
      })
      .where(and(eq(invoiceLines.practiceId, ctx.practiceId), eq(invoiceLines.id, line.id)));
  }
  await ctx.db
    .update(invoices)
    .set({
      netPence: totals.netPence,
      vatPence: totals.vatPence,
      totalPence: totals.grossPence,
      vatRounding: practice.vatRounding,
      vatNumber: practice.vatNumber,
      version: invoice.version + 1,
      updatedAt: ctx.clock.now(),
      ...more,
    })
    .where(and(eq(invoices.practiceId, ctx.practiceId), eq(invoices.id, invoice.id)));
  return totals;
}
