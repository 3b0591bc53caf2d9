import { useQuery } from "@tanstack/react-query";
import type { TodayView } from "@withy/contracts/diary";
import { fetchToday } from "../api-client";
import { todayKeys } from "../query-keys";

/** What is next at these sites; read again every two seconds, since the waiting room fills at other desks too. */
export function useToday(siteIds: readonly string[], first: TodayView) {
  return useQuery({
    queryKey: todayKeys.today(siteIds),
    queryFn: ({ signal }) => fetchToday(siteIds, signal),
    initialData: first,
    refetchInterval: 2000,
  });
}
