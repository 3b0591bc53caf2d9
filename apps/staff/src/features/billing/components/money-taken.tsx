"use client";
import { paymentMethodWords } from "@withy/billing/check-payment";
import type { InvoiceView, PaymentView } from "@withy/contracts/billing";
import { shortDate } from "@withy/core/date-words";
import { formatMoney } from "@withy/core/money";
import { AlertLine } from "@withy/ui/alert-line";
import { Button } from "@withy/ui/button";
import { SectionHead } from "@withy/ui/section-head";
import dynamic from "next/dynamic";
import { useState } from "react";
import { useRetryRefund } from "../hooks/use-refund-payment";

const RefundDialog = dynamic(() => import("./refund-dialog").then((m) => m.RefundDialog));

/** What was taken and given back, each with its way back. */
export function MoneyTaken({ invoice, mayRefund }: { invoice: InvoiceView; mayRefund: boolean }) {
  const [chosen, setChosen] = useState<PaymentView | null>(null);
  const retry = useRetryRefund();
  if (invoice.payments.length === 0) return null;
  const waiting = invoice.refunds.filter((r) => r.state === "asked");
  return (
    <section className="taken" aria-labelledby="taken-title">
      <SectionHead id="taken-title" title="Money taken" level={3} />
      <ul>
        {invoice.payments.map((payment) => (
          <li key={payment.id}>
            <span className="num soft">{shortDate(payment.on, invoice.today)}</span>
            <span>
              {paymentMethodWords[payment.method]}
              {payment.reference !== null && <span className="soft small"> {payment.reference}</span>}
              {payment.refundedPence > 0 && (
                <span className="soft small num"> {formatMoney(payment.refundedPence)} given back</span>
              )}
            </span>
            <span className="n num">{formatMoney(payment.amountPence)}</span>
            {mayRefund && payment.refundedPence < payment.amountPence && (
              <Button kind="plain" size="small" onClick={() => setChosen(payment)}>
                Give back…
                <span className="vh">
                  {" "}
                  from {formatMoney(payment.amountPence)} by {paymentMethodWords[payment.method]}
                </span>
              </Button>
            )}
          </li>
        ))}
      </ul>
      {waiting.map((refund) => (
        <div key={refund.id} className="opencard">
          <AlertLine>
            {formatMoney(refund.amountPence)} is to go back to the card, but the card company has not
            answered.
          </AlertLine>
          {retry.error && <AlertLine tone="danger">{retry.error.message}</AlertLine>}
          {mayRefund && (
            <Button busy={retry.isPending} onClick={() => retry.mutate(refund.id)}>
              Ask again
            </Button>
          )}
        </div>
      ))}
      {chosen && <RefundDialog invoice={invoice} payment={chosen} onClose={() => setChosen(null)} />}
    </section>
  );
}
