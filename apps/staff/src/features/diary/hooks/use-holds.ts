import { useQuery } from "@tanstack/react-query";
import { deskKeys, fetchHolds } from "../desk-client";

/** The stream tells of a new hold at once; without one, half a minute must do for a courtesy. */
const agesMs = 30_000;

/** The times that other people are booking now. */
export function useHolds(siteIds: readonly string[]) {
  const query = useQuery({
    queryKey: deskKeys.holds(siteIds),
    queryFn: ({ signal }) => fetchHolds(siteIds, signal),
    refetchInterval: agesMs,
    enabled: siteIds.length > 0,
  });
  return query.data ?? [];
}
