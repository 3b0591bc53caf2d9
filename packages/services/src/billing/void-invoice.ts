import { canMoveInvoice } from "@withy/billing/invoice-states";
import { type InvoiceView, voidInvoiceInput } from "@withy/contracts/billing";
import { refused } from "@withy/core/errors";
import { refusal } from "@withy/core/refusal";
import { invoiceLines, invoices } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { viewInvoice } from "./get-invoice";
import { type InvoiceRow, loadInvoice } from "./load-invoice";

/** Makes an issued, unpaid invoice void. It keeps its number; its visits wait to be invoiced again. */
export const voidInvoice = verb(
  "billing.issue",
  voidInvoiceInput,
  async (ctx, input): Promise<InvoiceView> => {
    await inTransaction(ctx, async (tx) => {
      const invoice = await loadInvoice(tx, input.invoiceId, "billing.issue", {
        lock: true,
        version: input.version,
      });
      refuseVoid(invoice);
      const isInvoice = and(eq(invoices.practiceId, tx.practiceId), eq(invoices.id, invoice.id));
      await tx.db
        .update(invoices)
        .set({
          state: "void",
          voidReason: input.reason,
          version: invoice.version + 1,
          updatedAt: tx.clock.now(),
        })
        .where(isInvoice);
      await tx.db
        .update(invoiceLines)
        .set({ appointmentId: null })
        .where(and(eq(invoiceLines.practiceId, tx.practiceId), eq(invoiceLines.invoiceId, invoice.id)));
      await recordAudit(tx, {
        action: "invoice.voided",
        subjectKind: "invoice",
        subjectId: invoice.id,
        patientId: invoice.patientId,
        siteId: invoice.siteId,
        detail: { reference: invoice.reference, totalPence: invoice.totalPence },
      });
    });
    return viewInvoice(ctx, input.invoiceId);
  },
);

function refuseVoid(invoice: InvoiceRow): void {
  if (invoice.state === "draft")
    throw refused(refusal("invoice-draft", "This is a draft. Discard it instead."));
  if (invoice.state === "void") throw refused(refusal("invoice-void", "This invoice is void already."));
  if (!canMoveInvoice(invoice.state, "void") || invoice.creditedPence > 0) {
    throw refused(
      refusal("invoice-paid", "Money was taken for this invoice. Give it back instead of making it void."),
    );
  }
  if (invoice.pendingPence > 0) {
    throw refused(refusal("card-payment-open", "A card payment is open on this invoice. Cancel it first."));
  }
}
