import { useQuery, useQueryClient } from "@tanstack/react-query";
import type { TodayView } from "@withy/contracts/diary";
import { useEffect } from "react";
import { useLiveDiary } from "@/components/use-live-diary";
import { fetchPulse, fetchToday } from "../api-client";
import { todayKeys } from "../query-keys";

/** Asked only where there is no stream. */
const pulseMs = 1500;
/** Waiting times and gaps move on by themselves. */
const agesMs = 60_000;

/** What is next at these sites. The waiting room fills at other desks too, so changes are streamed. */
export function useToday(siteIds: readonly string[], first: TodayView) {
  const client = useQueryClient();
  const query = useQuery({
    queryKey: todayKeys.today(siteIds),
    queryFn: ({ signal }) => fetchToday(siteIds, signal),
    initialData: first,
    refetchInterval: agesMs,
  });
  const shown = query.data.sites.map((site) => site.id);
  const isLive = useLiveDiary(shown);
  const theirs = useQuery({
    queryKey: todayKeys.pulse(shown),
    queryFn: ({ signal }) => fetchPulse(shown, signal),
    enabled: !isLive,
    refetchInterval: pulseMs,
    staleTime: 0,
  }).data?.pulse;
  const ours = query.data.pulse;
  const isIdle = !query.isFetching;
  useEffect(() => {
    if (!isLive && theirs !== undefined && isIdle && theirs !== ours)
      void client.invalidateQueries({ queryKey: todayKeys.all });
  }, [isLive, theirs, ours, isIdle, client]);
  return query;
}
