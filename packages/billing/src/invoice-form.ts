import type { Pence } from "@withy/core/money";

/**
 * The full form names the customer and shows VAT apart; the simplified one may be used up to £250.00 with VAT.
 * The regulation says "does not exceed £250", so exactly £250.00 is allowed.
 * Source: VAT Regulations 1995, regulation 16A; fields: "VAT record keeping: VAT invoices", gov.uk.
 */
export type InvoiceForm = "full" | "simplified";

export const simplifiedLimitPence = 250_00;

export const maySimplify = (grossPence: Pence): boolean => grossPence <= simplifiedLimitPence;

export const invoiceFields = [
  "number",
  "supplierName",
  "supplierAddress",
  "vatNumber",
  "taxPoint",
  "issuedOn",
  "customerName",
  "customerAddress",
  "lineDescription",
  "lineVatRate",
  "lineQuantity",
  "lineUnitPrice",
  "discountRate",
  "totalNet",
  "totalVat",
  "totalGross",
] as const;
export type InvoiceField = (typeof invoiceFields)[number];

const everyForm: readonly InvoiceField[] = [
  "number",
  "supplierName",
  "supplierAddress",
  "vatNumber",
  "taxPoint",
  "lineDescription",
  "lineVatRate",
];

export const requiredFields: Record<InvoiceForm, readonly InvoiceField[]> = {
  full: [
    ...everyForm,
    "issuedOn",
    "customerName",
    "customerAddress",
    "lineQuantity",
    "lineUnitPrice",
    "discountRate",
    "totalNet",
    "totalVat",
  ],
  simplified: [...everyForm, "totalGross"],
};

/** Fields that are asked for only where they apply: see `missingFields`. */
export interface InvoiceFacts {
  readonly present: ReadonlySet<InvoiceField>;
  readonly isVatRegistered: boolean;
  readonly hasOtherTaxPoint: boolean;
  readonly hasDiscount: boolean;
}

const vatOnly: readonly InvoiceField[] = ["vatNumber", "lineVatRate", "totalVat", "taxPoint"];

/** What an invoice still lacks for its form, in the order of the list above; empty where it may be issued. */
export function missingFields(form: InvoiceForm, facts: InvoiceFacts): InvoiceField[] {
  return requiredFields[form]
    .filter((field) => {
      if (!facts.isVatRegistered && vatOnly.includes(field)) return false;
      if (field === "taxPoint" && !facts.hasOtherTaxPoint) return false;
      if (field === "discountRate" && !facts.hasDiscount) return false;
      return !facts.present.has(field);
    })
    .sort((a, b) => invoiceFields.indexOf(a) - invoiceFields.indexOf(b));
}
