import { paymentMethodWords } from "@withy/billing/check-payment";
import { howToPay } from "@withy/billing/how-to-pay";
import { vatWords } from "@withy/billing/vat";
import type { InvoiceLineView, InvoiceView } from "@withy/contracts/billing";
import { longDate, plainDateWords, shortDate } from "@withy/core/date-words";
import { formatMoney, type Pence } from "@withy/core/money";
import { type Pdf, renderPdf } from "../pdf/document";
import { letterhead } from "../pdf/letterhead";
import { ink, textStyles } from "../pdf/page-style";
import { type Column, table } from "../pdf/table";
import { heading, paragraph } from "../pdf/text";

/** Pounds and pence without the sign, as a column that says £ at its head. */
const figure = (pence: Pence): string => formatMoney(pence).replace("£", "");

/**
 * The invoice as a tagged A4 document, laid out like the screen it comes from.
 * @param at written into the file; the same invoice at the same instant gives the same bytes
 */
export async function invoicePdf(invoice: InvoiceView, at: Date): Promise<Buffer> {
  const { sender } = invoice;
  const title = `Invoice ${invoice.reference ?? "(draft)"}`;
  const footer = {
    reference: `${sender.legalName}. Questions: ring ${sender.phone} and say the invoice number.`,
    confidentiality: "",
  };
  return renderPdf({ title, author: sender.practiceName, at, footer }, (pdf) => {
    const siteLine = `${sender.siteName}, ${sender.addressLine}`;
    const contactLine = `${sender.phone}, ${sender.email}`;
    letterhead(pdf, { practice: sender.practiceName, siteLine, contactLine }, [invoice.reference ?? "Draft"]);
    heading(pdf, 1, invoice.state === "draft" ? "Draft invoice" : "Invoice");
    if (invoice.state === "draft") warn(pdf, "Not issued yet. This is not a VAT invoice.");
    if (invoice.state === "void") warn(pdf, `Void: ${invoice.voidReason ?? ""}. Nothing is to be paid.`);
    parties(pdf, invoice);
    lines(pdf, invoice);
    sums(pdf, invoice);
    notes(pdf, invoice);
  });
}

function warn(pdf: Pdf, text: string): void {
  paragraph(pdf, text, { style: { ...textStyles.body, color: ink.danger }, bold: true, after: 6 });
}

function parties(pdf: Pdf, invoice: InvoiceView): void {
  const { billTo } = invoice;
  const half = pdf.width * 0.42;
  const right = pdf.x + half + 20;
  const address = [billTo.name, ...billTo.addressLines, billTo.postcode ?? ""].filter((line) => line !== "");
  const endLeft = pdf.column(pdf.x, half, () => {
    paragraph(pdf, "To", { style: textStyles.small, after: 1 });
    paragraph(pdf, address.join("\n"), { after: 0 });
  });
  const facts: [string, string][] = [
    ["Number", invoice.reference ?? "none yet"],
    ...(invoice.issuedOn === null ? [] : [["Issued", longDate(invoice.issuedOn)] as [string, string]]),
    ...(invoice.dueOn === null ? [] : [["Due", longDate(invoice.dueOn)] as [string, string]]),
    ["Patient", `${invoice.patient.name}, born ${plainDateWords(invoice.patient.bornOn)}`],
    ...invoice.treatedBy.map((who): [string, string] => ["Treated by", who]),
  ];
  const endRight = pdf.column(right, pdf.width - half - 20, () => {
    for (const [name, value] of facts) {
      paragraph(pdf, [{ text: `${name}  `, bold: true }, { text: value }], {
        style: textStyles.table,
        after: 1,
      });
    }
  });
  pdf.y = Math.max(endLeft, endRight) + 14;
}

function describe(line: InvoiceLineView): string {
  const count = line.quantity === 1 ? "" : `, ${line.quantity} at ${formatMoney(line.unitPence)}`;
  const off = line.discountBasisPoints === 0 ? "" : `, less ${line.discountBasisPoints / 100}%`;
  return `${line.description}${count}${off}`;
}

function lines(pdf: Pdf, invoice: InvoiceView): void {
  const withVat = invoice.isVatShown;
  const money = (head: string): Column => ({ head, share: 1.3, align: "right" });
  const columns: Column[] = [
    { head: "Date", share: 1.2 },
    { head: "For", share: 5.2 },
    ...(withVat ? [{ head: "VAT rate", share: 1.3 }, money("Net"), money("VAT")] : []),
    money("£"),
  ];
  const cells = (line: InvoiceLineView): string[] => [
    line.on === null ? "" : shortDate(line.on, invoice.issuedOn ?? invoice.today),
    describe(line),
    ...(withVat ? [vatWords[line.vatTreatment], figure(line.netPence), figure(line.vatPence)] : []),
    figure(line.totalPence),
  ];
  const total = ["", "Total", ...(withVat ? ["", figure(invoice.netPence), figure(invoice.vatPence)] : [])];
  table(pdf, {
    columns,
    rows: [
      ...invoice.lines.map((line) => ({ cells: cells(line) })),
      { cells: [...total, figure(invoice.totalPence)], kind: "subtotal" as const },
    ],
  });
}

function sums(pdf: Pdf, invoice: InvoiceView): void {
  if (invoice.state === "draft" || invoice.state === "void") return;
  const paid = invoice.payments.map((p) => {
    return [
      `Paid ${plainDateWords(p.on)}, ${paymentMethodWords[p.method]}, thank you`,
      -p.amountPence,
    ] as const;
  });
  const back = invoice.refunds
    .filter((r) => r.state === "done")
    .map(
      (r) => [`Given back ${plainDateWords(r.on)}, ${paymentMethodWords[r.method]}`, r.amountPence] as const,
    );
  const credited =
    invoice.creditedPence === 0 ? [] : [["No longer asked for", -invoice.creditedPence] as const];
  const rows = [["Total", invoice.totalPence] as const, ...paid, ...back, ...credited].map(
    ([name, pence]) => ({
      cells: [name, formatMoney(pence)],
    }),
  );
  const left = pdf.width * 0.42;
  pdf.y = pdf.column(pdf.x + left, pdf.width - left, () => {
    table(pdf, {
      columns: [
        { head: "Account", share: 3 },
        { head: "Amount", share: 1.2, align: "right" },
      ],
      rows: [...rows, { cells: ["To pay", formatMoney(invoice.owedPence)], kind: "total" as const }],
      style: { ...textStyles.table, size: 10.5 },
    });
  });
}

function notes(pdf: Pdf, invoice: InvoiceView): void {
  pdf.space(8);
  if (invoice.owedPence > 0) {
    heading(pdf, 2, "How to pay");
    paragraph(pdf, howToPay({ reference: invoice.reference, phone: invoice.sender.phone }));
  }
  if (invoice.vatNote.length > 0) {
    heading(pdf, 2, "VAT");
    paragraph(pdf, invoice.vatNote.join(" "));
  }
}
