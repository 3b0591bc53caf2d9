import { versionedInvoiceInput } from "@withy/contracts/billing";
import { invoiceLines, invoices } from "@withy/db/schema";
import { and, eq } from "drizzle-orm";
import { recordAudit } from "../audit";
import { inTransaction } from "../transaction";
import { verb } from "../verb";
import { loadDraft } from "./load-invoice";

/** Throws a draft away. Its visits wait to be invoiced again. */
export const discardDraft = verb("billing.draft", versionedInvoiceInput, (ctx, input) =>
  inTransaction(ctx, async (tx) => {
    const draft = await loadDraft(tx, input.invoiceId, input.version);
    await tx.db
      .delete(invoiceLines)
      .where(and(eq(invoiceLines.practiceId, tx.practiceId), eq(invoiceLines.invoiceId, draft.id)));
    await tx.db
      .delete(invoices)
      .where(and(eq(invoices.practiceId, tx.practiceId), eq(invoices.id, draft.id)));
    await recordAudit(tx, {
      action: "invoice.discarded",
      subjectKind: "invoice",
      subjectId: draft.id,
      patientId: draft.patientId,
      siteId: draft.siteId,
      detail: { totalPence: draft.totalPence },
    });
    return { invoiceId: draft.id };
  }),
);
