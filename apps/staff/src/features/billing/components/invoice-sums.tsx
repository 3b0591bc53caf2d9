import { paymentMethodWords } from "@withy/billing/check-payment";
import type { InvoiceView } from "@withy/contracts/billing";
import { plainDateWords } from "@withy/core/date-words";
import { formatMoney } from "@withy/core/money";

/** From the total to what is to pay, each payment and refund on its line. */
export function InvoiceSums({ invoice }: { invoice: InvoiceView }) {
  const isOpen = invoice.state !== "draft" && invoice.state !== "void";
  const given = invoice.refunds.filter((r) => r.state === "done");
  return (
    <table className="sums">
      <caption className="vh">Sums</caption>
      <tbody>
        <tr>
          <th scope="row">Total</th>
          <td className="n">{formatMoney(invoice.totalPence)}</td>
        </tr>
        {invoice.payments.map((payment) => (
          <tr key={payment.id}>
            <th scope="row">
              Paid {plainDateWords(payment.on)}, {paymentMethodWords[payment.method]}, thank you
            </th>
            <td className="n">{formatMoney(-payment.amountPence)}</td>
          </tr>
        ))}
        {given.map((refund) => (
          <tr key={refund.id}>
            <th scope="row">
              Given back {plainDateWords(refund.on)}, {paymentMethodWords[refund.method]}
            </th>
            <td className="n">{formatMoney(refund.amountPence)}</td>
          </tr>
        ))}
        {invoice.creditedPence > 0 && (
          <tr>
            <th scope="row">No longer asked for</th>
            <td className="n">{formatMoney(-invoice.creditedPence)}</td>
          </tr>
        )}
        {isOpen && (
          <tr className="due">
            <th scope="row">To pay</th>
            <td className="n">{formatMoney(invoice.owedPence)}</td>
          </tr>
        )}
      </tbody>
    </table>
  );
}
