import { useQuery } from "@tanstack/react-query";
import { fetchProducts } from "../api-client";
import { billingKeys } from "../query-keys";

export function useProducts(invoiceId: string) {
  return useQuery({
    queryKey: billingKeys.products(invoiceId),
    queryFn: ({ signal }) => fetchProducts(invoiceId, signal),
    staleTime: 60_000,
  });
}
