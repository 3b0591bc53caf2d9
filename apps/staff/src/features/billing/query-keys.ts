import type { InvoiceFilters } from "./api-client";

/** Every write invalidates `all`: one invoice stands in the lists, in the sums and on its own page. */
export const billingKeys = {
  all: ["billing"] as const,
  invoices: (filters: InvoiceFilters) => ["billing", "invoices", filters] as const,
  agedDebt: (siteId: string | undefined) => ["billing", "aged-debt", siteId] as const,
  toIssue: ["billing", "to-issue"] as const,
  drafting: (jobId: string | undefined) => ["billing", "drafting", jobId] as const,
  invoice: (id: string) => ["billing", "invoice", id] as const,
  products: (id: string) => ["billing", "products", id] as const,
};
