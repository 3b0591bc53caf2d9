import { can } from "@withy/core/access/can";
import { isId } from "@withy/core/ids";
import { getInvoice } from "@withy/services/billing";
import type { Metadata } from "next";
import { cache } from "react";
import { InvoiceScreen } from "@/features/billing/components/invoice-screen";
import { orNotFound, requireContext } from "@/server/context";
import "@/features/billing/invoice.css";
import "@/features/billing/invoice-narrow.css";
import "@/features/billing/payment.css";

type Props = PageProps<"/billing/invoices/[invoiceId]">;

const load = cache(async (invoiceId: string) => {
  const ctx = await requireContext("billing.read");
  return { ctx, invoice: await orNotFound(getInvoice(ctx, { invoiceId })) };
});

export async function generateMetadata({ params }: Props): Promise<Metadata> {
  const { invoice } = await load((await params).invoiceId);
  return { title: invoice.reference === null ? "Draft invoice" : `Invoice ${invoice.reference}` };
}

export default async function InvoicePage({ params, searchParams }: Props) {
  const { ctx, invoice } = await load((await params).invoiceId);
  const { card } = await searchParams;
  const may = (permission: Parameters<typeof can>[1]) => can(ctx.roles, permission, invoice.siteId);
  return (
    <InvoiceScreen
      first={invoice}
      returnedFrom={isId(card) ? card : null}
      may={{
        draft: may("billing.draft"),
        issue: may("billing.issue"),
        takePayment: may("billing.take-payment"),
        refund: may("billing.refund"),
      }}
    />
  );
}
