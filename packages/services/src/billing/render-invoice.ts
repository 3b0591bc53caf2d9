import { invoiceIdInput } from "@withy/contracts/billing";
import { invoicePdf } from "@withy/documents/invoice/invoice-pdf";
import { verb } from "../verb";
import { viewInvoice } from "./get-invoice";

export interface RenderedInvoice {
  readonly fileName: string;
  readonly bytes: Buffer;
}

/** The invoice as a PDF, the same as its screen. */
export const renderInvoice = verb(
  "billing.read",
  invoiceIdInput,
  async (ctx, input): Promise<RenderedInvoice> => {
    const invoice = await viewInvoice(ctx, input.invoiceId);
    return {
      fileName: `invoice-${invoice.reference ?? "draft"}.pdf`,
      bytes: await invoicePdf(invoice, ctx.clock.now()),
    };
  },
);
