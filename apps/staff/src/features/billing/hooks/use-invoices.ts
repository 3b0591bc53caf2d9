import { keepPreviousData, useQuery } from "@tanstack/react-query";
import type { AgedDebtView, InvoiceListView } from "@withy/contracts/billing";
import { fetchAgedDebt, fetchInvoices } from "../api-client";
import { type FilterAddress, toListInput } from "../filter-address";
import { billingKeys } from "../query-keys";

export interface FirstList {
  readonly filter: FilterAddress;
  readonly list: InvoiceListView;
  readonly aged: AgedDebtView;
}

const isSame = (a: object, b: object) => JSON.stringify(a) === JSON.stringify(b);

/** The list under a filter; what the page came with stands until something else is asked for. */
export function useInvoices(filter: FilterAddress, first: FirstList) {
  const input = toListInput(filter);
  return useQuery({
    queryKey: billingKeys.invoices(input),
    queryFn: ({ signal }) => fetchInvoices(input, signal),
    placeholderData: keepPreviousData,
    ...(isSame(input, toListInput(first.filter)) ? { initialData: first.list } : {}),
  });
}

export function useAgedDebt(siteId: string | undefined, first: FirstList) {
  return useQuery({
    queryKey: billingKeys.agedDebt(siteId),
    queryFn: ({ signal }) => fetchAgedDebt(siteId, signal),
    placeholderData: keepPreviousData,
    ...(siteId === first.filter.siteId ? { initialData: first.aged } : {}),
  });
}
