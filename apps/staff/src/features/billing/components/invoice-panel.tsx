"use client";
import type { InvoiceView } from "@withy/contracts/billing";
import { Button } from "@withy/ui/button";
import dynamic from "next/dynamic";
import { useEffect, useState } from "react";
import { invoicePdfAddress } from "../api-client";
import { useCardPayment } from "../hooks/use-card-payment";
import type { InvoiceRights } from "../invoice-rights";
import { MoneyTaken } from "./money-taken";
import { OpenCardPayment } from "./open-card-payment";
import { PaymentForm } from "./payment-form";

const VoidDialog = dynamic(() => import("./void-dialog").then((m) => m.VoidDialog));

interface InvoicePanelProps {
  invoice: InvoiceView;
  may: InvoiceRights;
  returnedFrom: string | null;
}

/** What can be done with an issued invoice: take the money, give it back, print it, make it void. */
export function InvoicePanel({ invoice, may, returnedFrom }: InvoicePanelProps) {
  const [isVoiding, setVoiding] = useState(false);
  const card = invoice.openCardPayment;
  useReturn(card?.id === returnedFrom ? returnedFrom : null);
  const canVoid = may.issue && invoice.state === "issued" && invoice.creditedPence === 0 && card === null;
  return (
    <aside className="pay" aria-label="Payment">
      <StateLine invoice={invoice} />
      {card && may.takePayment && <OpenCardPayment card={card} />}
      {invoice.freePence > 0 && may.takePayment && <PaymentForm invoice={invoice} />}
      <MoneyTaken invoice={invoice} mayRefund={may.refund} />
      <p className="more">
        <a
          className="btn"
          data-kind="plain"
          href={invoicePdfAddress(invoice.id)}
          target="_blank"
          rel="noreferrer"
        >
          PDF
        </a>
        {canVoid && (
          <Button kind="plain" onClick={() => setVoiding(true)}>
            Make void…
          </Button>
        )}
      </p>
      {isVoiding && <VoidDialog invoice={invoice} onClose={() => setVoiding(false)} />}
    </aside>
  );
}

/** A payer who is back from the card company's page may be quicker than its event: ask once. */
function useReturn(cardPaymentId: string | null): void {
  const check = useCardPayment("check");
  const { mutate } = check;
  useEffect(() => {
    if (cardPaymentId !== null) mutate(cardPaymentId);
  }, [cardPaymentId, mutate]);
}

function StateLine({ invoice }: { invoice: InvoiceView }) {
  const days = invoice.daysPastDue ?? 0;
  if (invoice.owedPence > 0 && days > 0) {
    const partly = invoice.state === "part-paid" ? "; part paid" : "";
    return (
      <p className="state">
        <b className="danger">Overdue</b>
        <span className="soft small num">
          {days} {days === 1 ? "day" : "days"}
          {partly}
        </span>
      </p>
    );
  }
  return (
    <p className="state">
      <b>{invoice.stateWord}</b>
    </p>
  );
}
