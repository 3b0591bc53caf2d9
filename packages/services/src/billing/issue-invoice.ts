import { type InvoiceField, maySimplify, missingFields } from "@withy/billing/invoice-form";
import { formatInvoiceNumber, usualDigits } from "@withy/billing/invoice-number";
import { isVatRegistered } from "@withy/billing/vat";
import { type InvoiceView, versionedInvoiceInput } from "@withy/contracts/billing";
import { refused } from "@withy/core/errors";
import { type Refusal, refusal } from "@withy/core/refusal";
import { addDays, dayOf } from "@withy/core/zoned-time";
import { type InvoiceAddress, payers, sites } from "@withy/db/schema";
import { recordAudit } from "../audit";
import type { Context } from "../context";
import { loadRecord } from "../load-record";
import { once } from "../once";
import { verb } from "../verb";
import { billToOf } from "./bill-to";
import { viewInvoice } from "./get-invoice";
import { type InvoiceRow, loadDraft } from "./load-invoice";
import { loadPractice, type PracticeRow } from "./load-practice";
import { nextInvoiceNumber } from "./next-invoice-number";
import { reckonDraft } from "./reckon-draft";

/** Issues a draft: adds it up once more, gives it the next number and its dates, and closes it to every change. */
export const issueInvoice = verb(
  "billing.issue",
  versionedInvoiceInput,
  async (ctx, input): Promise<InvoiceView> => {
    const { invoiceId } = await once(ctx, "billing.issue-invoice", async (tx) => {
      const draft = await loadDraft(tx, input.invoiceId, input.version);
      await issue(tx, draft);
      return { invoiceId: draft.id };
    });
    return viewInvoice(ctx, invoiceId);
  },
);

async function issue(tx: Context, draft: InvoiceRow): Promise<void> {
  const practice = await loadPractice(tx);
  const site = await loadRecord(tx, sites, draft.siteId, "site");
  const billTo = await billToOf(tx, draft);
  const totals = await reckonDraft(tx, draft, { billTo });
  if (totals.lines.length === 0) {
    throw refused(refusal("invoice-empty", "Add a line to this draft before you issue it, or discard it."));
  }
  const lacking = checkComplete(practice, billTo, totals.grossPence, totals.discountPence > 0);
  if (lacking) throw refused(lacking);
  const number = await nextInvoiceNumber(tx);
  const now = tx.clock.now();
  const issuedOn = dayOf(now, site.zone);
  const reference = formatInvoiceNumber({ prefix: practice.invoicePrefix, digits: usualDigits }, number);
  await reckonDraft(tx, draft, {
    number,
    reference,
    state: totals.grossPence === 0 ? "paid" : "issued",
    issuedOn,
    dueOn: addDays(issuedOn, await paymentDays(tx, draft, practice)),
    issuedAt: now,
    issuedBy: tx.staffMemberId,
  });
  await recordAudit(tx, {
    action: "invoice.issued",
    subjectKind: "invoice",
    subjectId: draft.id,
    patientId: draft.patientId,
    siteId: draft.siteId,
    detail: { reference, totalPence: totals.grossPence },
  });
}

async function paymentDays(tx: Context, draft: InvoiceRow, practice: PracticeRow): Promise<number> {
  if (draft.payerId === null) return practice.paymentDays;
  return (await loadRecord(tx, payers, draft.payerId, "payer")).paymentDays;
}

const sentences: Partial<Record<InvoiceField, string>> = {
  customerName: "Add the payer's name before you issue this invoice.",
  customerAddress:
    "An invoice above £250.00 needs an address. Add it to the patient's or payer's record, then issue it.",
  supplierAddress: "Add the practice's address in settings before you issue invoices.",
};

function checkComplete(
  practice: PracticeRow,
  billTo: InvoiceAddress,
  grossPence: number,
  hasDiscount: boolean,
): Refusal | null {
  const present = new Set<InvoiceField>([
    ...(["number", "supplierName", "issuedOn", "lineDescription", "lineVatRate", "lineQuantity"] as const),
    ...(["lineUnitPrice", "discountRate", "totalNet", "totalVat", "totalGross"] as const),
  ]);
  if (practice.addressLines.length > 0) present.add("supplierAddress");
  if (practice.vatNumber !== null) present.add("vatNumber");
  if (billTo.name !== "") present.add("customerName");
  if (billTo.addressLines.length > 0) present.add("customerAddress");
  const facts = { present, isVatRegistered: isVatRegistered(practice), hasOtherTaxPoint: false, hasDiscount };
  const [first] = missingFields(maySimplify(grossPence) ? "simplified" : "full", facts);
  if (first === undefined) return null;
  return refusal(`missing-${first}`, sentences[first] ?? "This invoice lacks a part that the law asks for.");
}
