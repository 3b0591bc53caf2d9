import { useQuery } from "@tanstack/react-query";
import type { MessageRow } from "@withy/contracts/messaging";
import type { Page } from "@withy/contracts/page";
import { fetchMessages, type MessageFilters } from "../api-client";
import { messageKeys } from "../query-keys";

const isOnItsWay = (row: MessageRow): boolean => row.state === "waiting" || row.state === "claimed";

/** The list, read again by itself while anything in it is on its way. */
export function useMessages(filters: MessageFilters, first: Page<MessageRow>) {
  return useQuery({
    queryKey: messageKeys.list(filters),
    queryFn: ({ signal }) => fetchMessages(filters, signal),
    initialData: first,
    staleTime: 5_000,
    refetchInterval: ({ state }) => (state.data?.rows.some(isOnItsWay) ? 3_000 : false),
  });
}
