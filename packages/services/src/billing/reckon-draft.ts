import { draftSums } from "@withy/billing/draft-sums";
import type { InvoiceTotals } from "@withy/billing/invoice-totals";
import type { VatTreatment } from "@withy/billing/vat";
import { invoiceLines, invoices } from "@withy/db/schema";
import { and, asc, eq } from "drizzle-orm";
import type { Context } from "../context";
import type { InvoiceRow } from "./load-invoice";
import { loadPractice, type PracticeRow } from "./load-practice";

export type LineRow = typeof invoiceLines.$inferSelect;

type SummedLine = Omit<LineRow, "vatTreatment"> & { readonly vatTreatment: string };

/** A whole draft's lines with their sums, in the order given, and what changes with them on the invoice. */
export function reckonLines<L extends SummedLine>(lines: readonly L[], practice: PracticeRow) {
  const treated = lines.map((line) => ({ ...line, vatTreatment: line.vatTreatment as VatTreatment }));
  const { lines: sums, totals } = draftSums(treated, practice);
  const { netPence, vatPence, grossPence: totalPence } = totals;
  const { vatRounding, vatNumber } = practice;
  return {
    totals,
    lines: lines.map((line, i): L => ({ ...line, ...sums[i] })),
    invoice: { netPence, vatPence, totalPence, vatRounding, vatNumber },
  };
}

/** Writes the sums of lines that already stand, but for those that hold them already. */
export async function writeLineSums(
  ctx: Context,
  before: readonly LineRow[],
  after: readonly LineRow[],
): Promise<void> {
  for (const [i, { vatBasisPoints, netPence, vatPence, totalPence, id }] of after.entries()) {
    const was = before[i];
    const isSame =
      was?.vatBasisPoints === vatBasisPoints && was.netPence === netPence && was.vatPence === vatPence;
    if (isSame && was.totalPence === totalPence) continue;
    await ctx.db
      .update(invoiceLines)
      .set({ vatBasisPoints, netPence, vatPence, totalPence })
      .where(and(eq(invoiceLines.practiceId, ctx.practiceId), eq(invoiceLines.id, id)));
  }
}

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
  const before = await ctx.db
    .select()
    .from(invoiceLines)
    .where(ofInvoice)
    .orderBy(asc(invoiceLines.position));
  const reckoned = reckonLines(before, practice);
  await writeLineSums(ctx, before, reckoned.lines);
  await ctx.db
    .update(invoices)
    .set({ ...reckoned.invoice, version: invoice.version + 1, updatedAt: ctx.clock.now(), ...more })
    .where(and(eq(invoices.practiceId, ctx.practiceId), eq(invoices.id, invoice.id)));
  return reckoned.totals;
}
