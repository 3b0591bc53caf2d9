import {
  type InvoiceListView,
  type InvoiceRowView,
  type InvoiceSumsView,
  listInvoicesInput,
} from "@withy/contracts/billing";
import { sumPence } from "@withy/core/money";
import { dayOf } from "@withy/core/zoned-time";
import { verb } from "../verb";
import { whereInvoices } from "./invoice-filter";
import { invoiceRows, invoiceSums } from "./invoice-rows";

const sumsOfPage = (rows: readonly InvoiceRowView[]): InvoiceSumsView => ({
  count: rows.length,
  totalPence: sumPence(rows.map((r) => r.totalPence)),
  paidPence: sumPence(rows.map((r) => r.paidPence)),
  owedPence: sumPence(rows.map((r) => r.owedPence)),
});

/** One page of issued invoices under a filter, with the sums of the page and of the whole filter. */
export const listInvoices = verb(
  "billing.read",
  listInvoicesInput,
  async (ctx, input): Promise<InvoiceListView> => {
    const today = dayOf(ctx.clock.now(), ctx.zone);
    const { page, pageSize, ...filter } = input;
    const where = whereInvoices(ctx.practiceId, ctx.roles, filter, today);
    const isOldestDueFirst = filter.kind === "owed" || filter.kind === "overdue";
    const slice = { isOldestDueFirst, limit: pageSize, offset: (page - 1) * pageSize };
    const [rows, filterSums] = await Promise.all([
      invoiceRows(ctx, where, today, slice),
      invoiceSums(ctx, where),
    ]);
    return { rows, page, pageSize, total: filterSums.count, today, pageSums: sumsOfPage(rows), filterSums };
  },
);
