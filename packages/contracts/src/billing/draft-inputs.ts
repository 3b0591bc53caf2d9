import type { VatTreatment } from "@withy/billing/vat";
import type { Pence } from "@withy/core/money";
import type { PlainDateText } from "@withy/core/plain-date";
import { z } from "zod";
import { idField, requiredText, versionField } from "../fields";
import type { JobView } from "../jobs";

export const draftInvoicesInput = z.strictObject({
  /** One patient's visits only; left out, the attended visits that the person may bill. */
  patientId: idField.optional(),
  siteId: idField.optional(),
});

export const invoiceIdInput = z.strictObject({ invoiceId: idField });
export const listDraftsInput = z.strictObject({ siteId: idField.optional(), patientId: idField.optional() });

const quantityField = z.int("Enter a whole number.").min(1, "Enter 1 or more.").max(99, "Enter 99 or fewer.");
const discountField = z
  .int("Enter a discount between 0% and 100%.")
  .min(0, "Enter a discount of 0% or more.")
  .max(10_000, "Enter a discount of 100% or less.");

/** A line that stays, with its id; or a product that is added, by its own. */
export const draftLineInput = z.union([
  z.strictObject({ lineId: idField, quantity: quantityField, discountBasisPoints: discountField }),
  z.strictObject({ productId: idField, quantity: quantityField, discountBasisPoints: discountField }),
]);
export type DraftLineInput = z.infer<typeof draftLineInput>;

/** The whole list of lines as it shall be. A visit that is left out waits to be invoiced again. */
export const editDraftInput = z.strictObject({
  invoiceId: idField,
  version: versionField,
  lines: z
    .array(draftLineInput)
    .min(1, "An invoice needs at least one line. Discard the draft instead.")
    .max(60),
});

export const versionedInvoiceInput = z.strictObject({ invoiceId: idField, version: versionField });

export const voidInvoiceInput = z.strictObject({
  invoiceId: idField,
  version: versionField,
  reason: requiredText(200, "Say why the invoice is made void."),
});

export interface DraftView {
  readonly id: string;
  readonly version: number;
  readonly patientName: string;
  readonly payerName: string | null;
  readonly siteName: string;
  readonly visits: number;
  readonly items: number;
  readonly firstOn: PlainDateText | null;
  readonly lastOn: PlainDateText | null;
  readonly totalPence: Pence;
}

/** An attended visit that stands on no invoice. Without a price it must be priced before it can be drafted. */
export interface VisitToInvoiceView {
  readonly appointmentId: string;
  readonly patientId: string;
  readonly patientName: string;
  readonly payerName: string | null;
  readonly siteName: string;
  readonly serviceName: string;
  readonly on: PlainDateText;
  readonly pricePence: Pence | null;
}

export interface ToIssueView {
  readonly drafts: readonly DraftView[];
  readonly draftsTotalPence: Pence;
  readonly visits: readonly VisitToInvoiceView[];
  readonly visitsTotalPence: Pence;
  /** The list holds the oldest visits only; more come once these are drafted. */
  readonly areMoreVisits: boolean;
  /** This person's drafting that is not finished yet. */
  readonly drafting: DraftingJobView | null;
}

export interface DraftedView {
  readonly invoiceIds: readonly string[];
  readonly visitsDrafted: number;
  readonly visitsWithoutPrice: number;
}

/** What a drafting job has done so far, over all its tries. */
export interface DraftingResult {
  readonly drafts: number;
  readonly visitsDrafted: number;
  readonly visitsWithoutPrice: number;
}
export type DraftingJobView = JobView<DraftingResult>;

export interface ProductView {
  readonly id: string;
  readonly name: string;
  readonly pricePence: Pence;
  readonly vatTreatment: VatTreatment;
}
