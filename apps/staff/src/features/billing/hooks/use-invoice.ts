import { useQuery } from "@tanstack/react-query";
import type { InvoiceView } from "@withy/contracts/billing";
import { fetchInvoice } from "../api-client";
import { billingKeys } from "../query-keys";

export function useInvoice(first: InvoiceView): InvoiceView {
  const { data } = useQuery({
    queryKey: billingKeys.invoice(first.id),
    queryFn: ({ signal }) => fetchInvoice(first.id, signal),
    initialData: first,
  });
  return data;
}
