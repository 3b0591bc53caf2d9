import { checkPayment } from "@withy/billing/check-payment";
import { freePence, owedPence } from "@withy/billing/invoice-balance";
import { type InvoiceView, takePaymentInput } from "@withy/contracts/billing";
import { refuseIf } from "@withy/core/errors";
import { newId } from "@withy/core/ids";
import { payments } from "@withy/db/schema";
import { recordAudit } from "../audit";
import { once } from "../once";
import { verb } from "../verb";
import { changeInvoiceSums } from "./change-invoice-sums";
import { viewInvoice } from "./get-invoice";
import { loadInvoice, sumsOf } from "./load-invoice";

/** Takes money at the desk or from a bank statement: all that is owed or a part of it, never more. */
export const takePayment = verb(
  "billing.take-payment",
  takePaymentInput,
  async (ctx, input): Promise<InvoiceView> => {
    const { invoiceId } = await once(ctx, "billing.take-payment", async (tx) => {
      const invoice = await loadInvoice(tx, input.invoiceId, "billing.take-payment", { lock: true });
      const sums = sumsOf(invoice);
      refuseIf(
        checkPayment(
          { state: invoice.state, owedPence: owedPence(sums), freePence: freePence(sums) },
          input.amountPence,
        ),
      );
      const id = newId();
      await tx.db.insert(payments).values({
        practiceId: tx.practiceId,
        id,
        invoiceId: invoice.id,
        siteId: invoice.siteId,
        method: input.method,
        amountPence: input.amountPence,
        reference: input.reference,
        receivedAt: tx.clock.now(),
        takenBy: tx.staffMemberId,
      });
      await changeInvoiceSums(tx, invoice, { ...sums, paidPence: sums.paidPence + input.amountPence });
      await recordAudit(tx, {
        action: "payment.taken",
        subjectKind: "invoice",
        subjectId: invoice.id,
        patientId: invoice.patientId,
        siteId: invoice.siteId,
        detail: { paymentId: id, amountPence: input.amountPence, method: input.method },
      });
      return { invoiceId: invoice.id };
    });
    return viewInvoice(ctx, invoiceId);
  },
);
