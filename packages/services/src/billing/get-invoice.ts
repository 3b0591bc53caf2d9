import { daysPastDue } from "@withy/billing/ageing";
import { freePence, owedPence } from "@withy/billing/invoice-balance";
import { invoiceStateWords, owingStates } from "@withy/billing/invoice-states";
import { type TreatmentTotal, vatNote } from "@withy/billing/vat";
import { type InvoiceLineView, type InvoiceView, invoiceIdInput } from "@withy/contracts/billing";
import { formatPhone } from "@withy/core/identifiers/phone";
import { sumPence } from "@withy/core/money";
import { dayOf } from "@withy/core/zoned-time";
import { patients, payers, sites } from "@withy/db/schema";
import type { Context } from "../context";
import { findRecord, loadRecord } from "../load-record";
import { verb } from "../verb";
import { billToOf } from "./bill-to";
import { linesOf, openCardPaymentOf, paymentsOf, refundsOf } from "./invoice-parts";
import { invoiceSteps } from "./invoice-steps";
import { type InvoiceRow, loadInvoice, sumsOf } from "./load-invoice";
import { loadPractice } from "./load-practice";

/** One invoice as it is printed, with its payments and its life. */
export const getInvoice = verb("billing.read", invoiceIdInput, (ctx, input) =>
  viewInvoice(ctx, input.invoiceId),
);

/** The view that every verb on one invoice answers with. */
export async function viewInvoice(ctx: Context, id: string): Promise<InvoiceView> {
  const invoice = await loadInvoice(ctx, id, "billing.read");
  const practice = await loadPractice(ctx);
  const site = await loadRecord(ctx, sites, invoice.siteId, "site");
  const patient = await loadRecord(ctx, patients, invoice.patientId, "patient");
  const payer = invoice.payerId === null ? null : await findRecord(ctx, payers, invoice.payerId);
  const { lines, treatedBy } = await linesOf(ctx, invoice, site.zone);
  const today = dayOf(ctx.clock.now(), site.zone);
  const isVatShown = invoice.vatNumber !== null;
  return {
    ...moneyOf(invoice),
    id: invoice.id,
    version: invoice.version,
    stateWord: invoiceStateWords[invoice.state],
    reference: invoice.reference,
    currency: practice.currency,
    sender: {
      practiceName: practice.name,
      legalName: practice.legalName,
      siteName: site.name,
      addressLine: [...site.addressLines, site.postcode].join(", "),
      phone: formatPhone(site.phone),
      email: practice.email,
    },
    billTo: invoice.state === "draft" ? await billToOf(ctx, invoice) : invoice.billTo,
    patient: { id: patient.id, name: `${patient.givenName} ${patient.familyName}`, bornOn: patient.bornOn },
    payer: payer && { id: payer.id, name: payer.name, kind: payer.kind },
    siteId: invoice.siteId,
    treatedBy,
    today,
    issuedOn: invoice.issuedOn,
    dueOn: invoice.dueOn,
    daysPastDue:
      invoice.dueOn !== null && owingStates.includes(invoice.state)
        ? daysPastDue(invoice.dueOn, today)
        : null,
    lines,
    isVatShown,
    vatNote: vatNote(totalsByTreatment(lines), invoice),
    voidReason: invoice.voidReason,
    payments: await paymentsOf(ctx, invoice, site.zone),
    refunds: await refundsOf(ctx, invoice, site.zone),
    openCardPayment: await openCardPaymentOf(ctx, invoice, site.zone),
    steps: await invoiceSteps(ctx, invoice, site.zone),
  };
}

function moneyOf(invoice: InvoiceRow) {
  const sums = sumsOf(invoice);
  const isOwing = owingStates.includes(invoice.state);
  return {
    ...sums,
    state: invoice.state,
    netPence: invoice.netPence,
    vatPence: invoice.vatPence,
    owedPence: isOwing ? owedPence(sums) : 0,
    freePence: isOwing ? freePence(sums) : 0,
  };
}

function totalsByTreatment(lines: readonly InvoiceLineView[]): TreatmentTotal[] {
  return [...new Set(lines.map((l) => l.vatTreatment))].map((treatment) => {
    const own = lines.filter((l) => l.vatTreatment === treatment);
    return {
      treatment,
      netPence: sumPence(own.map((l) => l.netPence)),
      vatPence: sumPence(own.map((l) => l.vatPence)),
    };
  });
}
