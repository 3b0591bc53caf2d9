/** The lists of invoices that a person may ask for. */
export const invoiceKinds = ["owed", "overdue", "paid", "refunded", "void", "all"] as const;
export type InvoiceKind = (typeof invoiceKinds)[number];
