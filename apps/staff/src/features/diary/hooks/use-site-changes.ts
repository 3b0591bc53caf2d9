import { useQuery } from "@tanstack/react-query";
import { fetchChanges } from "../api-client";
import { diaryKeys } from "../query-keys";

/** What was last done in the diary of these sites, by whom ever. */
export function useSiteChanges(siteIds: readonly string[]) {
  return useQuery({
    queryKey: diaryKeys.changes(siteIds),
    queryFn: ({ signal }) => fetchChanges(siteIds, 20, signal),
    refetchInterval: 10_000,
  });
}
