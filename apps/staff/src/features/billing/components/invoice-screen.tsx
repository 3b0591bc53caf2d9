"use client";
import type { InvoiceView } from "@withy/contracts/billing";
import { Page } from "@withy/ui/page";
import { useInvoice } from "../hooks/use-invoice";
import type { InvoiceRights } from "../invoice-rights";
import { DraftPanel } from "./draft-panel";
import { InvoiceFolio } from "./invoice-folio";
import { InvoiceHistory } from "./invoice-history";
import { InvoicePanel } from "./invoice-panel";

interface InvoiceScreenProps {
  first: InvoiceView;
  may: InvoiceRights;
  /** The card payment whose payer has just come back from the card company's page. */
  returnedFrom: string | null;
}

/** The invoice as it prints, its history in the margin, and what can be done with it beside it. */
export function InvoiceScreen({ first, may, returnedFrom }: InvoiceScreenProps) {
  const invoice = useInvoice(first);
  return (
    <Page className="inv">
      <InvoiceHistory steps={invoice.steps} today={invoice.today} />
      <InvoiceFolio invoice={invoice} />
      {invoice.state === "draft" ? (
        <DraftPanel invoice={invoice} may={may} />
      ) : (
        <InvoicePanel invoice={invoice} may={may} returnedFrom={returnedFrom} />
      )}
    </Page>
  );
}
