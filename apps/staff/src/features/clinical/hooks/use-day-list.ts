import { useQuery } from "@tanstack/react-query";
import type { DayList } from "@withy/contracts/clinical";
import { fetchDayList } from "../api-client";
import { clinicalKeys } from "../query-keys";

/** The therapist's day; arrivals at the desk show within a minute. */
export function useDayList(first: DayList) {
  return useQuery({
    queryKey: clinicalKeys.day(first.day),
    queryFn: ({ signal }) => fetchDayList(first.day, signal),
    initialData: first,
    staleTime: 30_000,
    refetchInterval: 60_000,
  });
}
