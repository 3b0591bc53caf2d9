import type {
  AgedDebtView,
  CardPaymentView,
  DraftedView,
  DraftingJobView,
  editDraftInput,
  InvoiceListView,
  InvoiceView,
  ListInvoicesInput,
  ProductView,
  refundPaymentInput,
  StartedCardPaymentView,
  ToIssueView,
  takePaymentInput,
  versionedInvoiceInput,
  voidInvoiceInput,
} from "@withy/contracts/billing";
import type { z } from "zod";
import { get, write } from "@/api/request";

export type InvoiceFilters = Omit<ListInvoicesInput, "page" | "pageSize"> & { page?: number };
export type EditDraft = z.input<typeof editDraftInput>;
export type TakePayment = z.input<typeof takePaymentInput>;
export type StartCardPayment = { invoiceId: string; amountPence: number };
export type RefundPayment = z.input<typeof refundPaymentInput>;
export type VoidInvoice = z.input<typeof voidInvoiceInput>;
export type InvoiceVersion = z.input<typeof versionedInvoiceInput>;

const invoice = (id: string) => `/api/billing/invoices/${id}`;

export const invoicePdfAddress = (id: string) => `${invoice(id)}/pdf`;

export const fetchInvoices = (filters: InvoiceFilters, signal?: AbortSignal) =>
  get<InvoiceListView>("/api/billing/invoices", { ...filters }, signal);

export const fetchAgedDebt = (siteId: string | undefined, signal?: AbortSignal) =>
  get<AgedDebtView>("/api/billing/aged-debt", { siteId }, signal);

export const fetchToIssue = (signal?: AbortSignal) => get<ToIssueView>("/api/billing/to-issue", {}, signal);

export const fetchInvoice = (id: string, signal?: AbortSignal) => get<InvoiceView>(invoice(id), {}, signal);

export const fetchProducts = (id: string, signal?: AbortSignal) =>
  get<ProductView[]>(`${invoice(id)}/products`, {}, signal);

export const draftVisits = (wish: { patientId?: string }) =>
  write<DraftedView>("POST", "/api/billing/drafts", wish);

/** For more visits than one request may draft: the worker does it, and tells how far it is. */
export const startDrafting = () => write<DraftingJobView>("POST", "/api/billing/drafting");

export const fetchDrafting = (jobId: string, signal?: AbortSignal) =>
  get<DraftingJobView>(`/api/billing/drafting/${jobId}`, {}, signal);

export const editDraft = ({ invoiceId, ...input }: EditDraft) =>
  write<InvoiceView>("PUT", invoice(invoiceId), input);

export const discardDraft = ({ invoiceId, version }: InvoiceVersion) =>
  write<{ invoiceId: string }>("DELETE", invoice(invoiceId), { version });

export const issueInvoice = ({ invoiceId, version }: InvoiceVersion, key: string) =>
  write<InvoiceView>("POST", `${invoice(invoiceId)}/issue`, { version }, key);

export const voidInvoice = ({ invoiceId, ...input }: VoidInvoice) =>
  write<InvoiceView>("POST", `${invoice(invoiceId)}/void`, input);

export const takePayment = ({ invoiceId, ...input }: TakePayment, key: string) =>
  write<InvoiceView>("POST", `${invoice(invoiceId)}/payments`, input, key);

export const startCardPayment = ({ invoiceId, amountPence }: StartCardPayment, key: string) =>
  write<StartedCardPaymentView>("POST", `${invoice(invoiceId)}/card-payments`, { amountPence }, key);

export const checkCardPayment = (id: string) =>
  write<CardPaymentView>("POST", `/api/billing/card-payments/${id}/check`);

export const cancelCardPayment = (id: string) =>
  write<CardPaymentView>("POST", `/api/billing/card-payments/${id}/cancel`);

export const refundPayment = ({ paymentId, ...input }: RefundPayment, key: string) =>
  write<InvoiceView>("POST", `/api/billing/payments/${paymentId}/refunds`, input, key);

export const retryRefund = (refundId: string) =>
  write<InvoiceView>("POST", `/api/billing/refunds/${refundId}/retry`);
