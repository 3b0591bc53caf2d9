import { howToPay } from "@withy/billing/how-to-pay";
import type { InvoiceView } from "@withy/contracts/billing";
import { longDate, plainDateWords } from "@withy/core/date-words";
import Link from "next/link";
import { InvoiceLines } from "./invoice-lines";
import { InvoiceSums } from "./invoice-sums";

/** The page that the payer gets. */
export function InvoiceFolio({ invoice }: { invoice: InvoiceView }) {
  const { sender } = invoice;
  return (
    <article className="folio" aria-label={invoice.reference ?? "Draft invoice"}>
      <header className="lh">
        <div>
          <p className="pr">{sender.practiceName}</p>
          <p className="small soft">
            {sender.siteName}, {sender.addressLine}
            <br />
            {sender.phone}, {sender.email}
          </p>
        </div>
        <div className="right">
          <h1>{invoice.state === "draft" ? "Draft" : "Invoice"}</h1>
          <p className="num invno">{invoice.reference ?? "not issued yet"}</p>
        </div>
      </header>
      {invoice.state === "void" && (
        <p className="danger">
          Void: {invoice.voidReason}. Nothing is to be paid, and the number is not used again.
        </p>
      )}
      <Parties invoice={invoice} />
      <InvoiceLines invoice={invoice} />
      <InvoiceSums invoice={invoice} />
      <div className="how">
        {invoice.owedPence > 0 && (
          <div>
            <h2 className="lb">How to pay</h2>
            <p>{howToPay({ reference: invoice.reference, phone: sender.phone })}</p>
          </div>
        )}
        {invoice.vatNote.length > 0 && (
          <div>
            <h2 className="lb">VAT</h2>
            <p>{invoice.vatNote.join(" ")}</p>
          </div>
        )}
      </div>
      <footer className="small soft">
        {sender.legalName}. Questions: ring {sender.phone} and say the invoice number.
      </footer>
    </article>
  );
}

function dueWords(days: number): string {
  if (days === 0) return "today";
  const size = Math.abs(days);
  const span = size === 1 ? "1 day" : `${size} days`;
  return days > 0 ? `${span} ago` : `in ${span}`;
}

function Parties({ invoice }: { invoice: InvoiceView }) {
  const { billTo, patient, daysPastDue } = invoice;
  const isLate = daysPastDue !== null && daysPastDue > 0;
  return (
    <div className="to">
      <div>
        <h2 className="lb">To</h2>
        <address>
          {[billTo.name, ...billTo.addressLines, billTo.postcode ?? ""]
            .filter((line) => line !== "")
            .map((line) => (
              <span key={line}>{line}</span>
            ))}
        </address>
      </div>
      <dl>
        {invoice.issuedOn !== null && (
          <>
            <dt>Issued</dt>
            <dd>{longDate(invoice.issuedOn)}</dd>
          </>
        )}
        {invoice.dueOn !== null && (
          <>
            <dt>Due</dt>
            <dd className={isLate ? "danger" : undefined}>
              {isLate ? <b>{longDate(invoice.dueOn)}</b> : longDate(invoice.dueOn)}
              {daysPastDue !== null && `, ${dueWords(daysPastDue)}`}
            </dd>
          </>
        )}
        <dt>Patient</dt>
        <dd>
          <Link href={`/patients/${patient.id}`}>{patient.name}</Link>, born {plainDateWords(patient.bornOn)}
        </dd>
        {invoice.treatedBy.length > 0 && (
          <>
            <dt>Treated by</dt>
            <dd>{invoice.treatedBy.join("; ")}</dd>
          </>
        )}
      </dl>
    </div>
  );
}
