import { type AgeBucket, ageBuckets } from "@withy/billing/ageing";
import type { InvoiceState } from "@withy/billing/invoice-states";
import type { Pence } from "@withy/core/money";
import type { PlainDateText } from "@withy/core/plain-date";
import { z } from "zod";
import { idField, pageFields } from "../fields";
import type { Page } from "../page";
import { invoiceKinds } from "./invoice-kinds";

/** As a query string carries it. `payer` is "patients", or a payer's id. */
export const listInvoicesInput = z.strictObject({
  kind: z.enum(invoiceKinds).default("owed"),
  age: z.enum(ageBuckets).optional(),
  payer: z.union([z.literal("patients"), idField]).optional(),
  siteId: idField.optional(),
  patientId: idField.optional(),
  /** Start of an invoice number, or of a name in any order. */
  find: z.string().trim().max(60).optional(),
  ...pageFields,
});
export type ListInvoicesInput = z.input<typeof listInvoicesInput>;

export interface InvoiceRowView {
  readonly id: string;
  readonly reference: string;
  readonly issuedOn: PlainDateText;
  readonly dueOn: PlainDateText;
  readonly patientId: string;
  readonly patientName: string;
  readonly payerName: string | null;
  readonly siteName: string;
  readonly totalPence: Pence;
  readonly paidPence: Pence;
  readonly owedPence: Pence;
  readonly daysPastDue: number;
  readonly state: InvoiceState;
  readonly stateWord: string;
}

export interface InvoiceSumsView {
  readonly count: number;
  readonly totalPence: Pence;
  readonly paidPence: Pence;
  readonly owedPence: Pence;
}

/** One page with the sums of the whole filter, whatever the page. */
export interface InvoiceListView extends Page<InvoiceRowView> {
  readonly today: PlainDateText;
  readonly pageSums: InvoiceSumsView;
  readonly filterSums: InvoiceSumsView;
}

export const agedDebtInput = z.strictObject({ siteId: idField.optional() });

export interface AgedDebtView {
  readonly today: PlainDateText;
  readonly count: number;
  readonly totalPence: Pence;
  /** Aged from the due date; what is not yet due has its own bucket. */
  readonly buckets: readonly { readonly bucket: AgeBucket; readonly count: number; readonly pence: Pence }[];
  readonly payers: readonly { readonly id: string; readonly name: string }[];
}

export const patientAccountInput = z.strictObject({ patientId: idField });

export interface PatientAccountView {
  readonly patientId: string;
  readonly owedPence: Pence;
  readonly overduePence: Pence;
  readonly toInvoice: number;
  readonly invoices: readonly InvoiceRowView[];
}
